import { workingDaysBetween } from '#shared/working-days';

export const timeGaugeWidth = 150;
/** Working days that half of the width stands for, to each side of today. */
export const halfWidthDays = 14;

const middle = timeGaugeWidth / 2;
const edgePx = 4;

export interface TimeGaugePlaces {
  received: number;
  due: number;
  today: number;
  late: boolean;
  /** Beyond the width: drawn at the edge behind a break. */
  receivedOff: boolean;
  dueOff: boolean;
}

/** Places on the time gauge. Today is fixed at the middle, so the eye compares rows by where the tick stands. */
export function timeGaugePlaces(options: {
  today: string;
  receivedOn: string;
  dueOn: string;
}): TimeGaugePlaces {
  const received = place(workingDaysBetween(options.today, options.receivedOn));
  const due = place(workingDaysBetween(options.today, options.dueOn));
  return {
    received: clip(received),
    due: clip(due),
    today: middle,
    late: options.dueOn < options.today,
    receivedOff: received !== clip(received),
    dueOff: due !== clip(due),
  };
}

function place(days: number): number {
  return middle + (days / halfWidthDays) * middle;
}

function clip(x: number): number {
  return Math.min(Math.max(x, edgePx), timeGaugeWidth - edgePx);
}
