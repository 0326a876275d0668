import type { AttributeValue, Conditions, DocumentRecord, Doubt, Reading } from '../record';
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
  const uses = new Map<string, CellUse>();
  const answerAt = new Map(answers.map((answer) => [placeKey(answer), answer]));
  const passedOver = new Set<string>();
  const rank = { label: 0, unused: 1, read: 2, doubt: 3 } as const;
  const log: ReadingLog = {
    readings: [],
    attributes: [],
    documents: [],
    doubts: [],
    unread: [],
    answered: [],
    use(place, use, taken) {
      const known = uses.get(placeKey(place));
      if (known && rank[known.use] >= rank[use]) return;
      uses.set(placeKey(place), { sheet: place.sheet, cell: place.cell, use, taken });
    },
    isUsed: (place) => uses.has(placeKey(place)),
    passOver(place, reason) {
      if (passedOver.has(placeKey(place))) return;
      passedOver.add(placeKey(place));
      log.unread.push({ ...place, reason });
      log.use(place, 'unused', reason);
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
      addDoubt(log, { ...place, reason, alternatives: [], about }, () => [
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
    uses: () => [...uses.values()],
  };
  return log;
}

/** One doubt a cell: a key that several quantities share is asked about once. */
function addDoubt(log: ReadingLog, doubt: Doubt, alternatives: () => Doubt['alternatives']): void {
  const known = log.doubts.find((each) => placeKey(each) === placeKey(doubt));
  if (!known) {
    log.doubts.push({ ...doubt, alternatives: alternatives() });
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

/** Conditions in one order, so that the same conditions give the same text. */
export function conditionsKey(at: Conditions): string {
  const entries = Object.entries(at).filter(([, value]) => value !== undefined);
  return JSON.stringify(entries.toSorted(([a], [b]) => (a < b ? -1 : 1)));
}

export interface ReadingContext {
  grid: CellGrid;
  log: ReadingLog;
}
