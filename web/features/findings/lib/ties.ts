import type { Evidence, Finding } from '#rules/engine/finding';
import type { Source } from '#rules/record';

/** A lettered tie between a number in the thread and its cell in the sheet. */
export interface Tie {
  letter: string;
  sheet: string;
  cell: string;
  /** What the workbook holds in the cell, as text. */
  text: string;
}

const mostTies = 12;

/** Letters in the order in which the thread names the cells: inputs first, then what the workbook reports. */
export function tiesOf(finding: Finding): Tie[] {
  const ties: Tie[] = [];
  const add = (source: Source | null | undefined) => {
    if (!source || source.cell === '' || ties.length >= mostTies) return;
    if (ties.some((tie) => tie.sheet === source.sheet && tie.cell === source.cell)) return;
    ties.push({ ...source, letter: String.fromCharCode(97 + ties.length) });
  };
  const walk = (evidence: Evidence) => {
    for (const input of evidence.inputs ?? []) walk(input);
    add(evidence.source);
    add(evidence.reported?.source);
  };
  for (const evidence of finding.evidence) walk(evidence);
  return ties;
}

export function tieOf(ties: readonly Tie[], source: Source | null | undefined): Tie | null {
  if (!source) return null;
  return ties.find((tie) => tie.sheet === source.sheet && tie.cell === source.cell) ?? null;
}

/** The cell that the sheet opens at: what the workbook reports, else what was judged, else the first input. */
export function mainTie(finding: Finding, ties: readonly Tie[]): Tie | null {
  const [first] = finding.evidence;
  return tieOf(ties, first?.reported?.source) ?? tieOf(ties, first?.source) ?? ties[0] ?? null;
}
