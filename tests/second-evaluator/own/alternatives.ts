import type { Conditions, Doubt, MixRecord, Reading } from '#rules/record';
import type { Verdict, World } from './world';

/** Whether an answer that an open doubt still allows would change the outcome. */
export function alternativesPart(
  world: World,
  verdict: Verdict,
  judgedIn: (other: World) => Verdict[],
): boolean {
  if (verdict.outcome === 'undecided') return false;
  for (const doubt of world.record.doubts) {
    for (const alternative of doubt.alternatives) {
      const others = judgedIn({ ...world, record: answered(world.record, doubt, alternative) });
      const other = others.find(({ subject }) => subject === verdict.subject);
      if (other?.outcome !== verdict.outcome) return true;
    }
  }
  return false;
}

/** The record as it would be; a sure reading at the same conditions gives way to the answer. */
function answered(
  record: MixRecord,
  doubt: Doubt,
  { reading, attribute, document }: Doubt['alternatives'][number],
): MixRecord {
  const readings = record.readings.filter((each) => reading === undefined || !isSamePlace(each, reading));
  return {
    doubts: record.doubts.filter((each) => each !== doubt),
    readings: reading === undefined ? readings : [...readings, reading],
    documents: document === undefined ? record.documents : [...record.documents, document],
    attributes:
      attribute === undefined
        ? record.attributes
        : { ...record.attributes, [attribute.name]: attribute.value },
  };
}

function isSamePlace(one: Reading, other: Reading): boolean {
  if (one.quantity !== other.quantity) return false;
  const left = withDefaults(one.at);
  const right = withDefaults(other.at);
  const names = [...Object.keys(left), ...Object.keys(right)] as (keyof Conditions)[];
  return names.every((name) => left[name] === right[name]);
}

function withDefaults(at: Conditions): Conditions {
  return { trial: 'design', laboratory: 'contractor', ...at };
}
