import { findingKey } from '#rules/engine/finding';
import type { Home } from '#shared/contracts/home';
import type { SubmittalListItem } from '#shared/contracts/submittals';
import { nextActOf } from '#shared/next-acts';
import { newestCheckOf } from '../../db/queries/checks';
import { revisionBefore } from '../../db/queries/returns';
import { findRevision } from '../../db/queries/revisions';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { movedFindings } from '../../presenters/moved-findings';
import { viewRevision } from '../submittals/load-revision';

type Current = NonNullable<Home['current']>;

const shownFindings = 12;

/** The draft that is nearest to being sent, or else the newest revision, with what is still to do about it. */
export async function currentRevision(
  deps: Deps,
  actor: RequestActor,
  submittals: readonly SubmittalListItem[],
): Promise<Current | null> {
  const chosen = nearest(submittals);
  if (chosen === undefined) return null;
  const row = await findRevision(deps.db, actor, { submittalId: chosen.id, number: chosen.revision.number });
  const check = row === null ? null : await newestCheckOf(deps.db, actor, row.revision.id);
  if (row === null || check === null) return null;
  const view = await viewRevision(deps, actor, row);
  const before = await revisionBefore(deps.db, actor, row.revision);
  const previous = before === null ? null : await newestCheckOf(deps.db, actor, before.id);
  const { findings } = check.result;
  const moved = new Map(
    (previous === null ? [] : movedFindings(previous.result.findings, findings)).map((each) => [
      each.key,
      each,
    ]),
  );
  const toShow = findings.filter(
    (finding) => moved.has(findingKey(finding)) || nextActOf(finding, false) !== null,
  );
  return {
    submittalId: chosen.id,
    mixDesignation: view.mixDesignation,
    timeZone: view.agency.timeZone,
    revision: view.number,
    state: view.state,
    heading: headingOf(view.number, view.state, view.disposition),
    changes: row.revision.changes,
    summary: check.summary,
    findings: toShow.slice(0, shownFindings).map((finding) => {
      const was = moved.get(findingKey(finding));
      return {
        finding,
        previousText: was?.previousText ?? null,
        previousOutcome: was?.previousOutcome ?? null,
      };
    }),
    canSubmit: view.abilities.submit,
    history: view.revisions,
  };
}

/** Fewest open findings first among drafts that are read; then whatever changed last. */
function nearest(submittals: readonly SubmittalListItem[]): SubmittalListItem | undefined {
  const read = submittals.filter(({ revision }) => revision.summary !== null);
  const drafts = read.filter(({ revision }) => revision.state === 'draft');
  const open = ({ revision: { summary } }: SubmittalListItem) =>
    summary === null ? 0 : summary.fail + summary.notShown + summary.undecided;
  const [draft] = drafts.toSorted((one, other) => open(one) - open(other));
  return draft ?? read[0];
}

function headingOf(number: number, state: string, disposition: string | null): string {
  const stands = state === 'draft' ? 'checked before submitting' : (disposition ?? state);
  return `revision ${number}, ${stands}`;
}
