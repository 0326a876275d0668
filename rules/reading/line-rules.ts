import { convert } from '../quantities/units';
import type { Reading } from '../record';
import type { Cell } from './cell-grid';
import type { Said } from './correction';
import type { LayoutLine } from './layout/layout-lines';
import { ruleParts } from './layout/mapping-says';
import { cellsOfLine, linesOf } from './layout/tell-mapping';
import type { ToldCells } from './layout/told';
import type { SaidGroup } from './learn-mapping';
import { type MappingRule, mappingRuleSchema } from './mapping';
import { placeKey } from './reading-log';
import type { ReadingResult } from './reading-result';
import { type UnreadReason, unreadReasons } from './unread-reason';

interface Around {
  lines: readonly LayoutLine[];
  read: ReadingResult;
  told: ToldCells;
}

/**
 * Rules that mean the cells of each group and no others. Each is tried on the workbook itself: one that reaches further
 * than what was said is narrowed, by what stands over it and at last by its sheet, or not made.
 */
export function lineRules(
  groups: readonly SaidGroup[],
  around: Around,
): { rules: MappingRule[]; notLearned: string[] } {
  const rules = new Map<string, MappingRule>();
  const notLearned: string[] = [];
  const readingAt = new Map(
    around.read.record.readings.flatMap((reading) =>
      reading.source ? [[placeKey(reading.source), reading] as const] : [],
    ),
  );
  const passedOver = new Map(around.read.unread.map((each) => [placeKey(each), each.reason]));
  for (const group of groups) {
    const left = new Map(
      group.cells.map(({ sheet, cell }) => [placeKey({ sheet, cell: cell.address }), { sheet, cell }]),
    );
    const isMeant = (sheet: string, cell: Cell) => {
      const key = placeKey({ sheet, cell: cell.address });
      return (
        left.has(key) || isIndifferent(group.says, cell, { key, sheet, ...around, readingAt, passedOver })
      );
    };
    const all = new Set(left.keys());
    const isOwn = (sheet: string, cell: Cell) =>
      all.has(placeKey({ sheet, cell: cell.address })) || isMeant(sheet, cell);
    for (const make of [wholeColumns, wholeRows, singleCells]) {
      for (const line of around.lines) {
        for (const rule of make(line, { left, says: group.says, lines: around.lines })) {
          const narrow = narrowed(rule, line, around.lines, isOwn);
          if (narrow === null) continue;
          rules.set(narrow.id, narrow);
          for (const found of linesOf(narrow, around.lines))
            for (const cell of cellsOfLine(narrow, found))
              left.delete(placeKey({ sheet: found.index.sheet.name, cell: cell.address }));
        }
      }
    }
    for (const { sheet, cell } of left.values()) {
      const place = sheet === '' ? cell.address : `${sheet} ${cell.address}`;
      notLearned.push(
        `${place}: only its place tells it from its neighbours, so it holds for this workbook.`,
      );
    }
  }
  return { rules: [...rules.values()], notLearned };
}

type Left = ReadonlyMap<string, { sheet: string; cell: Cell }>;

/** One value under a heading is a column only where nothing beside it says what it is. */
function wholeColumns(
  line: LayoutLine,
  { left, says, lines }: { left: Left; says: Said; lines: readonly LayoutLine[] },
): MappingRule[] {
  if (line.axis !== 'down' || !hasAny(line, line.cells, left)) return [];
  const isLabelled = (cell: Cell) =>
    lines.some(
      (each) =>
        each.axis === 'right' && each.isLabel && each.index === line.index && each.cells.includes(cell),
    );
  if (line.cells.length === 1 && line.cells.every(isLabelled)) return [];
  return [ruleOf(line, says, {})];
}

function wholeRows(line: LayoutLine, { left, says }: { left: Left; says: Said }): MappingRule[] {
  const isRow = line.axis === 'right' && line.isLabel;
  return isRow && hasAny(line, line.cells, left) ? [ruleOf(line, says, {})] : [];
}

/** One column of one labelled row. */
function singleCells(line: LayoutLine, { left, says }: { left: Left; says: Said }): MappingRule[] {
  if (line.axis !== 'right' || !line.isLabel) return [];
  return line.cells.flatMap((cell) => {
    const head = line.headOf.get(cell.column);
    return head !== undefined && hasAny(line, [cell], left) ? [ruleOf(line, says, { under: [head] })] : [];
  });
}

function hasAny({ index }: LayoutLine, cells: Cell[], left: Left): boolean {
  return cells.some((cell) => left.has(placeKey({ sheet: index.sheet.name, cell: cell.address })));
}

function ruleOf(line: LayoutLine, says: Said, { under }: { under?: string[] }): MappingRule {
  return mappingRuleSchema.parse({
    id: 'new',
    anchor: {
      sheet: null,
      header: line.header,
      ...(under ? { under } : {}),
      unit: line.unit,
      between: line.between,
    },
    axis: line.axis,
    ...ruleParts(says),
  });
}

/** The rule in its widest form that reaches no cell beyond those that are meant; null where there is none. */
function narrowed(
  rule: MappingRule,
  line: LayoutLine,
  lines: readonly LayoutLine[],
  isOwn: (sheet: string, cell: Cell) => boolean,
): MappingRule | null {
  const title = line.titles.at(-1);
  const forms = [
    rule.anchor,
    ...(title === undefined ? [] : [{ ...rule.anchor, header: [title, ...rule.anchor.header] }]),
    { ...rule.anchor, sheet: line.index.sheet.name },
  ];
  for (const anchor of forms) {
    const form = { ...rule, anchor };
    const found = linesOf(form, lines);
    const reaches = found.every((each) =>
      cellsOfLine(form, each).every((cell) => isOwn(each.index.sheet.name, cell)),
    );
    if (!reaches || !found.includes(line)) continue;
    const hasSameNeighbours = found.every(
      (each) => each === line || String(each.between) === String(line.between),
    );
    const { between: _, ...loose } = anchor;
    const kept = hasSameNeighbours ? anchor : loose;
    return { ...form, id: idOf(form), anchor: { ...kept, times: found.length } };
  }
  return null;
}

function idOf({ axis, anchor: { sheet, header, under } }: MappingRule): string {
  const where = sheet === null ? '' : `${sheet}: `;
  return `${where}${header.join(' / ')}${under ? ` under ${under.join(', ')}` : ''} (${axis})`;
}

interface AtCell extends Around {
  key: string;
  sheet: string;
  readingAt: ReadonlyMap<string, Reading>;
  passedOver: ReadonlyMap<string, string>;
}

const noResult: ReadonlySet<string> = new Set<UnreadReason>([
  unreadReasons.average,
  unreadReasons.spread,
  unreadReasons.limit,
  unreadReasons.total,
  unreadReasons.difference,
  unreadReasons.noValue,
]);

/** Nothing changes for the cell if the rule means it too: it is no result, was told for itself, or is read so already. */
function isIndifferent(says: Said, cell: Cell, { key, sheet, told, readingAt, passedOver }: AtCell): boolean {
  if (noResult.has(passedOver.get(key) ?? '')) return true;
  const of = told.at(sheet, cell);
  if (of !== null && of.by === 'correction') return true;
  const reading = readingAt.get(key);
  if (says.kind !== 'reading' || !reading || reading.quantity !== says.quantity) return false;
  const hasConditions = Object.entries(says.at).every(
    ([name, value]) => reading.at[name as keyof typeof reading.at] === value,
  );
  if (!hasConditions || says.unit === null) return hasConditions;
  if (says.unit === '1' && reading.unit === '%') return false;
  const converted = convert(Number(cell.value), says.unit, reading.unit);
  return converted.ok && reading.value !== null && Math.abs(converted.value - reading.value) < 1e-9;
}
