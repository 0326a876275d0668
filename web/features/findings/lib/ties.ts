import type { Evidence, Finding } from '#rules/engine/finding';
import type { Source } from '#rules/record';

/** A lettered tie between a number in the thread and its cell in the sheet. */
export interface Tie {
  letter: string;
  sheet: string;
  cell: string;
  /** What the workbook holds in the cell, as text. */
  text: string;
}

/** The alphabet; a value that rests on more cells names the rest in its workings. */
const mostTies = 26;

/** Letters in the order in which the thread names the cells: inputs first, then what the workbook reports. */
export function tiesOf(finding: Finding): Tie[] {
  const sources: Source[] = [];
  const walk = (evidence: Evidence) => {
    for (const input of evidence.inputs ?? []) walk(input);
    if (evidence.source) sources.push(evidence.source);
  };
  for (const evidence of finding.evidence) walk(evidence);
  const reported = finding.evidence.flatMap((evidence) => evidence.reported?.source ?? []);
  const own = distinct(sources.filter(hasCell)).slice(0, mostTies - Math.min(reported.length, 4));
  return distinct([...own, ...reported.filter(hasCell)])
    .slice(0, mostTies)
    .map((source, index) => ({ ...source, letter: String.fromCharCode(97 + index) }));
}

function hasCell(source: Source): boolean {
  return source.cell !== '';
}

function distinct(sources: readonly Source[]): Source[] {
  return sources.filter(
    (source, index) =>
      sources.findIndex((other) => other.sheet === source.sheet && other.cell === source.cell) === index,
  );
}

export function tieOf(ties: readonly Tie[], source: Source | null | undefined): Tie | null {
  if (!source) return null;
  return ties.find((tie) => tie.sheet === source.sheet && tie.cell === source.cell) ?? null;
}

/** The cell that the sheet opens at: what the workbook reports, else what was judged, else the first input. */
export function mainTie(finding: Finding, ties: readonly Tie[]): Tie | null {
  const [first] = finding.evidence;
  return tieOf(ties, first?.reported?.source) ?? tieOf(ties, first?.source) ?? ties[0] ?? null;
}
