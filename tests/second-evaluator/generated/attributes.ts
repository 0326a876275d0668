import type { MixRecordInput } from '#rules/record';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import type { Draw } from './draw';
import type { DoubtInput, ReadingInput } from './parts';

type Scalar = number | string | boolean;
type Condition = NonNullable<RuleInput['when']>;

export const SIZES = [9.5, 12.5, 19, 25];
const COURSES = ['surface', 'intermediate', 'binder', 'base'];
const MIXES = ['dense-graded', 'open-graded', 'stone-matrix'];
const DATES = ['2025-12-31', '2026-01-01', '2026-02-15'];

export const DECLARED: RuleSetInput['attributes'] = [
  { name: 'nominalMaximumSize', type: 'number', unit: 'mm', values: SIZES },
  {
    name: 'mixType',
    type: 'text',
    values: MIXES.map((value) => ({ value, aliases: [`${value} asphalt`] })),
  },
  { name: 'hasAntiStrip', type: 'boolean' },
  { name: 'pavedOn', type: 'date' },
];

interface Choice {
  name: string;
  /** As a rule writes it. */
  values: readonly Scalar[];
  isOrdered: boolean;
  /** As a workbook may write the same, and what it may write that means nothing. */
  stated: (draw: Draw, value: Scalar) => Scalar;
  senseless: Scalar;
}

const CHOICES: Choice[] = [
  {
    name: 'nominalMaximumSize',
    values: SIZES,
    isOrdered: true,
    stated: (draw, value) => (draw.chance(10) ? String(value) : value),
    senseless: 4.2,
  },
  {
    name: 'designTraffic',
    values: [0.3, 3, 10, 30],
    isOrdered: true,
    stated: (draw, value) => (draw.chance(25) ? Number(value) + 0.05 : value),
    senseless: '3 or so',
  },
  {
    name: 'course',
    values: COURSES,
    isOrdered: false,
    stated: (draw, value) => {
      if (draw.chance(20)) return `${String(value).toUpperCase()} Course`;
      return value === 'surface' && draw.chance(20) ? 'Wearing course' : value;
    },
    senseless: 'upper',
  },
  {
    name: 'mixType',
    values: MIXES,
    isOrdered: false,
    stated: (draw, value) => draw.oneOf([value, `${value} asphalt`, String(value).replace('-', ' ')]),
    senseless: 'cold',
  },
  {
    name: 'hasAntiStrip',
    values: [true, false],
    isOrdered: false,
    stated: (_draw, value) => value,
    senseless: 'perhaps',
  },
  {
    name: 'pavedOn',
    values: DATES,
    isOrdered: true,
    stated: (_draw, value) => value,
    senseless: 'in spring',
  },
  {
    name: 'binderGrade',
    values: ['PG 64-22', 'PG 70-22'],
    isOrdered: false,
    stated: statedGrade,
    senseless: '',
  },
];

function statedGrade(draw: Draw, value: Scalar): Scalar {
  return draw.chance(30) ? String(value).toLowerCase().replace(' ', '-') : value;
}

export interface StatedAttributes {
  attributes: NonNullable<MixRecordInput['attributes']>;
  facts: Record<string, Scalar>;
  doubts: DoubtInput[];
  /** What the mix truly is, whether it is stated or not. */
  meant: Record<string, Scalar>;
}

/** Attributes of the mix: stated, left to the project, missing, senseless or in doubt. */
export function drawAttributes(draw: Draw): StatedAttributes {
  const result: StatedAttributes = { attributes: {}, facts: {}, doubts: [], meant: {} };
  for (const choice of CHOICES) {
    const meant = draw.oneOf(choice.values);
    result.meant[choice.name] = meant;
    const value = choice.stated(draw, meant);
    const how = draw.weighed([
      [74, 'stated'],
      [6, 'by the project'],
      [11, 'missing'],
      [4, 'senseless'],
      [5, 'in doubt'],
    ] as const);
    if (how === 'stated') result.attributes[choice.name] = { value, origin: 'reported' };
    if (how === 'by the project') result.facts[choice.name] = value;
    if (how === 'senseless' && choice.senseless !== '') {
      result.attributes[choice.name] = { value: choice.senseless, origin: 'reported' };
    }
    if (how === 'in doubt') {
      result.doubts.push(doubtAbout(draw, choice, value));
      if (draw.chance(60)) result.attributes[choice.name] = { value, origin: 'reported' };
    }
  }
  return result;
}

function doubtAbout(draw: Draw, { name, values, senseless }: Choice, stated: Scalar): DoubtInput {
  const alternatives = [draw.oneOf(values), draw.oneOf(values)].slice(0, draw.whole(0, 2));
  return {
    sheet: 'Cover',
    cell: 'C4',
    text: String(senseless),
    reason: 'Two values are in one cell.',
    alternatives: [...alternatives, ...(alternatives.length > 0 ? [stated] : [])].map((value, i) => ({
      answer: String(i),
      label: String(value),
      attribute: { name, value: { value, origin: 'reported' } },
    })),
    about: { attribute: name },
  };
}

/** A condition that holds, fails or cannot be told, nested up to three deep. */
export function drawWhen(draw: Draw, meant: Record<string, Scalar>, depth = 0): Condition {
  const form = depth >= 3 ? 'leaf' : draw.oneOf(['leaf', 'leaf', 'all', 'any', 'not'] as const);
  if (form === 'leaf') return drawComparison(draw, meant);
  if (form === 'not') return { not: drawWhen(draw, meant, depth + 1) };
  const parts = Array.from({ length: draw.whole(1, 3) }, () => drawWhen(draw, meant, depth + 1));
  return form === 'all' ? { all: parts } : { any: parts };
}

function drawComparison(draw: Draw, meant: Record<string, Scalar>): Condition {
  if (draw.chance(15)) return ofQuantity(draw);
  const choice = draw.oneOf(CHOICES);
  const fact = choice.name;
  const value = draw.chance(60) ? meant[fact]! : draw.oneOf(choice.values);
  const order = ['lessThan', 'lessThanInclusive', 'greaterThan', 'greaterThanInclusive'] as const;
  if (choice.isOrdered && draw.chance(40)) {
    if (fact !== 'pavedOn' || typeof value === 'string') return { fact, operator: draw.oneOf(order), value };
  }
  if (draw.chance(40)) {
    const list = [value, ...choice.values.filter((each) => each !== value && draw.chance(30))];
    return { fact, operator: draw.oneOf(['in', 'notIn'] as const), value: list };
  }
  return { fact, operator: draw.oneOf(['equal', 'notEqual'] as const), value };
}

/** Only conditions compare it. */
const COMPARED = 'lime-content';

function ofQuantity(draw: Draw): Condition {
  const orders = [
    'lessThan',
    'lessThanInclusive',
    'greaterThan',
    'greaterThanInclusive',
    'equal',
    'notEqual',
  ] as const;
  const params = { quantity: COMPARED, ...(draw.chance(25) ? { at: { aging: 'none' } } : {}) };
  return { fact: 'quantity', params, operator: draw.oneOf(orders), value: draw.oneOf([1, 1.5, 2]) };
}

/** What is stated of the compared quantity: once or of specimens, censored, in doubt, of another trial, or nothing. */
export function drawCompared(draw: Draw): { readings: ReadingInput[]; doubts: DoubtInput[] } {
  const how = draw.weighed([
    [60, 'once'],
    [12, 'of specimens'],
    [6, 'of another trial'],
    [6, 'censored'],
    [6, 'in doubt'],
    [10, 'nothing'],
  ] as const);
  const at = draw.chance(30) ? { aging: 'none' } : {};
  const value = draw.oneOf([1, 1.5, 2, 1.25]);
  const reading: ReadingInput = { quantity: COMPARED, value, unit: '%', at, origin: 'measured' };
  const cell = { sheet: 'Tests', cell: 'E30', text: '?', reason: 'The cell cannot be read.' };
  const doubt = { ...cell, alternatives: [], about: { quantity: COMPARED, at } };
  if (how === 'in doubt') return { readings: [], doubts: [doubt] };
  const specimens = ['1', '2'].map((specimen, i) => ({
    ...reading,
    value: value + i,
    at: { ...at, specimen },
  }));
  const readings: Record<typeof how, ReadingInput[]> = {
    once: [reading],
    'of specimens': specimens,
    'of another trial': [{ ...reading, at: { ...at, trial: 'B' } }],
    censored: [{ ...reading, qualifier: '<' }],
    nothing: [],
  };
  return { readings: readings[how], doubts: [] };
}

export function drawAllowed(draw: Draw): { attribute: string; values: readonly Scalar[]; isNumber: boolean } {
  const choice = draw.oneOf(CHOICES);
  const isNumber = typeof choice.values[0] === 'number';
  return { attribute: choice.name, values: choice.values, isNumber };
}
