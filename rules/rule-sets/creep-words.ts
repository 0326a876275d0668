import type { CreepComplianceMeasure } from './measure';
import { numberWords } from './words';

/** How a rule on creep compliance takes its value, as clauses of its sentence. */
export function creepClauses(measure: CreepComplianceMeasure): string[] {
  const { source, extrapolationDecades, use } = measure;
  const curve = `a fitted ${CURVES[measure.model]}`;
  const percent = `${numberWords(Number((measure.confidence * 100).toPrecision(12)))} %`;
  const isBound = use === 'lower' || use === 'upper';
  const bound = `its ${use} ${percent} bound`;
  if (source === 'measured') {
    const from = 'mean of the specimens tested at that time';
    return [isBound ? `${from}, ${bound}` : from];
  }
  const clauses: string[] = [];
  if (isBound) clauses.push(`${bound} from ${curve}`);
  else if (source === 'fitted') clauses.push(`from ${curve}`);
  else clauses.push(`mean of the specimens tested at that time, else from ${curve}`);
  if (extrapolationDecades === 0) return [...clauses, 'never beyond the tested loading times'];
  const decades = `${numberWords(extrapolationDecades)} ${extrapolationDecades === 1 ? 'decade' : 'decades'}`;
  const beyond = `at most ${decades} beyond the tested loading times`;
  return [...clauses, use === undefined ? `${beyond}, there by the unfavourable ${percent} bound` : beyond];
}

const CURVES: Record<CreepComplianceMeasure['model'], string> = {
  sigmoid: 'sigmoid',
  power: 'power law',
  prony: 'Prony series',
};
