/** What a cell was understood as. Nothing in here is ever a silent zero. */
export type Understood<T> =
  | { state: 'blank' }
  /** Holds something that says there is no value: `N/A`, a dash. */
  | { state: 'none' }
  | { state: 'value'; value: T }
  | { state: 'doubt'; reason: string; alternatives: Alternative<T>[] };

export interface Alternative<T> {
  /** Stable id that an answer names. */
  answer: string;
  label: string;
  value: T;
}

/** The answer that every doubt accepts beside its own alternatives. */
export const leaveOut = 'leave out';

export function certain<T>(value: T): Understood<T> {
  return { state: 'value', value };
}

export function doubtOf<T>(reason: string, alternatives: Alternative<T>[] = []): Understood<T> {
  return { state: 'doubt', reason, alternatives };
}
