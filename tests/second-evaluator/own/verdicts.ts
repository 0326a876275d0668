import type {
  AttributeMeasure,
  CreepComplianceMeasure,
  DifferenceMeasure,
  DocumentMeasure,
  FormulaMeasure,
  GradationMeasure,
  ReadingMeasure,
} from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { attributeVerdicts } from './attribute-rule';
import { creepVerdicts } from './creep-rule';
import { differenceVerdicts } from './difference-rule';
import { documentVerdicts } from './document-rule';
import { formulaVerdicts } from './formula-rule';
import { gradationVerdicts } from './gradation-rule';
import { readingVerdicts, subjectOf } from './reading-rule';
import { truthOf } from './truth';
import { type Verdict, type World, without } from './world';

/** What every rule of the edition comes to on this record. */
export function verdictsOf(world: World): Verdict[] {
  const all: Verdict[] = [];
  for (const rule of world.edition.rules) {
    const verdicts = ruleVerdicts(world, rule);
    for (const verdict of verdicts) {
      all.push(alternativesPart(world, rule, verdict) ? { ...verdict, ...without('undecided') } : verdict);
    }
  }
  return all;
}

function ruleVerdicts(world: World, rule: Rule): Verdict[] {
  const truth = truthOf(world, rule.when);
  if (truth !== 'true') {
    return [
      {
        rule: rule.id,
        subject: wholeSubject(rule),
        ...without(truth === 'false' ? 'not applicable' : 'undecided'),
      },
    ];
  }
  const { measure } = rule;
  if (measure.kind === 'reading') return readingVerdicts(world, rule as Rule & { measure: ReadingMeasure });
  if (measure.kind === 'gradation')
    return gradationVerdicts(world, rule as Rule & { measure: GradationMeasure });
  if (measure.kind === 'difference')
    return differenceVerdicts(world, rule as Rule & { measure: DifferenceMeasure });
  if (measure.kind === 'attribute')
    return attributeVerdicts(world, rule as Rule & { measure: AttributeMeasure });
  if (measure.kind === 'document')
    return documentVerdicts(world, rule as Rule & { measure: DocumentMeasure });
  if (measure.kind === 'formula') return formulaVerdicts(world, rule as Rule & { measure: FormulaMeasure });
  return creepVerdicts(world, rule as Rule & { measure: CreepComplianceMeasure });
}

function wholeSubject({ measure }: Rule): string {
  if (measure.kind === 'reading')
    return subjectOf(measure.quantity, measure.at.stockpile === 'each' ? {} : measure.at);
  if (measure.kind === 'gradation') return 'design point';
  return measure.kind === 'difference' ? subjectOf(measure.quantity, {}) : 'mix';
}

/** Whether an answer that an open doubt still allows would change the outcome. */
function alternativesPart(world: World, rule: Rule, verdict: Verdict): boolean {
  if (verdict.outcome === 'undecided') return false;
  const { record } = world;
  for (const doubt of record.doubts) {
    for (const { reading, attribute, document } of doubt.alternatives) {
      const answered = {
        ...record,
        doubts: record.doubts.filter((each) => each !== doubt),
        readings: reading === undefined ? record.readings : [...record.readings, reading],
        documents: document === undefined ? record.documents : [...record.documents, document],
        attributes:
          attribute === undefined
            ? record.attributes
            : { ...record.attributes, [attribute.name]: attribute.value },
      };
      const others = ruleVerdicts({ ...world, record: answered }, rule);
      const other = others.find(({ subject }) => subject === verdict.subject);
      if (other !== undefined && other.outcome !== verdict.outcome) return true;
    }
  }
  return false;
}
