import type { Quantity } from '../../quantities/quantity';
import { convert } from '../../quantities/units';
import type { Conditions, Reading } from '../../record';
import type { Cell } from '../cell-grid';
import { conditionsKey, type Place, placeOf, type ReadingLog } from '../reading-log';
import { type Alternative, doubtOf, type Understood } from '../settled';
import { readingInWords } from '../take-words';
import { type NumberValue, understandNumber } from '../understand-number';
import { unreadReasons } from '../unread-reason';
import type { Domain } from '../words/context-words';
import { acceptedConditions } from './accepted-conditions';
import type { Candidate } from './candidate';
import { decideGradations } from './decide-gradations';
import { type FindQuantity, resolveQuantities } from './resolve-quantity';
import { suspicions } from './suspicions';

/** A candidate whose quantity and conditions are settled as far as the layout can settle them. */
export interface Assigned extends Candidate {
  choices: Quantity[];
  conditions: Conditions;
}

export interface SettleOptions {
  log: ReadingLog;
  find: FindQuantity;
  decimalOf: (sheet: string) => '.' | ',';
}

/** From candidates of the whole workbook to readings, doubts and cells that are passed over. */
export function settleCandidates(candidates: Candidate[], options: SettleOptions): void {
  const neighbours = domainsOfTables(candidates, options.find);
  const assigned = candidates.map((each): Assigned => {
    const beside = neighbours.get(each.table) ?? [];
    const candidate = beside.length === 0 ? each : { ...each, domains: [...each.domains, ...beside] };
    const choices = resolveQuantities(candidate, options.find);
    const [first] = choices;
    return { ...candidate, choices, conditions: first ? acceptedConditions(candidate, first) : {} };
  });
  decideGradations(assigned, options.find);
  const kept = withoutAverages(withoutOtherMasses(assigned, options.log), options.log);
  numberReplicates(kept);
  freeFromSpecimen(kept);
  const suspected = suspicions(kept, options);
  const formulas = new Set<string>();
  for (const each of kept) emit(each, { ...options, suspected, formulas });
}

/** What the unmistakable headings of a table say about its others. */
function domainsOfTables(candidates: Candidate[], find: FindQuantity): Map<number, Domain[]> {
  const counts = new Map<number, { aggregate: number; mix: number }>();
  for (const { table, quantities } of candidates) {
    const subject = quantities.length === 1 ? find(quantities[0] as string)?.subject : undefined;
    if (subject === undefined || subject === 'binder') continue;
    const count = counts.get(table) ?? { aggregate: 0, mix: 0 };
    if (subject === 'aggregate') count.aggregate += 1;
    else count.mix += 1;
    counts.set(table, count);
  }
  return new Map(
    [...counts].map(([table, { aggregate, mix }]) => [
      table,
      aggregate > 0 && mix === 0 ? ['aggregate'] : mix > 0 && aggregate === 0 ? ['mix'] : [],
    ]),
  );
}

/** Weighings for the maximum gravity or for an aggregate's are no weighings of a compacted specimen. */
function withoutOtherMasses(assigned: Assigned[], log: ReadingLog): Assigned[] {
  const isMass = ({ choices }: Assigned) =>
    choices[0]?.id.startsWith('mass-') === true && choices[0]?.unit === 'g';
  const tables = new Map<number, Set<string>>();
  for (const { table, choices } of assigned) {
    const known = tables.get(table) ?? new Set<string>();
    for (const { id } of choices) known.add(id);
    tables.set(table, known);
  }
  return assigned.filter((each) => {
    if (!isMass(each)) return true;
    const beside = tables.get(each.table) ?? new Set();
    const isRice =
      beside.has('maximum-specific-gravity') &&
      !beside.has('bulk-specific-gravity-mix') &&
      !beside.has('mass-saturated-surface-dry');
    const isAggregate =
      each.at.stockpile !== undefined ||
      ['bulk-specific-gravity-aggregate', 'apparent-specific-gravity-aggregate'].some(
        (id) => beside.has(id) && !beside.has('bulk-specific-gravity-mix'),
      );
    const [nearest] = each.domains.filter((domain) =>
      ['mix', 'moisture', 'marshall', 'maximum-gravity', 'aggregate-gravity'].includes(domain),
    );
    if (!isRice && !isAggregate && nearest !== 'maximum-gravity' && nearest !== 'aggregate-gravity')
      return true;
    log.passOver(placeOf(each.index.sheet, each.cell), unreadReasons.rawData);
    return false;
  });
}

/** A mean whose specimens stand in the same table is recomputed from them; one without specimens is a reading. */
function withoutAverages(assigned: Assigned[], log: ReadingLog): Assigned[] {
  const keyOf = (each: Assigned) => {
    const { specimen: _, ...rest } = each.conditions;
    return `${each.table}|${each.choices[0]?.id}|${conditionsKey(rest)}`;
  };
  const specimens = new Set(assigned.filter(({ isAverage }) => !isAverage).map(keyOf));
  return assigned.filter((each) => {
    if (!each.isAverage) return true;
    const { specimen: _, ...rest } = each.conditions;
    each.conditions = rest;
    if (!specimens.has(keyOf(each))) return true;
    log.passOver(placeOf(each.index.sheet, each.cell), unreadReasons.average);
    return false;
  });
}

/** A result that several columns of specimens share stands in the first of them, or is merged over them all. */
function freeFromSpecimen(assigned: Assigned[]): void {
  const specimens = new Map<number, Set<string>>();
  const lines = new Map<string, number>();
  const lineOf = ({ table, cell }: Assigned) => `${table}|${cell.row}`;
  for (const each of assigned) {
    if (each.conditions.specimen === undefined) continue;
    lines.set(lineOf(each), (lines.get(lineOf(each)) ?? 0) + 1);
    const known = specimens.get(each.table) ?? new Set();
    known.add(each.conditions.specimen);
    specimens.set(each.table, known);
  }
  for (const each of assigned) {
    const [quantity] = each.choices;
    if (!quantity || each.conditions.specimen === undefined || each.specimenOfRow) continue;
    const isMerged = each.index.spanOf(each.cell).columns > 1;
    const isShared = quantity.kind === 'derived' || quantity.id === 'maximum-specific-gravity';
    const isAlone = lines.get(lineOf(each)) === 1 && (specimens.get(each.table)?.size ?? 0) > 1;
    if (!isMerged && !(isShared && isAlone)) continue;
    const { specimen: _, ...rest } = each.conditions;
    each.conditions = rest;
  }
}

/** Replicates that a table lists without numbers are told apart by their order. */
function numberReplicates(assigned: Assigned[]): void {
  const groups = new Map<string, Assigned[]>();
  for (const each of assigned) {
    const [quantity] = each.choices;
    if (!quantity || each.choices.length > 1 || each.isAverage || each.conditions.specimen !== undefined)
      continue;
    if (
      quantity.kind !== 'measured' &&
      quantity.subject !== 'specimen' &&
      !each.choices.some(({ id }) => id.startsWith('tensile') || id.endsWith('index'))
    )
      continue;
    if (
      quantity.subject === 'aggregate' ||
      quantity.subject === 'binder' ||
      quantity.id === 'binder-content' ||
      !each.isHeaded
    )
      continue;
    const key = `${each.table}|${quantity.id}|${conditionsKey(each.conditions)}`;
    const group = groups.get(key);
    if (group) group.push(each);
    else groups.set(key, [each]);
  }
  for (const group of groups.values()) {
    // Under one heading and beside the same words they are replicates; else they are two statements of one thing.
    const inLine = new Set(group.map(({ heading }) => heading)).size === 1;
    if (group.length < 2 || group.length > 12 || !inLine) continue;
    for (const [at, each] of group.entries())
      each.conditions = { ...each.conditions, specimen: String(at + 1) };
  }
}

interface EmitOptions extends SettleOptions {
  suspected: Map<Assigned, { reason: string; alternatives: number[] } | 'fraction'>;
  formulas: Set<string>;
}

function emit(each: Assigned, options: EmitOptions): void {
  const { log } = options;
  const { cell, choices, conditions } = each;
  const place = placeOf(each.index.sheet, cell);
  const [quantity] = choices;
  if (!quantity) {
    log.passOver(place, unreadReasons.notRecognised);
    return;
  }
  const lacking = lackingKey(quantity.id, conditions);
  if (lacking === 'stockpile' || lacking === 'sieve') {
    log.passOver(place, lacking === 'stockpile' ? unreadReasons.total : unreadReasons.notRecognised);
    return;
  }
  if (choices.length > 1) {
    emitAmbiguous(each, place, options);
    return;
  }
  const plain = suspicious(each, quantity, understandAs(each, quantity, options), options);
  const understood = lacking === 'time' && plain.state === 'value' ? timeUnknown(plain.value) : plain;
  if (understood.state === 'blank' || understood.state === 'none') {
    log.passOver(place, unreadReasons.noValue);
    return;
  }
  if (cell.kind === 'formula-without-result') {
    const block = `${each.table}|${quantity.id}`;
    if (options.formulas.has(block)) {
      log.use(place, 'doubt', 'A formula whose result was not saved, as in the cells before it.');
      return;
    }
    options.formulas.add(block);
  }
  const build = (value: NumberValue) => readingOf(each, quantity, value, place);
  const settled = log.settle(place, understood, { quantity: quantity.id, at: conditions }, (value) => ({
    reading: build(value),
  }));
  if (settled.state === 'left out') log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  const reading = build(settled.value);
  log.readings.push({ reading, place, taken: takenWords(each, reading, quantity) });
}

/** A share of no stockpile, a percentage on no sieve and a creep value at no time say nothing. */
function lackingKey(id: string, at: Conditions): 'stockpile' | 'sieve' | 'time' | null {
  if (id === 'stockpile-share') return at.stockpile === undefined ? 'stockpile' : null;
  if (id === 'percent-passing' || id.endsWith('percent-retained'))
    return at.sieve === undefined ? 'sieve' : null;
  const isTimed = id === 'creep-compliance' || id === 'creep-strain' || id.endsWith('-deformation');
  return isTimed && at.time === undefined ? 'time' : null;
}

function timeUnknown(value: NumberValue): Understood<NumberValue> {
  return doubtOf('does not say at which loading time it was taken', [
    { answer: 'as it stands', label: 'As it stands', value },
  ]);
}

function takenWords(each: Assigned, reading: Reading, quantity: Quantity): string {
  const { index, cell } = each;
  const hidden = index.isHidden(cell) ? ' · hidden in the workbook' : '';
  const elsewhere =
    cell.formula !== null && /\[\d+\]|\[[^\]]+\.xls/i.test(cell.formula) ? ' · from another workbook' : '';
  const remark = cell.comment === null ? '' : ` · remark: ${cell.comment}`;
  const why = each.heading === '' ? '' : ` · by ${each.heading.slice(0, 80)}`;
  return `${readingInWords(reading, quantity)}${hidden}${elsewhere}${remark}${why}`;
}

/** Where two quantities fit, neither is taken. */
function emitAmbiguous(each: Assigned, place: Place, options: EmitOptions): void {
  const alternatives = each.choices.flatMap((quantity) => {
    const understood = understandAs(each, quantity, options);
    const values: Alternative<NumberValue>[] =
      understood.state === 'value'
        ? [{ answer: String(understood.value.value), label: '', value: understood.value }]
        : [];
    return values.map(({ value }) => ({
      answer: quantity.id,
      label: quantity.label,
      value: { quantity, value },
    }));
  });
  const [only, ...more] = alternatives;
  // A range that leaves one of them only is as good as a word.
  if (only && more.length === 0 && each.choices.length > 1) {
    const narrowed = {
      ...each,
      choices: [only.value.quantity],
      conditions: acceptedConditions(each, only.value.quantity),
    };
    emit(narrowed, options);
    return;
  }
  const names = each.choices.map(({ label }) => label).join(' or ');
  const doubt = doubtOf(`may be ${names}; the heading does not say which`, alternatives);
  const settled = options.log.settle(place, doubt, {}, ({ quantity, value }) => ({
    reading: readingOf({ ...each, conditions: acceptedConditions(each, quantity) }, quantity, value, place),
  }));
  if (settled.state === 'left out') options.log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  const { quantity, value } = settled.value;
  const chosen = { ...each, choices: [quantity], conditions: acceptedConditions(each, quantity) };
  const reading = readingOf(chosen, quantity, value, place);
  options.log.readings.push({ reading, place, taken: takenWords(chosen, reading, quantity) });
}

function understandAs(
  each: Assigned,
  quantity: Quantity,
  { decimalOf, suspected }: EmitOptions,
): Understood<NumberValue> {
  const cell: Cell = each.written === null ? each.cell : writtenCell(each.cell, each.written);
  const decimal = decimalOf(each.index.sheet.name);
  const fits = each.unit !== null && convert(1, each.unit, quantity.unit).ok;
  const unclear = unitUnclear(each, quantity, cell, decimal);
  if (unclear) return unclear;
  // A figure of percent stands for the whole table; it is no unit of a gravity in one of its rows.
  const unit = fits || (each.unit !== null && each.unit !== '%') ? each.unit : null;
  return understandNumber(cell, {
    quantity,
    unit: each.unit === '%' && quantity.unit === '1' ? '%' : unit,
    unknownUnit: each.unknownUnit,
    decimal,
    inFractions: suspected.get(each) === 'fraction',
  });
}

function writtenCell(cell: Cell, written: string): Cell {
  return { ...cell, kind: 'text', value: written, text: written, format: null, formula: null };
}

/** Without a unit a figure is taken only where no other unit of the quantity makes it plausible too. */
function unitUnclear(
  each: Assigned,
  quantity: Quantity,
  cell: Cell,
  decimal: '.' | ',',
): Understood<NumberValue> | null {
  if (
    each.unit !== null ||
    each.unknownUnit !== null ||
    quantity.acceptedUnits.length < 2 ||
    cell.kind !== 'number'
  )
    return null;
  if (cell.format !== null && /"[^"]+"/.test(cell.format)) return null;
  const plausible = quantity.acceptedUnits.filter((unit) => {
    const converted = convert(Number(cell.value), unit, quantity.unit);
    return (
      converted.ok && converted.value >= quantity.plausible.min && converted.value <= quantity.plausible.max
    );
  });
  const [only] = plausible;
  if (plausible.length === 0 || (plausible.length === 1 && only === quantity.unit)) return null;
  // Zero and near-zero fit every unit; so do scales that differ by little. The canonical one is then as stated.
  const alternatives = plausible.flatMap((unit) => {
    const understood = understandNumber(cell, { quantity, unit, unknownUnit: null, decimal });
    return understood.state === 'value'
      ? [{ answer: `${cell.value} ${unit}`, label: `${cell.value} ${unit}`, value: understood.value }]
      : [];
  });
  return doubtOf('has no unit, and its figure does not tell which', alternatives);
}

function suspicious(
  each: Assigned,
  quantity: Quantity,
  understood: Understood<NumberValue>,
  options: EmitOptions,
): Understood<NumberValue> {
  if (understood.state !== 'value') return understood;
  const suspicion = options.suspected.get(each);
  if (suspicion && suspicion !== 'fraction') {
    return doubtOf<NumberValue>(suspicion.reason, [
      ...suspicion.alternatives.map((value) => ({
        answer: String(value),
        label: `${value} ${quantity.unit === '1' ? '' : quantity.unit}`.trim(),
        value: { value, converted: false },
      })),
      { answer: `as it stands`, label: 'As it stands', value: understood.value },
    ]);
  }
  const needsBasis = quantity.id === 'rap-content' || quantity.id === 'ras-content';
  if (needsBasis && !each.onMix)
    return doubtOf('does not say of what mass it is a percentage', [
      { answer: 'of mix', label: 'By mass of mix', value: understood.value },
    ]);
  if (quantity.id === 'binder-content' && each.onAggregate && understood.value.value !== null) {
    const ofAggregate = understood.value.value;
    return {
      state: 'value',
      value: {
        ...understood.value,
        value: Math.round((ofAggregate / (100 + ofAggregate)) * 1e14) / 1e12,
        converted: true,
      },
    };
  }
  return understood;
}

function readingOf(each: Assigned, quantity: Quantity, value: NumberValue, place: Place): Reading {
  const stated = quantity.kind === 'derived' ? 'reported' : 'measured';
  return {
    quantity: quantity.id,
    value: value.value,
    ...(value.qualifier ? { qualifier: value.qualifier } : {}),
    unit: quantity.unit,
    at: each.conditions,
    ...(each.method ? { method: each.method } : {}),
    origin: value.converted ? 'converted' : stated,
    ...(each.testedOn ? { testedOn: each.testedOn } : {}),
    source: place,
  };
}
