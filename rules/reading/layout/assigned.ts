import type { Quantity } from '../../quantities/quantity';
import type { Conditions } from '../../record';
import type { ReadingLog } from '../reading-log';
import type { Candidate } from './candidate';
import type { FindQuantity } from './resolve-quantity';

/** A candidate whose quantity and conditions are settled as far as the layout can settle them. */
export interface Assigned extends Candidate {
  choices: Quantity[];
  conditions: Conditions;
}

export interface SettleOptions {
  log: ReadingLog;
  find: FindQuantity;
  decimalOf: (sheet: string) => '.' | ',';
}
