import type { Cell } from '../cell-grid';
import { plainText } from '../plain-text';
import { readsAsNumber } from './cell-kind';
import { bareCandidate } from './heading-candidates';
import { readAttributeCell, setAmbient } from './read-pairs';
import type { TableContext } from './table-context';

/** A label and its value in one cell: "Gb = 1.028", "Design traffic: 10 million ESAL", "Passes: 20,000". */
export function readWritten(cell: Cell, context: TableContext): boolean {
  const match = /^([^:=]{1,60}?)\s*[:=]\s*(\S.{0,80})$/.exec(plainText(cell.text));
  if (!match?.[1] || !match[2]) return false;
  const meaning = context.labels.read(match[1]);
  const written = match[2].replace(/[.;]$/, '');
  if (meaning.unknown.length > 0 || meaning.role !== null) return false;
  if (meaning.quantities.length > 0 && (readsAsNumber(written) || /^\d[\d.,]*\s*[-–]\s*\d/.test(written))) {
    context.candidates.push({
      ...bareCandidate(context, cell),
      quantities: meaning.quantities,
      at: meaning.at,
      unit: meaning.unit,
      heading: match[1],
      written,
      onMix: meaning.onMix,
      onAggregate: meaning.onAggregate,
      subset: meaning.subset ?? context.tableSubset,
      domains: [...meaning.domains, ...context.tableDomains],
    });
    return true;
  }
  const said: Cell = { ...cell, kind: 'text', value: written, text: written, format: null };
  if (meaning.attribute !== null)
    return readAttributeCell(said, { attribute: meaning.attribute, unit: meaning.unit }, context);
  return setAmbient(said, meaning, { unit: meaning.unit }, context);
}
