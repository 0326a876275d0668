import type { Draw } from './draw';
import type { ReadingInput } from './parts';
import type { Candidate } from './quantities';

export type At = NonNullable<ReadingInput['at']>;

/** What a rule names, and what its readings state: the same, another, nothing, or some of each. */
export interface Wanted {
  rule: At;
  /** Conditions of the reading of one specimen, by its place. */
  readings: (place: number) => At;
  /** Readings beside, such as the number that a name of gyrations stands for. */
  beside: ReadingInput[];
}

interface Choice {
  rule: At;
  same: At;
  near?: At;
  other: At;
}

/** The just matching and the just not matching temperature, loading time and more. */
const CHOICES: Choice[] = [
  {
    rule: { temperature: 25 },
    same: { temperature: 25 },
    near: { temperature: 25.5 },
    other: { temperature: 25.6 },
  },
  { rule: { temperature: -10 }, same: { temperature: -10.5 }, other: { temperature: -10.75 } },
  { rule: { time: 100 }, same: { time: 100 }, near: { time: 101 }, other: { time: 101.5 } },
  { rule: { variant: '5:1' }, same: { variant: '5:1' }, other: { variant: '3:1' } },
  { rule: { passes: 20000 }, same: { passes: 20000 }, other: { passes: 10000 } },
  { rule: { frequency: 10 }, same: { frequency: 10 }, other: { frequency: 10.01 } },
  { rule: { aging: 'long-term' }, same: { aging: 'long-term' }, other: { aging: 'short-term' } },
  { rule: { stress: 200 }, same: { stress: 200 }, other: { stress: 200.5 } },
  { rule: { gyrations: 100 }, same: { gyrations: 100 }, other: { gyrations: 75 } },
  { rule: { gyrations: 'design' }, same: { gyrations: 'design' }, other: { gyrations: 'initial' } },
  { rule: { laboratory: 'agency' }, same: { laboratory: 'agency' }, other: {} },
  { rule: {}, same: {}, other: { laboratory: 'agency' } },
  { rule: { trial: 'B' }, same: { trial: 'B' }, other: { trial: 'design' } },
  { rule: { trial: 'design' }, same: {}, near: { trial: 'design' }, other: { trial: 'B' } },
];

/** `design` against a number of gyrations, which a reading beside resolves, or nothing does. */
const BY_NAME: Choice[] = [
  { rule: { gyrations: 'maximum' }, same: { gyrations: 160 }, other: { gyrations: 115 } },
  { rule: { gyrations: 160 }, same: { gyrations: 'maximum' }, other: { gyrations: 115 } },
];

export function drawConditions(draw: Draw, candidate: Candidate): Wanted {
  if (candidate.isOfAggregate && !candidate.bySieve && draw.chance(15)) return ofStockpiles(draw);
  if (draw.chance(6)) return byName(draw);
  if (!draw.chance(45)) return { rule: {}, readings: () => ({}), beside: [] };
  const first = drawChoice(draw);
  if (!draw.chance(25)) return first;
  const second = drawChoice(draw);
  return {
    rule: { ...first.rule, ...second.rule },
    readings: (place) => ({ ...first.readings(place), ...second.readings(place) }),
    beside: [],
  };
}

function drawChoice(draw: Draw): Wanted {
  const choice = draw.oneOf(CHOICES);
  const beyond = draw.weighed([
    [58, [choice.same]],
    [10, [choice.same, choice.near ?? choice.same]],
    [8, [choice.near ?? choice.same]],
    [6, [choice.other]],
    [6, [{}]],
    [6, [choice.same, {}]],
    [6, [choice.same, choice.other]],
  ]);
  const rule = draw.chance(12) ? {} : choice.rule;
  return { rule, readings: (place) => beyond[place % beyond.length]!, beside: [] };
}

function byName(draw: Draw): Wanted {
  const { rule, same, other } = draw.oneOf(BY_NAME);
  const at = draw.oneOf([same, same, other, {}]);
  const beside: ReadingInput[] = draw.chance(70)
    ? [{ quantity: 'gyrations-maximum', value: 160, unit: 'gyrations', origin: 'measured' }]
    : [];
  return { rule, readings: () => at, beside };
}

function ofStockpiles(draw: Draw): Wanted {
  const rule = draw.oneOf<At>([{ stockpile: 'each' }, { stockpile: 'each' }, { stockpile: 'A' }, {}]);
  const stated = draw.oneOf<At[]>([
    [{ stockpile: 'A' }],
    [{ stockpile: 'A' }, { stockpile: 'B' }],
    [{ stockpile: 'B' }],
    [{}],
    [{ stockpile: 'A' }, {}],
  ]);
  return { rule, readings: (place) => stated[place % stated.length]!, beside: [] };
}
