import type { Finding } from '#rules/engine/finding';
import type { Doubt } from '#rules/record';
import { sectionWords } from '#shared/format/section-words';
import type { RevisionRow } from '../db/queries/revisions';
import type { SectionSnapshot } from '../db/queries/section-snapshot';
import { declarationText } from './declaration-text';

interface Declaration {
  row: Pick<RevisionRow, 'revision' | 'submittal' | 'project'>;
  section: SectionSnapshot;
  findings: readonly Finding[];
  doubts: readonly Doubt[];
}

/** The declaration that a draft's present findings and doubts call for. */
export function declarationOf({ row, section, findings, doubts }: Declaration): string {
  return declarationText({
    mixDesignation: row.submittal.mixDesignation,
    revision: row.revision.number,
    projectNumber: row.project.number,
    section: sectionWords(section),
    findings: [...findings],
    doubts: doubts.map(
      ({ sheet, cell, about }) => `${sheet} ${cell}`.trim() || (about.attribute ?? 'a value'),
    ),
  });
}
