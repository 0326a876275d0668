import type { Outcome } from '#rules/engine/finding';
import type { JudgedTwice } from './agreement';

const OUTCOMES: Outcome[] = ['pass', 'fail', 'not shown', 'undecided', 'not applicable'];

/** How often each kind of measure came to each outcome. */
export class Tally {
  findings = 0;
  borderline = 0;
  private readonly counts = new Map<string, Map<Outcome, number>>();

  add(findings: JudgedTwice['findings']): void {
    for (const { kind, outcome, borderline } of findings) {
      this.findings += 1;
      if (borderline) this.borderline += 1;
      const ofKind = this.counts.get(kind) ?? new Map<Outcome, number>();
      ofKind.set(outcome, (ofKind.get(outcome) ?? 0) + 1);
      this.counts.set(kind, ofKind);
    }
  }

  get kinds(): string[] {
    return [...this.counts.keys()].sort();
  }

  /** Percent of a kind's findings by outcome. */
  shares(kind: string): Record<Outcome, number> {
    const ofKind = this.counts.get(kind) ?? new Map<Outcome, number>();
    const all = [...ofKind.values()].reduce((sum, count) => sum + count, 0);
    const share = (outcome: Outcome) => (100 * (ofKind.get(outcome) ?? 0)) / Math.max(1, all);
    return Object.fromEntries(OUTCOMES.map((outcome) => [outcome, share(outcome)])) as Record<
      Outcome,
      number
    >;
  }

  /** Kinds and outcomes that came up too seldom for an agreement to mean something. */
  seldom(leastPercent: number): string[] {
    return this.kinds.flatMap((kind) =>
      Object.entries(this.shares(kind))
        .filter(([, share]) => share < leastPercent)
        .map(([outcome, share]) => `${kind}: ${outcome} ${share.toFixed(1)} %`),
    );
  }
}
