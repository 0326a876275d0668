import type { z } from 'zod';
import type { Correction } from '#rules/reading/correction';
import type { typeReadings } from '#shared/contracts/corrections';
import type { ReadingView } from '#shared/contracts/readings';
import type { Proposal } from '../api/preview-reading';

export type TypedInput = z.input<NonNullable<typeof typeReadings.body>>['readings'][number];

export interface GivenAnswer {
  sheet: string;
  cell: string;
  text: string;
  answer: string | null;
}

/** One thing a person does to how the workbook is read: proposed, then kept or left, and undone whole. */
export interface ReadingAct {
  answers: GivenAnswer[];
  corrections: Correction[];
  typed: TypedInput[];
  /** Ids of corrections and typed readings that are taken back. */
  takeBack: string[];
}

export function anAct(parts: Partial<ReadingAct>): ReadingAct {
  return { answers: [], corrections: [], typed: [], takeBack: [], ...parts };
}

export function proposalOf({ answers, corrections, typed, takeBack }: ReadingAct): Proposal {
  return { answers, corrections, typed, takeBack };
}

/** What puts the reading back as it was: read from how it stood before the act and stands after it. */
export function inverseOf(act: ReadingAct, before: ReadingView, after: ReadingView): ReadingAct {
  const known = new Set([...before.corrections, ...before.typed].map(({ id }) => id));
  const gone = new Set(act.takeBack);
  return {
    answers: act.answers.map((given) => ({ ...given, answer: answerBefore(before, given) })),
    takeBack: [...after.corrections, ...after.typed].map(({ id }) => id).filter((id) => !known.has(id)),
    corrections: before.corrections
      .filter(({ id }) => gone.has(id))
      .map(({ sheet, range, says }) => ({ sheet, range, says })),
    typed: before.typed.filter(({ id }) => gone.has(id)).map(({ reading }) => typedAgain(reading)),
  };
}

function answerBefore({ doubts }: ReadingView, { sheet, cell }: GivenAnswer): string | null {
  return doubts.find((doubt) => doubt.sheet === sheet && doubt.cell === cell)?.answer ?? null;
}

export function typedAgain(reading: ReadingView['typed'][number]['reading']): TypedInput {
  const { quantity, value, qualifier, unit, at, method, testedOn } = reading;
  return {
    quantity,
    value,
    qualifier: qualifier ?? null,
    unit,
    at,
    method: method ?? null,
    testedOn: testedOn ?? null,
  };
}
