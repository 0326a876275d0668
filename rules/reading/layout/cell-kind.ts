import type { Cell } from '../cell-grid';
import { parseNumberText } from '../parse-number';
import { plainText, saysNoValue } from '../plain-text';
import { unitOf } from './label-unit';

/** What a cell is to the layout: something that may be a result, words, a unit alone, or a word for no value. */
export type CellKind = 'value' | 'text' | 'unit' | 'none';

export class CellKinds {
  private readonly texts = new Map<string, CellKind>();

  of(cell: Cell): CellKind {
    if (cell.kind !== 'text') return 'value';
    const known = this.texts.get(cell.text);
    if (known) return known;
    const kind = kindOfText(cell.text);
    this.texts.set(cell.text, kind);
    return kind;
  }
}

function kindOfText(text: string): CellKind {
  const plain = plainText(text);
  if (
    plain === '' ||
    saysNoValue(plain) ||
    /^(?:np|non-?plastic|k\.?\s?a\.?|n\.?\s?b\.?|s\.?\s?o\.?|n\/m|s\/d)$/i.test(plain)
  )
    return 'none';
  if (plain.length > 40 || counted.test(plain) || /^%\s+(?:of|in|en|de|im|dans|du)\b/i.test(plain))
    return 'text';
  if (
    !/^[A-Z]$/.test(plain) &&
    !/\d/.test(plain) &&
    unitOf(plain.replace(/^[([]\s*|\s*[)\]]$/g, '')) !== null
  )
    return 'unit';
  if (!/\d/.test(plain)) return 'text';
  if (
    /^\(?\s*(?:1\/[GMk]?Pa|1\/psi|0[.,]01 in|0[.,]1 mm|0[.,]25 mm|1\/10 mm|kg\/m[3³]|g\/cm[3³]|Mg\/m[3³]|lb\/ft[3³]|J\/m[2²]|kJ\/m[2²]|m[2²]\/kg|10\^?6 ESALs?|[GMk]?Pa\^?-1)\s*\)?$/i.test(
      plain,
    )
  )
    return 'unit';
  return readsAsNumber(plain) ? 'value' : 'text';
}

/** Counts are units and headings at once; alone they head what is counted. */
const counted =
  /^(?:pass(?:es)?|cycles?|gyrations?|blows|revolutions|pasadas|passages|überrollungen|ciclos|giros|girations|zyklen|coups|golpes|hours?|minutes?|seconds?|degrees?|grade|pounds?|number|strain|ratio|count|esals?)$/i;

/** `4.2 %`, `<0.1`, `2,412`, `2.41*`; a range or a list of figures is words until a heading says otherwise. */
export function readsAsNumber(plain: string): boolean {
  const parsed = parseNumberText(plain, '.');
  if (parsed.state === 'text') return false;
  if (parsed.state === 'ambiguous') {
    if (parsed.reason === 'range') return false;
    return parsed.numbers.every(({ rest }) => isTail(rest));
  }
  return isTail(parsed.number.rest);
}

function isTail(rest: string): boolean {
  return rest === '' || /^(?:\*+|†|‡|\+)$/.test(rest) || unitOf(rest) !== null;
}
