import { inPlaceVoidsFromLaboratory, inPlaceVoidsFromMaximum } from '../calculations/in-place-voids';
import type { Conditions, Reading } from '../record';
import { type RecordIndex, withoutGaps } from './analysis-index';
import { type AnalysisNode, derivedNode, meanNode, readingNode } from './analysis-node';

/**
 * In-place air voids from field density. A density says what it is a percentage of by its variant, `maximum` (of
 * Gmm) or `laboratory` (of laboratory specimens with air voids Va); without one, nothing tells and nothing is
 * computed.
 */
export function fieldVoidsOf(index: RecordIndex, trial: string, va: AnalysisNode | null): AnalysisNode[] {
  return ['maximum', 'laboratory'].flatMap((variant) => {
    const readings = index.ofTrial('field-density', trial).filter(({ at }) => at.variant === variant);
    const nodes = readings.flatMap((reading) => {
      const at = withoutGaps({ trial, variant, specimen: reading.at.specimen });
      return (variant === 'maximum' ? fromMaximum(reading, at) : fromLaboratory(reading, at, va)) ?? [];
    });
    return meanNode(nodes, { trial, variant }, { keepSpecimens: true, counted: true }) ?? [];
  });
}

function fromMaximum(reading: Reading, at: Conditions): AnalysisNode | null {
  return derivedNode({
    quantity: 'in-place-air-voids',
    at,
    formula: '100 − %Gmm',
    inputs: [readingNode(reading, '%Gmm')],
    compute: ([density]) => inPlaceVoidsFromMaximum(density!),
  });
}

function fromLaboratory(reading: Reading, at: Conditions, va: AnalysisNode | null): AnalysisNode | null {
  if (va === null) return null;
  return derivedNode({
    quantity: 'in-place-air-voids',
    at,
    formula: '100 − C·(100 − Va)/100',
    inputs: [readingNode(reading, 'C'), va],
    compute: ([C, Va]) => inPlaceVoidsFromLaboratory({ C: C!, Va: Va! }),
  });
}
