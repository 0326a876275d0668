import type { Quantity } from '../quantities/quantity';
import { applyLayer } from './apply-layer';
import type { AttributeDefinition } from './attribute';
import { checkEdition } from './check-edition';
import type { DocumentType } from './document-types';
import type { DocumentProblem } from './problem';
import { isLayer, type Layer, type Rule, type RuleSet, type RuleSetCase } from './schema';
import type { LimitTable } from './table';

/** What a later document put something else in place of: that document's name, and the old text. */
export interface Displaced {
  document: string;
  text: string;
}

/** Which document supplied a thing, and what it displaced there. */
export interface Provenance {
  document: string;
  displaced: Displaced[];
}

export interface EditionReference {
  id: string;
  title: string;
  edition: string;
}

export type ResolvedRule = Rule & { supplied: Provenance };
export type ResolvedTable = LimitTable & {
  supplied: Provenance;
  /** One a row, in the order of the rows. */
  rowsSupplied: Provenance[];
};
export type ResolvedAttribute = AttributeDefinition & { supplied: Provenance };

/** A base edition with its layers applied in order: what a record is judged by, and what is sealed. */
export interface ResolvedEdition {
  id: string;
  title: string;
  agency: string;
  edition: string;
  effective: { from: string | null; to: string | null };
  layers: EditionReference[];
  designPoint: { targetAirVoids: number; fit: 'quadratic' | 'linear' };
  roomToMove: string[];
  reportedTolerance: Record<string, number>;
  attributes: ResolvedAttribute[];
  quantities: Quantity[];
  documents: DocumentType[];
  tables: ResolvedTable[];
  rules: ResolvedRule[];
  removed: { kind: 'rule' | 'table' | 'attribute'; id: string; document: string; text: string }[];
  /** The base's own cases, or the layers' where there are any: a layer may change what the base's expect. */
  cases: RuleSetCase[];
}

export type Resolution = { ok: true; edition: ResolvedEdition } | { ok: false; problems: DocumentProblem[] };

/** Base and layers as one edition, or every reason why they do not fit together. */
export function resolveEdition(base: RuleSet | Layer, layers: (Layer | RuleSet)[] = []): Resolution {
  if (isLayer(base)) {
    return refused(
      '/layerOf',
      `${documentName(base)} is a layer of ${base.layerOf.id}, edition ${base.layerOf.edition}, and cannot stand alone.`,
      'Give its base edition first, and this document as a layer.',
    );
  }
  const misfits = layers.flatMap((layer) => misfitOf(base, layers, layer));
  if (misfits.length > 0) return { ok: false, problems: misfits };

  let edition = resolvedBase(base);
  const problems: DocumentProblem[] = [];
  for (const layer of layers) {
    if (!isLayer(layer)) continue;
    const applied = applyLayer(edition, layer);
    edition = applied.edition;
    problems.push(...applied.problems);
  }
  if (problems.length === 0) problems.push(...checkEdition(edition));
  return problems.length === 0 ? { ok: true, edition } : { ok: false, problems };
}

/** "Section 412 Dense-graded asphalt mixtures, 2026" */
export function documentName(document: { title: string; edition: string }): string {
  return `${document.title}, ${document.edition}`;
}

function misfitOf(base: RuleSet, layers: (Layer | RuleSet)[], layer: Layer | RuleSet): DocumentProblem[] {
  const name = documentName(layer);
  if (!isLayer(layer)) {
    return refusal(
      '/layerOf',
      `${name} is a base edition, not a layer.`,
      'Give a document whose layerOf names the base edition.',
    );
  }
  const { id, edition } = layer.layerOf;
  if (
    layers.some((other) => other !== layer && isLayer(other) && other.id === id && other.edition === edition)
  ) {
    return refusal(
      '/layerOf',
      `${name} is a layer over ${id}, edition ${edition}, which is itself a layer.`,
      `Make it a layer of ${base.id}, edition ${base.edition}.`,
    );
  }
  if (id !== base.id || edition !== base.edition) {
    return refusal(
      '/layerOf',
      `${name} is a layer of ${id}, edition ${edition}, but the base is ${base.id}, edition ${base.edition}.`,
      'Choose the base edition that it names, or the layer made for this base.',
    );
  }
  return [];
}

function resolvedBase(base: RuleSet): ResolvedEdition {
  const supplied = (): Provenance => ({ document: documentName(base), displaced: [] });
  return {
    id: base.id,
    title: base.title,
    agency: base.agency,
    edition: base.edition,
    effective: base.effective,
    layers: [],
    designPoint: base.designPoint,
    roomToMove: base.roomToMove,
    reportedTolerance: base.reportedTolerance,
    attributes: base.attributes.map((each) => ({ ...each, supplied: supplied() })),
    quantities: base.quantities,
    documents: base.documents,
    tables: base.tables.map((each) => ({
      ...each,
      supplied: supplied(),
      rowsSupplied: each.rows.map(supplied),
    })),
    rules: base.rules.map((each) => ({ ...each, supplied: supplied() })),
    removed: [],
    cases: base.cases,
  };
}

function refusal(pointer: string, detail: string, fix: string): DocumentProblem[] {
  return [{ pointer, detail, fix }];
}

function refused(pointer: string, detail: string, fix: string): Resolution {
  return { ok: false, problems: refusal(pointer, detail, fix) };
}
