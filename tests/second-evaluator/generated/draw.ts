/** Choices for one case, taken one after another from a list of whole numbers; nought is the plainest choice. */
export interface Draw {
  /** From least to most, both included. */
  whole: (least: number, most: number) => number;
  oneOf: <T>(options: readonly T[]) => T;
  /** True in so many percent of cases; never when the choices have run out. */
  chance: (percent: number) => boolean;
  /** One option by weight. */
  weighed: <T>(options: readonly (readonly [weight: number, option: T])[]) => T;
}

export const CHOICES = 480;

export function drawFrom(choices: readonly number[]): Draw {
  let taken = 0;
  const next = () => choices[taken++] ?? 0;
  const whole = (least: number, most: number) => least + (next() % (most - least + 1));
  const oneOf = <T>(options: readonly T[]): T => options[whole(0, options.length - 1)]!;
  return {
    whole,
    oneOf,
    chance: (percent) => next() % 100 >= 100 - percent,
    weighed: (options) => {
      const all = options.reduce((sum, [weight]) => sum + weight, 0);
      let left = next() % all;
      for (const [weight, option] of options) {
        if (left < weight) return option;
        left -= weight;
      }
      return options[0]![1];
    },
  };
}

/** A decimal number from whole steps: 1395 of two decimals is 13.95. */
export function decimal(steps: number, decimals: number): number {
  return Number(`${steps}e-${decimals}`);
}

/** The same as a text that keeps its decimals. */
export function written(steps: number, decimals: number): string {
  const digits = String(Math.abs(steps)).padStart(decimals + 1, '0');
  const cut = digits.length - decimals;
  const sign = steps < 0 ? '-' : '';
  return decimals === 0 ? `${sign}${digits}` : `${sign}${digits.slice(0, cut)}.${digits.slice(cut)}`;
}
