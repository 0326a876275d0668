import type { Outcome } from '#rules/engine/finding';

export type MarkName = 'pass' | 'fail' | 'notshown' | 'undecided' | 'na' | 'borderline' | 'waived';

/** Shape and word first, colour third. */
export const markOfOutcome: Record<Outcome, MarkName> = {
  pass: 'pass',
  fail: 'fail',
  'not shown': 'notshown',
  undecided: 'undecided',
  'not applicable': 'na',
};

export const wordOfOutcome: Record<Outcome, string> = {
  pass: 'Pass',
  fail: 'Fail',
  'not shown': 'Not shown',
  undecided: 'Undecided',
  'not applicable': 'Not applicable',
};

export const wordOfMark: Record<MarkName, string> = {
  pass: 'Pass',
  fail: 'Fail',
  notshown: 'Not shown',
  undecided: 'Undecided',
  na: 'Not applicable',
  borderline: 'Borderline',
  waived: 'Fail, waived',
};

/** Class of the colour; a waived fail keeps fail's. */
export const colourOfMark: Record<MarkName, string> = {
  pass: 'outcome-pass',
  fail: 'outcome-fail',
  notshown: 'outcome-notshown',
  undecided: 'outcome-undecided',
  na: 'outcome-na',
  borderline: 'mark-borderline',
  waived: 'outcome-fail',
};
