import { sieveFromName } from '../../quantities/sieves';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import type { DocumentPart, KeyName } from '../words/key-words';
import { isMaterial } from './materials';
import type { Surroundings } from './table';
import { isConditionKey, type TableColumn } from './table-column';

export function decideKind(
  result: TableColumn,
  cells: Cell[],
  { around, hasDocuments, isFirst, isBehindValues }: Contents,
): void {
  const { kinds, labels } = around;
  const meanings = result.heads
    .filter((cell) => kinds.of(cell) === 'text')
    .map(({ text }) => labels.read(text));
  const last = meanings.at(-1);
  const isNumbered = result.nameCell !== null && kinds.of(result.nameCell) !== 'text';
  const keys = result.nameKey !== null || isNumbered || !last || last.unknown.length > 0 ? [] : last.keys;
  const sample = cells.slice(0, 80);
  const texts = sample.filter((cell) => kinds.of(cell) === 'text');
  const say = texts.filter(({ text }) => {
    const meaning = labels.read(text);
    if (meaning.unknown.length > 0 && keys.some(isConditionKey)) return false;
    return meaning.quantities.length > 0 || meaning.attribute !== null || meaning.furniture || meaning.raw;
  });
  // Over a run of counts beside heights or densities it is where those were taken.
  const isCount =
    result.quantities.length === 1 && result.quantities[0] === 'gyrations-design' && sample.length > 1;
  if (
    isCount &&
    isFirst &&
    /^(?:no\.? of |number of |nombre de |nb\.? (?:de )?|n[úu]mero de |n[°º] (?:de )?|anzahl (?:der )?)?(?:gyr|giros|girat|dreh|umdreh|n$)/i.test(
      last?.text ?? '',
    )
  ) {
    result.kind = 'key';
    result.key = 'gyrations';
    return;
  }
  if (hasDocuments) {
    const part = keys.find((key) => documentParts.has(key));
    if (part) {
      result.kind = 'document';
      result.part = part as DocumentPart;
      return;
    }
  }
  if (result.quantities.length > 0 && !(result.weak && keys.length > 0) && texts.length <= sample.length / 2)
    return;
  if (
    result.quantities.length > 0 &&
    !result.weak &&
    keys.length === 0 &&
    say.length * 2 < Math.max(1, texts.length)
  )
    return;
  if (isSpecimenCutShort(last?.text ?? '', sample, { isFirst, kinds })) {
    result.role = null;
    result.kind = 'key';
    result.key = 'specimen';
    return;
  }
  if (result.role !== null && result.role !== 'average' && result.quantities.length === 0) {
    result.kind = 'aside';
    return;
  }
  if (
    result.attribute !== null &&
    result.quantities.length === 0 &&
    sample.length <= 2 &&
    !keys.some((key) => key !== 'laboratory')
  )
    return;
  if (result.attribute !== null && texts.length === 1 && sample.length === 1) return;
  const units = sample.filter((cell) => kinds.of(cell) === 'unit').length;
  if (keys.includes('unit') || (units > 0 && units >= sample.length * 0.6)) result.kind = 'unit';
  else if (keys.includes('value')) result.kind = 'value';
  else if (keys.includes('method') && texts.length > 0) result.kind = 'method';
  else if (keys.includes('testedOn') || (keys.includes('date') && !keys.includes('document')))
    result.kind = 'testedOn';
  else if (
    say.length > 0 &&
    say.length * 2 >= texts.length &&
    texts.length * 2 >= sample.length &&
    (!isNaming(keys) || saysProperties(texts, labels))
  )
    result.kind = 'label';
  else if (keys.some(isConditionKey) && !(isBehindValues && isNameOnly(keys, sample)))
    setKey(result, keys.filter(isConditionKey), sample);
  else if (keys.includes('quantity')) result.kind = 'label';
  else if (looksLikeSieves(sample, isFirst || result.heads.every((cell) => kinds.of(cell) === 'unit')))
    setKey(result, ['sieve'], sample);
  else if (texts.length > 0 && texts.length * 2 >= sample.length)
    result.kind = isFirst || result.heads.length === 0 ? 'label' : 'aside';
  else if (isFirst && result.heads.length > 0 && result.quantities.length === 0 && sample.length > 0)
    result.kind = 'label';
}

/** "Spec." heads limits, and specimens where short names stand under it; "Spec. No." heads nothing else. */
function isSpecimenCutShort(
  head: string,
  sample: Cell[],
  { isFirst, kinds }: { isFirst: boolean; kinds: Contents['around']['kinds'] },
): boolean {
  const match = /^\s*spec\.?\s*(no\.?|nr\.?|#|id)?\s*$/i.exec(head);
  if (!match || sample.length === 0) return false;
  const short =
    isFirst || match[1]
      ? /^\s*[\p{L}\d][\p{L}\d\-./]{0,5}\s*$/u
      : /^\s*(?:\p{L}{1,2}-?\d{0,3}|\d{1,2}-?\p{L})\s*$/u;
  const names = sample.filter(({ text }) => short.test(text));
  const words = sample.filter((cell) => kinds.of(cell) === 'text' && !short.test(cell.text));
  return names.length > 0 && names.length + words.length >= sample.length && words.length <= names.length;
}

interface Contents {
  around: Surroundings;
  hasDocuments: boolean;
  isFirst: boolean;
  /** Whose values are stands before them. */
  isBehindValues: boolean;
}

const documentParts = new Set<KeyName>(['document', 'issuer', 'reference', 'date', 'validTo']);

/** Under these headings a word like "RAP" or "Lime" is a name and no quantity. */
function isNaming(keys: KeyName[]): boolean {
  return (
    keys.some((key) => key === 'stockpile' || key === 'sieve' || key === 'time') && !keys.includes('quantity')
  );
}

/** Properties in every row under "Material": the heading speaks of the names beside it. */
function saysProperties(texts: Cell[], labels: Contents['around']['labels']): boolean {
  const meanings = texts.map(({ text }) => labels.read(text));
  const properties = meanings.filter(
    ({ quantities, weak, unknown }) =>
      quantities.length > 0 && !weak && unknown.length === 0 && !isMaterial(quantities),
  );
  const isEach = meanings.every(({ quantities }) => quantities.length > 0 && !isMaterial(quantities));
  return isEach && properties.length * 2 > meanings.length;
}

/** "Mélange" or "Mix" over figures behind the first results heads results of the mix, and numbers no trials. */
function isNameOnly(keys: KeyName[], sample: Cell[]): boolean {
  const named = keys
    .filter(isConditionKey)
    .every((key) => key === 'trial' || key === 'blend' || key === 'specimen' || key === 'stockpile');
  if (keys.includes('specimen') && countsAgain(sample)) return false;
  const fractional = sample.filter(
    ({ kind, value }) => kind === 'number' && !Number.isInteger(Number(value)),
  );
  return named && (fractional.length * 3 > sample.length || sample.every(({ kind }) => kind === 'number'));
}

/** 1, 2, 3 and again 1, 2, 3: specimens are numbered so, and no result is. */
function countsAgain(sample: Cell[]): boolean {
  const figures = sample.filter(({ kind }) => kind === 'number').map(({ value }) => Number(value));
  if (figures.length < 2 || figures[0] !== 1) return false;
  return figures.every(
    (figure, at) => at === 0 || figure === 1 || figure === (figures[at - 1] as number) + 1,
  );
}

function setKey(result: TableColumn, keys: ConditionName[], sample: Cell[]): void {
  const [first] = keys;
  if (!first) return;
  const sieves = sample.filter((cell) => isSieve(cell)).length;
  const key = keys.includes('sieve') && sieves * 2 >= sample.length ? 'sieve' : first;
  if (key === 'sieve' && sample.length > 0 && sieves * 2 < sample.length) {
    // The corner speaks of the heads beside it; the rows are the gradations that stand under them.
    result.kind = 'key';
    result.key = 'stockpile';
    result.corner = 'sieve';
    return;
  }
  const words = sample.filter(
    ({ kind, text }) => kind === 'text' && !/^[<>~]?\s*-?\d/.test(text.trim()),
  ).length;
  if (figureKeys.has(key) && sample.length > 1 && words * 2 > sample.length) {
    result.kind = 'key';
    result.key = 'specimen';
    result.corner = key;
    return;
  }
  result.kind = 'key';
  result.key = key;
}

/** Keys that are figures: words under such a heading are names, and the heading speaks of the heads beside it. */
const figureKeys: ReadonlySet<ConditionName> = new Set(['time', 'temperature', 'passes', 'frequency']);

export function isSieve(cell: Cell): boolean {
  return (
    cell.kind === 'date' ||
    sieveFromName(cell.text) !== null ||
    (cell.kind === 'number' && sieveFromName(cell.value) !== null) ||
    /^(?:pan|fond|fondo|schale|boden)$/i.test(cell.text.trim())
  );
}

/** Named sieves say so themselves; bare numbers only where a long run of them is the series, in order. */
function looksLikeSieves(sample: Cell[], mayBe: boolean): boolean {
  if (!mayBe || sample.length < 4) return false;
  const named = sample.filter((cell) => cell.kind === 'text' && sieveFromName(cell.text) !== null);
  if (named.length >= sample.length * 0.7) return true;
  const openings = sample.map((cell) => sieveFromName(cell.kind === 'number' ? cell.value : cell.text));
  if (openings.some((opening) => opening === null) || sample.length < 5) return false;
  const falls = openings.every(
    (opening, at) => at === 0 || (opening as number) < (openings[at - 1] as number),
  );
  const rises = openings.every(
    (opening, at) => at === 0 || (opening as number) > (openings[at - 1] as number),
  );
  return falls || rises;
}
