import { and, eq } from 'drizzle-orm';
import type { Answer } from '#rules/reading/reading-result';
import type { Doubt } from '#rules/record';
import type { ProblemError } from '#shared/contracts/problems';
import type { Database } from '../../db/client';
import { answers } from '../../db/schema/submittals';
import type { Deps } from '../../deps';
import { Problem } from '../../problem';
import type { DraftChange } from './change-draft';

type GivenAnswer = Omit<Answer, 'answer'> & { answer: string | null };

/** Keeps answers to doubts and takes those back that are null. */
export async function keepAnswers(
  tx: Database,
  deps: Deps,
  act: DraftChange & { given: readonly GivenAnswer[]; doubts: readonly Doubt[] },
): Promise<void> {
  refuseUnknown(act.doubts, act.given);
  for (const answer of act.given) await keepAnswer(tx, deps, act, answer);
}

/** Every fault at once: a cell without a doubt, a text that has changed, an answer that was not offered. */
function refuseUnknown(doubts: readonly Doubt[], given: readonly GivenAnswer[]): void {
  const errors = given.flatMap(({ sheet, cell, text, answer }, index): ProblemError[] => {
    const at = { pointer: `/answers/${index}`, sheet, cell };
    if (answer === null) return [];
    const doubt = doubts.find((each) => each.sheet === sheet && each.cell === cell);
    if (doubt === undefined) return [{ ...at, detail: `${sheet} ${cell} is not in doubt.` }];
    if (doubt.text !== text)
      return [{ ...at, detail: `${sheet} ${cell} holds “${doubt.text}”, not “${text}”.` }];
    const offered = doubt.alternatives.map((each) => each.answer);
    if (offered.includes(answer)) return [];
    return [
      { ...at, detail: `${sheet} ${cell} cannot mean “${answer}”.`, fix: `Choose ${offered.join(', ')}.` },
    ];
  });
  if (errors.length > 0) throw new Problem('invalid-input', { detail: errors[0]?.detail ?? '', errors });
}

async function keepAnswer(
  tx: Database,
  { newId, now }: Deps,
  { row, actor }: DraftChange,
  { sheet, cell, text, answer }: GivenAnswer,
): Promise<void> {
  const place = and(
    eq(answers.revisionId, row.revision.id),
    eq(answers.sheet, sheet),
    eq(answers.cell, cell),
  );
  await tx.delete(answers).where(place);
  if (answer === null) return;
  await tx.insert(answers).values({
    id: newId(),
    revisionId: row.revision.id,
    contractorId: row.revision.contractorId,
    sheet,
    cell,
    text,
    answer,
    personId: actor.personId,
    at: now(),
  });
}
