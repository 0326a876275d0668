import type { Cell } from '../cell-grid';
import type { Said } from '../correction';
import { type Place, placeKey, type ReadingLog } from '../reading-log';

/** What is known of a cell before its headings are asked. */
export interface Told {
  says: Said | { kind: 'in doubt' } | { kind: 'left out' };
  /** A mapping speaks for a whole column, so averages and limits in it are not meant. */
  by: 'correction' | 'mapping';
  sheet: string;
  cell: Cell;
}

export class ToldCells {
  private readonly byPlace = new Map<string, Told>();

  get size(): number {
    return this.byPlace.size;
  }

  all(): Told[] {
    return [...this.byPlace.values()];
  }

  tell(told: Told): void {
    const key = placeKey({ sheet: told.sheet, cell: told.cell.address });
    if (!this.byPlace.has(key)) this.byPlace.set(key, told);
  }

  at(sheet: string, cell: Pick<Cell, 'address'>): Told | null {
    return this.byPlace.get(placeKey({ sheet, cell: cell.address })) ?? null;
  }

  forget(sheet: string, cell: Pick<Cell, 'address'>): void {
    this.byPlace.delete(placeKey({ sheet, cell: cell.address }));
  }

  /** The log for whoever reads by headings: what is told of a cell is not asked again, and its doubts are moot. */
  quieten(log: ReadingLog): ReadingLog {
    if (this.size === 0) return log;
    const toldAt = (place: Place) => this.byPlace.get(placeKey(place)) ?? null;
    return {
      ...log,
      use: (place, use, taken) => {
        if (toldAt(place) === null) log.use(place, use, taken);
      },
      isUsed: (place) => {
        const told = toldAt(place);
        return told === null ? log.isUsed(place) : told.says.kind !== 'reading';
      },
      passOver: (place, reason) => {
        if (toldAt(place) === null) log.passOver(place, reason);
      },
      settle: (place, understood, about, offer) =>
        toldAt(place) === null ? log.settle(place, understood, about, offer) : { state: 'left out' },
    };
  }
}
