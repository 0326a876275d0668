/** Median, least and greatest of several runs, in milliseconds. */
export interface Timing {
  medianMs: number;
  leastMs: number;
  greatestMs: number;
}

/** Runs of each that are not counted. */
export const WARM_UPS = 3;

/** Two things in turn, A B A B …, so that a drift of the machine's speed meets both alike. */
export async function inTurn(
  runs: number,
  first: () => unknown | Promise<unknown>,
  second: () => unknown | Promise<unknown>,
): Promise<{ first: Timing; second: Timing; ratio: number }> {
  const times: [number[], number[]] = [[], []];
  for (let run = -WARM_UPS; run < runs; run += 1) {
    for (const [index, act] of [first, second].entries()) {
      const start = performance.now();
      await act();
      if (run >= 0) times[index]?.push(performance.now() - start);
    }
  }
  const [a, b] = [timingOf(times[0]), timingOf(times[1])];
  return { first: a, second: b, ratio: a.medianMs / b.medianMs };
}

export function timingOf(times: number[]): Timing {
  const sorted = [...times].sort((a, b) => a - b);
  const at = (share: number) => sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))] ?? 0;
  return { medianMs: at(0.5), leastMs: at(0), greatestMs: at(1) };
}

export function told({ medianMs, leastMs, greatestMs }: Timing): string {
  return `${medianMs.toFixed(2)} ms (${leastMs.toFixed(2)} to ${greatestMs.toFixed(2)})`;
}
