import type { Conditions, Reading } from '#rules/record';
import type { StatedReading } from './stated-truth';

const names = ['trial', 'specimen', 'blend'] as const;
/** Which test specimens were made for is said beside their voids and masses, so that they are not the design's. */
const madeFor = new Set([
  'dry',
  'conditioned',
  'wheel tracking',
  'loaded wheel',
  'disk-shaped',
  'cracking',
  'modulus',
  'creep',
]);
type Name = (typeof names)[number];

/** How a reader calls the trials, specimens and blends of a workbook: one other name for each is no fault. */
export class Namings {
  private readonly called = new Map<string, string>();

  constructor(read: readonly Reading[], stated: readonly StatedReading[]) {
    for (const name of names) this.learn(name, read, stated);
  }

  sameAt(stated: StatedReading, read: Conditions): boolean {
    const wanted = withoutImplied(stated.at);
    const taken = withoutImplied(read);
    const may = stated.may ?? {};
    const all = new Set([...Object.keys(wanted), ...Object.keys(taken)]) as Set<keyof Conditions>;
    return [...all].every((name) => {
      const [want, take] = [wanted[name], taken[name]];
      if (want === undefined)
        return this.isSame(name, may[name], take) || (name === 'variant' && madeFor.has(String(take)));
      return this.isSame(name, want, take);
    });
  }

  private isSame(
    name: keyof Conditions,
    want: string | number | undefined,
    take: string | number | undefined,
  ) {
    if (want === undefined || take === undefined) return want === take;
    if (typeof want === 'number' && typeof take === 'number')
      return Math.abs(want - take) <= 1e-6 * Math.max(1, Math.abs(want));
    if (want === take) return true;
    return isNamed(name) && this.called.get(`${name} ${want}`) === take;
  }

  /** By the cells that both know: one to one, or each keeps its own name. */
  private learn(name: Name, read: readonly Reading[], stated: readonly StatedReading[]): void {
    const votes = new Map<string, Map<string, number>>();
    const places = new Map(stated.map((each) => [`${each.sheet}!${each.cell} ${each.quantity}`, each]));
    for (const { source, quantity, at } of read) {
      const want = withoutImplied(places.get(`${source?.sheet}!${source?.cell} ${quantity}`)?.at ?? {})[name];
      const take = withoutImplied(at)[name];
      if (want === undefined || take === undefined) continue;
      const counts = votes.get(want) ?? new Map<string, number>();
      counts.set(take, (counts.get(take) ?? 0) + 1);
      votes.set(want, counts);
    }
    const chosen = [...votes].map(([want, counts]): [string, string] => {
      const [[take] = ['']] = [...counts].sort(([, a], [, b]) => b - a);
      return [want, take];
    });
    if (new Set(chosen.map(([, take]) => take)).size < chosen.length) return;
    for (const [want, take] of chosen) this.called.set(`${name} ${want}`, take);
  }
}

function isNamed(name: keyof Conditions): name is Name {
  return names.includes(name as Name);
}

/** No trial is the design, and no laboratory the contractor's. */
function withoutImplied({ trial, laboratory, ...rest }: Conditions): Conditions {
  return {
    ...rest,
    ...(trial === undefined || trial === 'design' ? {} : { trial }),
    ...(laboratory === undefined || laboratory === 'contractor' ? {} : { laboratory }),
  };
}
