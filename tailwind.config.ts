import type { Config } from 'tailwindcss';

/** One 4 px step at the default text size; the root is 14 px, so that text-only zoom moves space with type. */
const stepRem = 4 / 14;

const steps = [0, 0.5, 1, 1.5, 2, 2.5, 3, 3.5, 4, 5, 6, 7, 8, 10, 12, 16, 20, 24, 32, 40, 48, 64, 80, 96];

const spacing = Object.fromEntries(
  steps.map((step) => [String(step), step === 0 ? '0' : `${(step * stepRem).toFixed(4)}rem`]),
);

/** The page's tokens under their own names, so that a class and a style rule can never disagree. */
const config: Config = {
  content: ['./web/**/*.{ts,tsx,html}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: 'var(--paper)',
      'paper-sunk': 'var(--paper-sunk)',
      sheet: 'var(--sheet)',
      lane: 'var(--lane)',
      rule: 'var(--rule)',
      'rule-2': 'var(--rule-2)',
      ink: 'var(--ink)',
      'ink-2': 'var(--ink-2)',
      'ink-3': 'var(--ink-3)',
      pass: 'var(--pass)',
      fail: 'var(--fail)',
      notshown: 'var(--notshown)',
      undecided: 'var(--undecided)',
      na: 'var(--na)',
      note: 'var(--note)',
      'note-wash': 'var(--note-wash)',
      pencil: 'var(--pencil)',
      focus: 'var(--focus)',
      read: 'var(--read)',
      doubt: 'var(--doubt)',
      unused: 'var(--unused)',
    },
    fontFamily: { sans: 'var(--font)', mono: 'var(--mono)' },
    fontSize: {
      figure: ['0.7857rem', '1rem'],
      small: ['0.8571rem', '1.1429rem'],
      row: ['0.9286rem', '1.2857rem'],
      body: ['1rem', '1.4286rem'],
      lead: ['1.1429rem', '1.7143rem'],
      rule: ['1.4286rem', '2.1429rem'],
      title: ['1.8571rem', '2.2857rem'],
    },
    fontWeight: { normal: '400', medium: '500', word: '640', head: '650' },
    borderRadius: { none: '0', DEFAULT: '2px' },
    boxShadow: {},
    spacing,
    screens: { narrow: '760px', middle: '900px', wide: '1200px' },
  },
};

export default config;
