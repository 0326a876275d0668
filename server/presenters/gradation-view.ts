import type { Finding } from '#rules/engine/finding';
import { sieveLabel, usSieveName } from '#rules/quantities/sieves';
import type { MixRecord, Reading } from '#rules/record';
import type { CheckView, GradationPoint } from '#shared/contracts/checks';

type SievedReading = { value: number; source: Reading['source'] };
type GradationFinding = Pick<Finding, 'kind' | 'subject' | 'outcome' | 'limit'>;

/** The job-mix gradation with the control points that were judged; null where no percent passing was read. */
export function gradationView(
  record: Pick<MixRecord, 'readings' | 'attributes'>,
  findings: readonly GradationFinding[],
): CheckView['gradation'] {
  const design = new Map<number, SievedReading>();
  for (const reading of record.readings) {
    const { sieve, trial = 'design', stockpile, laboratory = 'contractor' } = reading.at;
    const { value, source } = reading;
    if (reading.quantity !== 'percent-passing' || sieve === undefined || value === null) continue;
    if (trial !== 'design' || stockpile !== undefined || laboratory !== 'contractor') continue;
    if (!design.has(sieve)) design.set(sieve, { value, source });
  }
  if (design.size === 0) return null;
  const judged = new Map(
    findings.filter(({ kind }) => kind === 'gradation').map((finding) => [finding.subject, finding]),
  );
  const points = [...design].map(([sieve, reading]) =>
    pointOf(sieve, reading, judged.get(sieveLabel(sieve))),
  );
  return {
    maximumSizeMm: maximumSize(record.attributes.nominalMaximumSize?.value),
    points: points.sort((a, b) => b.sieve - a.sieve),
  };
}

function pointOf(
  sieve: number,
  { value: passing, source }: SievedReading,
  finding: GradationFinding | undefined,
): GradationPoint {
  return {
    sieve,
    usName: usSieveName(sieve),
    passing,
    min: finding?.limit?.min ?? null,
    max: finding?.limit?.max ?? null,
    outcome: finding?.outcome ?? null,
    sheet: source?.sheet ?? null,
    cell: source?.cell ?? null,
  };
}

/**
 * The maximum size is one sieve larger than the nominal maximum size (AASHTO R 35, definitions; from memory,
 * verify), in the series that mix designs are reported on.
 */
function maximumSize(nominal: unknown): number | null {
  if (typeof nominal !== 'number') return null;
  const larger = mixSeriesMm.filter((opening) => opening > nominal);
  return larger.length === 0 ? null : Math.min(...larger);
}

const mixSeriesMm = [50, 37.5, 25, 19, 12.5, 9.5, 4.75];
