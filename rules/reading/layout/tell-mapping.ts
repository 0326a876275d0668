import { convert } from '../../quantities/units';
import type { Cell } from '../cell-grid';
import type { Said } from '../correction';
import type { Mapping, MappingRule } from '../mapping';
import { labelKey } from '../plain-text';
import { placeOf, type ReadingLog } from '../reading-log';
import type { Departure } from '../reading-result';
import { doubtOf } from '../settled';
import type { LabelReader } from './label-meaning';
import { headingText, type LayoutLine, sameHeading } from './layout-lines';
import { saidByRule } from './mapping-says';
import type { ToldCells } from './told';

interface Telling {
  told: ToldCells;
  lines: readonly LayoutLine[];
  labels: Pick<LabelReader, 'read'>;
  log: ReadingLog;
  departures: Departure[];
  /** Whether the layout that was learned has such a heading, as far as is kept of it. */
  knows: (heading: string) => boolean;
  /** What an answer made of a departure, for the mapping to learn; `says` is null where the headings win. */
  decided: DecidedLine[];
}

export interface DecidedLine {
  rule: string;
  line: LayoutLine;
  cells: Cell[];
  says: Said | null;
}

/**
 * What a laboratory's mapping says of the cells of a workbook of its layout. Where the workbook departs from the
 * layout that was learned, the heading is doubted: neither the mapping nor the heading alone is taken at its word.
 */
export function tellMapping(mapping: Mapping, telling: Telling): void {
  const known = new Set<LayoutLine>();
  const gone: { rule: MappingRule; says: Said }[] = [];
  for (const rule of mapping.rules) {
    const says = saidByRule(rule);
    if (says === null) continue;
    const found = linesOf(rule, telling.lines);
    for (const line of found) known.add(line);
    if (found.length === 0) gone.push({ rule, says });
    for (const [at, line] of found.entries())
      tellLine({ rule, says, line, isMore: isMore(rule, at) }, telling);
  }
  for (const each of gone) tellGone(each, known, telling);
}

/** The lines that a rule's anchor names. */
export function linesOf(
  rule: Pick<MappingRule, 'anchor' | 'axis'>,
  lines: readonly LayoutLine[],
): LayoutLine[] {
  const { sheet, header } = rule.anchor;
  const lowest = headingText(header.at(-1) ?? '');
  return lines.filter(
    (line) =>
      line.axis === rule.axis &&
      (sheet === null || labelKey(sheet) === labelKey(line.index.sheet.name)) &&
      sameHeading(line.header.at(-1) ?? null, lowest) &&
      standsUnder(header.slice(0, -1), [...line.titles, ...line.header.slice(0, -1)]),
  );
}

/** The values of a line that a rule means. */
export function cellsOfLine({ anchor }: Pick<MappingRule, 'anchor'>, line: LayoutLine): Cell[] {
  const { under } = anchor;
  if (under === undefined) return line.cells;
  return line.cells.filter(({ column }) => {
    const head = line.headOf.get(column);
    return head !== undefined && under.some((each) => sameHeading(each, head));
  });
}

function standsUnder(upper: string[], over: string[]): boolean {
  let from = 0;
  for (const text of upper) {
    const at = over.findIndex((each, position) => position >= from && sameHeading(each, headingText(text)));
    if (at === -1) return false;
    from = at + 1;
  }
  return true;
}

/** Whose a value is was said of one place; a second place of the same heading may be another's. */
function isMore({ anchor, at }: MappingRule, position: number): boolean {
  return anchor.times !== undefined && position >= anchor.times && Object.keys(at).length > 0;
}

interface RuleAtLine {
  rule: MappingRule;
  says: Said;
  line: LayoutLine;
  isMore: boolean;
}

function tellLine(each: RuleAtLine, telling: Telling): void {
  const { rule, line } = each;
  const cells = cellsOfLine(rule, line);
  const unit = unitDeparture(each);
  const moved = movedDeparture(each, telling);
  const departure = unit ?? moved;
  if (departure === null) {
    tellCells(each.says, cells, line, telling);
    return;
  }
  const { text, kind, choices } = departure;
  telling.departures.push({
    rule: rule.id,
    kind,
    sheet: line.index.sheet.name,
    cell: line.anchor.address,
    text: `The heading ${text}.`,
  });
  settleLine({ rule, reason: text, choices, says: each.says, cells, line }, telling);
}

interface Choice {
  answer: string;
  label: string;
  /** Null: as if there were no mapping. */
  value: Said | null;
}

interface OpenLine {
  rule: MappingRule;
  reason: string;
  choices: Choice[];
  says: Said;
  cells: Cell[];
  line: LayoutLine;
}

function settleLine({ rule, reason, choices, says, cells, line }: OpenLine, telling: Telling): void {
  const about =
    says.kind === 'reading'
      ? { quantity: says.quantity }
      : says.kind === 'attribute'
        ? { attribute: says.name }
        : {};
  const place = placeOf(line.index.sheet, line.anchor);
  const settled = telling.log.settle(place, doubtOf(reason, choices), about, () => ({}));
  if (settled.state === 'value') {
    telling.decided.push({ rule: rule.id, line, cells, says: settled.value });
    if (settled.value !== null) tellCells(settled.value, cells, line, telling);
    return;
  }
  const kind = settled.state === 'left out' ? 'left out' : 'in doubt';
  for (const cell of cells)
    telling.told.tell({ says: { kind }, by: 'mapping', sheet: line.index.sheet.name, cell });
}

function tellCells(says: Said, cells: Cell[], line: LayoutLine, { told }: Telling): void {
  for (const cell of cells) told.tell({ says, by: 'mapping', sheet: line.index.sheet.name, cell });
}

interface LineDeparture {
  kind: Departure['kind'];
  text: string;
  choices: Choice[];
}

const byHeadings: Choice = { answer: 'by its headings', label: 'As its headings say', value: null };

function asMapping(says: Said): Choice {
  return { answer: 'as the mapping says', label: 'As the mapping says', value: says };
}

/** Another unit than the one that stood there when the rule was learned. */
function unitDeparture({ rule, says, line }: RuleAtLine): LineDeparture | null {
  const before = rule.anchor.unit;
  if (before === undefined || says.kind !== 'reading' || before === line.unit) return null;
  const meant = says.unit ?? before;
  // The heading names by now what the mapping has known all along.
  if (line.unit !== null && meant !== null && line.unit === meant) return null;
  const units = [...new Set([line.unit, meant])].filter((unit) => unit !== null);
  const fitting = units.filter((unit) => unit === '1' || convert(1, unit, units[0] ?? unit).ok);
  return {
    kind: 'unit',
    text: `“${line.header.at(-1)}” ${statesUnit(line.unit)}, where the mapping knows it ${before === null ? 'without a unit' : `in ${before}`}`,
    choices: [
      ...fitting.map((unit) => ({
        answer: `in ${unit}`,
        label: unit === '1' ? 'As a fraction of one' : `In ${unit}`,
        value: { ...says, unit },
      })),
      byHeadings,
    ],
  };
}

function statesUnit(unit: string | null): string {
  return unit === null ? 'states no unit' : `states ${unit}`;
}

/** Other headings of the layout stand beside it now: it may be another column of the same name. */
function movedDeparture(
  { rule, says, line, isMore }: RuleAtLine,
  { labels, knows }: Telling,
): LineDeparture | null {
  const { between } = rule.anchor;
  const isSame = between === undefined || standsBetween(between, line.between, knows);
  if (isSame && !isMore) return null;
  if (!isMore && saysByItself(says, line, labels)) return null;
  const text = isMore
    ? `“${line.header.at(-1)}” stands here once more than in the layout that the mapping knows`
    : `“${line.header.at(-1)}” stands beside other headings than in the layout that the mapping knows`;
  return { kind: 'moved', text, choices: [asMapping(says), byHeadings] };
}

/**
 * A heading that is new to the layout may have come between; one that the layout knows stands where it did not, so that
 * headings have changed places, with what is under them or without.
 */
function standsBetween(
  then: [string | null, string | null],
  now: [string | null, string | null],
  knows: (heading: string) => boolean,
): boolean {
  const same = [sameHeading(then[0], now[0]), sameHeading(then[1], now[1])];
  if (!same.includes(true)) return false;
  return same.every((isSame, side) => {
    const other = now[side] ?? null;
    return isSame || (other !== null && !knows(other));
  });
}

/** The heading alone says what the mapping says, so nothing hangs on where it stands. */
function saysByItself(says: Said, line: LayoutLine, labels: Telling['labels']): boolean {
  if (says.kind !== 'reading' || Object.keys(says.at).length > 0 || says.unit !== null) return false;
  const meaning = labels.read(line.anchor.text);
  return meaning.quantities.length === 1 && meaning.quantities[0] === says.quantity;
}

/** A heading that is gone is said; what stands between the same neighbours by now may be the same thing renamed. */
function tellGone(
  { rule, says }: { rule: MappingRule; says: Said },
  known: ReadonlySet<LayoutLine>,
  telling: Telling,
): void {
  const name = rule.anchor.header.at(-1) ?? '';
  const [before, behind] = rule.anchor.between ?? [null, null];
  const inItsPlace = telling.lines.filter(
    (line) =>
      line.axis === rule.axis &&
      !known.has(line) &&
      (before !== null || behind !== null) &&
      sameHeading(before, line.between[0]) &&
      sameHeading(behind, line.between[1]),
  );
  telling.departures.push({
    rule: rule.id,
    kind: 'gone',
    sheet: inItsPlace[0]?.index.sheet.name ?? null,
    cell: inItsPlace[0]?.anchor.address ?? null,
    text: `The heading “${name}” is nowhere in this workbook.`,
  });
  for (const line of inItsPlace) {
    const reason = `“${line.header.at(-1)}” stands where the mapping knows “${name}”`;
    const choices = [asMapping(says), byHeadings];
    settleLine({ rule, reason, choices, says, cells: cellsOfLine(rule, line), line }, telling);
  }
}
