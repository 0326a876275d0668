import {
  type AttributeValue,
  type Conditions,
  conditionsSchema,
  type DocumentRecord,
  type Doubt,
  type Reading,
} from '../record';
import type { Cell, CellGrid, SheetGrid } from './cell-grid';
import type { Answer, CellUse, Unread } from './reading-result';
import { leaveOut, type Understood } from './settled';
import type { UnreadReason } from './unread-reason';

export interface Place {
  sheet: string;
  cell: string;
  text: string;
}

export type DoubtAbout = Doubt['about'];
type Offer = Pick<Doubt['alternatives'][number], 'reading' | 'attribute' | 'document'>;

export interface TakenReading {
  reading: Reading;
  place: Place;
  taken: string;
}

/** Everything that reading a workbook says about its cells, as it is found out. */
export interface ReadingLog {
  readings: TakenReading[];
  attributes: { name: string; value: AttributeValue; place: Place }[];
  documents: DocumentRecord[];
  doubts: Doubt[];
  unread: Unread[];
  answered: Answer[];
  use(place: Place, use: CellUse['use'], taken: string): void;
  isUsed(place: Place): boolean;
  passOver(place: Place, reason: UnreadReason): void;
  /**
   * The value of what a cell was understood as: at once, or by the answer given to its doubt. `left out` where
   * an answer says so, null where there is no value; the doubt is then noted with what each alternative would give.
   */
  settle<T>(
    place: Place,
    understood: Understood<T>,
    about: DoubtAbout,
    offer: (value: T) => Offer,
  ): Settled<T>;
  uses(): CellUse[];
}

export type Settled<T> = { state: 'value'; value: T } | { state: 'blank' | 'none' | 'left out' | 'doubt' };

export function createReadingLog(answers: Answer[]): ReadingLog {
  /** What each cell was taken for, and whether it is already listed as unused. */
  const uses = new Map<string, { taken: CellUse; isListed: boolean }>();
  const doubtAt = new Map<string, Doubt>();
  const answerAt = new Map(answers.map((answer) => [placeKey(answer), answer]));
  const rank = { label: 0, unused: 1, read: 2, doubt: 3 } as const;
  const log: ReadingLog = {
    readings: [],
    attributes: [],
    documents: [],
    doubts: [],
    unread: [],
    answered: [],
    use(place, use, taken) {
      const key = placeKey(place);
      const known = uses.get(key);
      if (known && rank[known.taken.use] >= rank[use]) return;
      const told = { sheet: place.sheet, cell: place.cell, use, taken };
      if (known) known.taken = told;
      else uses.set(key, { taken: told, isListed: false });
    },
    isUsed: (place) => uses.has(placeKey(place)),
    passOver(place, reason) {
      const key = placeKey(place);
      const known = uses.get(key);
      if (known?.isListed) return;
      log.unread.push({ sheet: place.sheet, cell: place.cell, text: place.text, reason });
      const told: CellUse = { sheet: place.sheet, cell: place.cell, use: 'unused', taken: reason };
      if (!known) uses.set(key, { taken: told, isListed: true });
      else {
        known.isListed = true;
        if (rank[known.taken.use] < rank.unused) known.taken = told;
      }
    },
    settle(place, understood, about, offer) {
      if (understood.state !== 'doubt') return understood;
      const answer = answerAt.get(placeKey(place));
      if (answer && answer.text === place.text) {
        const chosen = understood.alternatives.find((each) => each.answer === answer.answer);
        if (chosen || answer.answer === leaveOut) {
          if (!log.answered.includes(answer)) log.answered.push(answer);
          return chosen ? { state: 'value', value: chosen.value } : { state: 'left out' };
        }
      }
      const reason = `${place.cell} ${understood.reason}.`;
      addDoubt(log, doubtAt, { ...place, reason, alternatives: [], about }, () => [
        ...understood.alternatives.map(({ answer: id, label, value }) => ({
          answer: id,
          label,
          ...offer(value),
        })),
        { answer: leaveOut, label: 'Leave out' },
      ]);
      log.use(place, 'doubt', reason);
      return { state: 'doubt' };
    },
    uses: () => [...uses.values()].map(({ taken }) => taken),
  };
  return log;
}

/** One doubt a cell: a key that several quantities share is asked about once. */
function addDoubt(
  log: ReadingLog,
  doubtAt: Map<string, Doubt>,
  doubt: Doubt,
  alternatives: () => Doubt['alternatives'],
): void {
  const key = placeKey(doubt);
  const known = doubtAt.get(key);
  if (!known) {
    const asked = { ...doubt, alternatives: alternatives() };
    log.doubts.push(asked);
    doubtAt.set(key, asked);
  } else if (known.about.quantity !== doubt.about.quantity) {
    known.about = {};
  }
}

export function placeOf(sheet: SheetGrid, cell: Cell): Place {
  return { sheet: sheet.name, cell: cell.address, text: cell.text };
}

export function placeKey(place: { sheet: string; cell: string }): string {
  return `${place.sheet}\u0000${place.cell}`;
}

const conditionNames = Object.keys(conditionsSchema.shape) as (keyof Conditions)[];

/** Conditions in one order, so that the same conditions give the same text. */
export function conditionsKey(at: Conditions): string {
  let key = '';
  for (const name of conditionNames) {
    const value = at[name];
    if (value !== undefined) key += `${name}:${typeof value}:${value}\u0000`;
  }
  return key;
}

export interface ReadingContext {
  grid: CellGrid;
  log: ReadingLog;
}
