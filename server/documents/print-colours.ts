import type { Outcome } from '#rules/engine/finding';

/** The light theme's tokens on white paper: black ink, outcome colours kept. */
export const printColours = {
  ink: '#1D1A15',
  ink2: '#4A4439',
  ink3: '#676051',
  rule: '#DDD6C6',
  rule2: '#857C6B',
  lane: '#E7E1D1',
  note: '#24489A',
  paper: '#FFFFFF',
} as const;

export const outcomeColours: Record<Outcome, string> = {
  pass: '#17664B',
  fail: '#B3241B',
  'not shown': '#7B2D6B',
  undecided: '#855200',
  'not applicable': '#676051',
};
