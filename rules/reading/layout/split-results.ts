import { plainText } from '../plain-text';
import type { Candidate } from './candidate';

const oneFace = 'coarse-aggregate-angularity-one-face';
const twoFaces = 'coarse-aggregate-angularity-two-faces';

/** "98/95" under fractured faces: with one face or more before the stroke, with two or more behind it. */
export function splitResults(candidate: Candidate): Candidate[] {
  const { quantities, cell } = candidate;
  if (!quantities.includes(oneFace) || !quantities.includes(twoFaces) || cell.kind !== 'text')
    return [candidate];
  const match = /^(\d{1,3}(?:[.,]\d+)?)\s*%?\s*[/|]\s*(\d{1,3}(?:[.,]\d+)?)\s*%?$/.exec(plainText(cell.text));
  const [, one = '', two = ''] = match ?? [];
  // No particle has two fractured faces without having one.
  if (match === null || Number(one.replace(',', '.')) < Number(two.replace(',', '.'))) return [candidate];
  return [
    { ...candidate, quantities: [oneFace], written: one },
    { ...candidate, quantities: [twoFaces], written: two },
  ];
}
