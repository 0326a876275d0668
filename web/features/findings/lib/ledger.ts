import { type Finding, findingKey } from '#rules/engine/finding';
import type { CheckView, Moved } from '#shared/contracts/checks';
import type { Note, Waiver } from '#shared/contracts/notes';
import { sectionOfClause } from '#shared/format/clause';
import { type NextAct, nextActHeadings, nextActOf, nextActs } from '#shared/next-acts';
import { groupBy } from '../../../lib/group-by';

export type LedgerOrder = 'clause' | 'what to do';

/** A row: a finding with what people wrote beside it and what it was before. */
export interface LedgerRow {
  key: string;
  finding: Finding;
  notes: Note[];
  waiver: Waiver | null;
  moved: Moved | null;
}

export interface LedgerGroup {
  id: string;
  /** `412.03`, or null for a group without clause numbers. */
  section: string | null;
  title: string;
  about: string;
  rows: LedgerRow[];
  /** Rows that stay out of sight until unfolded: comfortable passes, or what does not apply. */
  folded: LedgerRow[];
}

/** A shorter run is quicker read than unfolded. */
const fewestToFold = 5;

export function ledgerRows(check: CheckView): LedgerRow[] {
  const notes = groupBy(
    check.notes.filter((note) => note.finding !== null),
    (note) => note.finding ?? '',
  );
  const waivers = new Map(check.waivers.map((waiver) => [waiver.finding, waiver]));
  const moved = new Map(check.moved.map((each) => [each.key, each]));
  return check.findings.map((finding) => {
    const key = findingKey(finding);
    return {
      key,
      finding,
      notes: notes.get(key) ?? [],
      waiver: waivers.get(key) ?? null,
      moved: moved.get(key) ?? null,
    };
  });
}

export function ledgerGroups(
  rows: readonly LedgerRow[],
  order: LedgerOrder,
  clauseTitles: Readonly<Record<string, string>>,
): LedgerGroup[] {
  const groups = order === 'clause' ? byClause(rows, clauseTitles) : byWhatToDo(rows);
  return groups.filter((group) => group.rows.length + group.folded.length > 0);
}

export function isConsistency({ finding }: LedgerRow): boolean {
  return finding.clause === null;
}

/** A pass with room, about which nobody wrote and which did not move. */
export function isComfortable({ finding, notes, moved }: LedgerRow): boolean {
  return finding.outcome === 'pass' && !finding.borderline && notes.length === 0 && moved === null;
}

function byClause(rows: readonly LedgerRow[], clauseTitles: Readonly<Record<string, string>>): LedgerGroup[] {
  const judged = rows.filter((row) => !isConsistency(row) && row.finding.outcome !== 'not applicable');
  const sections = groupBy(judged, (row) => sectionOfClause(row.finding.clause) ?? '');
  const groups = [...sections].map(([section, inSection]) => ({
    id: `clause ${section}`,
    section,
    title: clauseTitles[section] ?? '',
    about: tallyOf(inSection),
    ...foldComfortable(inSection),
  }));
  const inconsistent = rows.filter((row) => isConsistency(row) && row.finding.outcome !== 'not applicable');
  return [
    ...groups,
    {
      id: 'does not add up',
      section: null,
      title: 'Does not add up',
      about: 'the workbook against itself and against what it would have to be',
      ...foldComfortable(inconsistent),
    },
    notApplicableGroup(rows),
  ];
}

function byWhatToDo(rows: readonly LedgerRow[]): LedgerGroup[] {
  const acts = groupBy(rows, (row) => nextActOf(row.finding, row.waiver !== null));
  const groups = nextActs.map((act: NextAct) => ({
    id: act,
    section: null,
    title: nextActHeadings[act].heading,
    about: nextActHeadings[act].help,
    rows: acts.get(act) ?? [],
    folded: [],
  }));
  const nothing = (acts.get(null) ?? []).filter((row) => row.finding.outcome === 'pass');
  return [
    ...groups,
    {
      id: 'nothing to do',
      section: null,
      title: 'Nothing to do',
      about: 'passes with room',
      ...foldComfortable(nothing),
    },
    notApplicableGroup(rows),
  ];
}

function notApplicableGroup(rows: readonly LedgerRow[]): LedgerGroup {
  return {
    id: 'not applicable',
    section: null,
    title: 'Not applicable',
    about: 'rules whose condition is not met by this mix',
    rows: [],
    folded: rows.filter((row) => row.finding.outcome === 'not applicable'),
  };
}

function foldComfortable(rows: readonly LedgerRow[]): { rows: LedgerRow[]; folded: LedgerRow[] } {
  const folded = rows.filter(isComfortable);
  if (folded.length < fewestToFold) return { rows: [...rows], folded: [] };
  return { rows: rows.filter((row) => !isComfortable(row)), folded };
}

/** "1 fail, waived · 1 not shown · 9 pass, 2 of them borderline" */
export function tallyOf(rows: readonly LedgerRow[]): string {
  const of = (outcome: Finding['outcome']) => rows.filter(({ finding }) => finding.outcome === outcome);
  const fails = of('fail');
  const waived = fails.filter((row) => row.waiver !== null).length;
  const passes = of('pass');
  const borderline = passes.filter(({ finding }) => finding.borderline).length;
  const parts = [
    fails.length > 0 && `${fails.length} fail${waivedWords(waived, fails.length)}`,
    of('not shown').length > 0 && `${of('not shown').length} not shown`,
    of('undecided').length > 0 && `${of('undecided').length} undecided`,
    passes.length > 0 && `${passes.length} pass${borderline > 0 ? `, ${borderline} of them borderline` : ''}`,
  ];
  return parts.filter((part) => part !== false).join(' · ');
}

function waivedWords(waived: number, fails: number): string {
  if (waived === 0) return '';
  return waived === fails ? ', waived' : `, ${waived} of them waived`;
}
