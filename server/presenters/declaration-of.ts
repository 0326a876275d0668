import type { Finding } from '#rules/engine/finding';
import type { Doubt } from '#rules/record';
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
  const layers = section.layers.map(({ title, edition }) => `${title}, ${edition}`);
  const base = `${section.base.title}, edition ${section.base.edition}`;
  return declarationText({
    mixDesignation: row.submittal.mixDesignation,
    revision: row.revision.number,
    projectNumber: row.project.number,
    section: layers.length === 0 ? base : `${base}, with ${layers.join(' and ')}`,
    findings: [...findings],
    doubts: doubts.map(
      ({ sheet, cell, about }) => `${sheet} ${cell}`.trim() || (about.attribute ?? 'a value'),
    ),
  });
}
