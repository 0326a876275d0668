import { sieveFromName } from '../../quantities/sieves';
import { convert } from '../../quantities/units';
import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { plainText } from '../plain-text';
import { certain, doubtOf, type Understood } from '../settled';
import { understandCondition } from '../understand-condition';
import type { LabelMeaning, LabelReader } from './label-meaning';

/** What a cell of keys says: its condition, several of them, or nothing ("Combined" is no stockpile). */
export function keyConditions(
  key: ConditionName,
  cell: Cell,
  { labels, unit, decimal }: { labels: Pick<LabelReader, 'read'>; unit: string | null; decimal: '.' | ',' },
): Understood<Conditions> {
  const text = plainText(cell.text);
  if (key === 'sieve') return sieveCondition(cell, unit);
  if (
    key === 'temperature' ||
    key === 'time' ||
    key === 'stress' ||
    key === 'passes' ||
    key === 'frequency'
  ) {
    return measuredCondition(key, cell, unit, decimal);
  }
  // A sentence is no name.
  if (text.length > longestName) return { state: 'none' };
  const meaning = cell.kind === 'text' ? labels.read(text) : null;
  const stated = meaning ? namedCondition(key, text, meaning) : undefined;
  if (stated !== undefined) return certain(stated);
  const understood = understandCondition(key, cell, unit, decimal);
  if (key === 'laboratory' && understood.state === 'doubt') return { state: 'none' };
  return asConditions(key, understood);
}

function asConditions(
  key: ConditionName,
  understood: Understood<NonNullable<Conditions[ConditionName]>>,
): Understood<Conditions> {
  const build = (value: unknown) => ({ [key]: value }) as Conditions;
  if (understood.state === 'value') return certain(build(understood.value));
  if (understood.state !== 'doubt') return understood;
  const alternatives = understood.alternatives.map((each) => ({ ...each, value: build(each.value) }));
  return doubtOf(understood.reason, alternatives);
}

const longestName = 60;

/** What a binder or a mix has gone through before the test. */
const agings =
  /^(?:original|unaged|tank|rtfo\w*|pav\w*|rtfo\s*\+\s*pav|stoa|ltoa|short[- ]term.*|long[- ]term.*|aged|\d+\s*h\b.*)$/i;

const combined =
  /^(?:blend|combined|combination|composite|total|all|total blend|combined blend|combined gradation|combined aggregate|aggregate blend|blended|job mix blend|gemisch|gesamt|kornmischung|m[ée]lange|combin[ée]e?|combinad[oa]|mezcla|mezcla combinada|sieblinie|resultante|courbe|mixture|mix|theoretical blend|calculated blend|total aggregate|combined agg\.?|blend gradation|gesteinskörnungsgemisch|mineralstoffgemisch|stockpile blend|computed blend|blend \(calc(?:ulated)?\.?\)|result)\.?$/i;

function namedCondition(key: ConditionName, text: string, meaning: LabelMeaning): Conditions | undefined {
  const { at } = meaning;
  if (key === 'laboratory') return at.laboratory ? { laboratory: at.laboratory } : undefined;
  if (key === 'variant') {
    if (at.variant !== undefined) return { variant: at.variant };
    if (agings.test(text)) return { aging: text };
    return meaning.subset ? { variant: meaning.subset } : { variant: text.toLowerCase() };
  }
  if (key === 'stockpile') {
    if (combined.test(text)) return {};
    if (at.trial === 'design') return { trial: 'design' };
    if (at.blend !== undefined) return { blend: at.blend };
    return { stockpile: text };
  }
  if (key === 'trial' || key === 'blend') {
    if (at.trial !== undefined || at.blend !== undefined)
      return {
        ...(at.trial ? { trial: at.trial } : {}),
        ...(at.blend ? { blend: at.blend } : {}),
        ...(at.specimen ? { specimen: at.specimen } : {}),
      };
    if (meaning.binder !== null) return { trial: meaning.binder };
    return undefined;
  }
  if (key === 'specimen') {
    if (at.specimen === undefined && at.trial === undefined) return undefined;
    return { ...(at.trial ? { trial: at.trial } : {}), ...(at.specimen ? { specimen: at.specimen } : {}) };
  }
  return undefined;
}

function sieveCondition(cell: Cell, unit: string | null): Understood<Conditions> {
  const plain = plainText(cell.text);
  if (/^(?:pan|fond|fondo|schale|boden|total|sum|tamisat)\b/i.test(plain)) return { state: 'none' };
  if (cell.kind === 'number' && unit !== null && unit !== 'mm') {
    const opening = sieveFromName(`${cell.value} ${unit}`);
    if (opening !== null) return certain({ sieve: opening });
  }
  // "3/4 in (19.0 mm)", "No. 200 / 0.075": both names of one sieve.
  if (cell.kind === 'text' && sieveFromName(plain) === null) {
    const parts = plain
      .split(/[()[\]]|\s[/|–-]\s|\s{2,}|;/)
      .map((part) => sieveFromName(part))
      .filter((opening) => opening !== null);
    const [first] = parts;
    if (first !== undefined && new Set(parts).size === 1) return certain({ sieve: first });
    const marked = /^(.+?)\s+(\d+(?:[.,]\d+)?\s*mm)$/i.exec(plain);
    const both = marked ? [sieveFromName(marked[1] ?? ''), sieveFromName(marked[2] ?? '')] : [];
    if (both[1] !== undefined && both[1] !== null && (both[0] === null || both[0] === both[1]))
      return certain({ sieve: both[1] });
    const numbered = /^(?:nr|n°|nº|sieve|mesh|tamiz|malla)\.?\s*(?:no\.?\s*)?#?\s*(\d+)$/i.exec(plain);
    const opening = numbered ? sieveFromName(`No. ${numbered[1]}`) : null;
    if (opening !== null) return certain({ sieve: opening });
  }
  const understood = understandCondition('sieve', cell, unit, '.');
  return asConditions('sieve', understood);
}

const canonical = { temperature: '°C', time: 's', stress: 'kPa', passes: 'passes', frequency: 'Hz' } as const;

function measuredCondition(
  key: keyof typeof canonical,
  cell: Cell,
  unit: string | null,
  decimal: '.' | ',',
): Understood<Conditions> {
  const fits = unit !== null && convert(1, unit, canonical[key]).ok;
  const understood = understandCondition(key, cell, fits ? unit : null, decimal);
  if (understood.state !== 'value') return asConditions(key, understood);
  // A test is not made above 65 °C unless its sheet says so; without a unit it is as likely °F.
  if (key === 'temperature' && !fits && cell.kind === 'number' && Number(cell.value) > 65) {
    const other = convert(Number(cell.value), '°F', '°C');
    const alternatives = [
      ...(other.ok
        ? [{ answer: `${cell.value} °F`, label: `${cell.value} °F`, value: { temperature: other.value } }]
        : []),
      { answer: `${cell.value} °C`, label: `${cell.value} °C`, value: { temperature: Number(cell.value) } },
    ];
    return doubtOf(`says ${cell.text} without a unit of temperature`, alternatives);
  }
  return asConditions(key, understood);
}
