import type { Quantity } from '../quantities/quantity';
import { allQuantities, quantityById } from '../quantities/registry';
import { type AttributeDefinition, attributeLabel, withStandardAttributes } from './attribute';
import { type DocumentType, withStandardDocuments } from './document-types';
import type { Rule, RuleSetCase } from './schema';
import type { LimitTable } from './table';

/** What a base edition and a resolved one have in common: the things that rules refer to. */
export interface EditionContents {
  rules: Rule[];
  tables: LimitTable[];
  attributes: AttributeDefinition[];
  quantities: Quantity[];
  documents: DocumentType[];
  cases: RuleSetCase[];
  roomToMove: string[];
  reportedTolerance: Record<string, number>;
}

/** Look-ups by name over an edition, the standard entries included. */
export interface EditionView {
  attribute(name: string): AttributeDefinition | undefined;
  attributeLabel(name: string): string;
  table(id: string): LimitTable | undefined;
  tableTitle(id: string): string;
  quantity(id: string): Quantity | undefined;
  /** Ids of the quantities that a trade symbol stands for, the edition's own among them. */
  readonly symbols: ReadonlyMap<string, readonly string[]>;
  document(type: string): DocumentType | undefined;
  rule(id: string): Rule | undefined;
  /** Standard attributes and the edition's own, by name. */
  readonly attributeNames: readonly string[];
  /** What the edition declares itself. */
  readonly tables: readonly LimitTable[];
  readonly ownQuantities: readonly Quantity[];
  readonly ownDocuments: readonly DocumentType[];
}

export function viewOf(
  edition: Pick<EditionContents, 'rules' | 'tables' | 'attributes' | 'quantities' | 'documents'>,
): EditionView {
  const kept = views.get(edition);
  if (kept) return kept;
  const attributes = byKey(withStandardAttributes(edition.attributes), (each) => each.name);
  const tables = byKey(edition.tables, (each) => each.id);
  const quantities = byKey(edition.quantities, (each) => each.id);
  const documents = byKey(withStandardDocuments(edition.documents), (each) => each.type);
  const rules = byKey(edition.rules, (each) => each.id);
  let symbols: EditionView['symbols'] | null = null;
  const view: EditionView = {
    attribute: (name) => attributes.get(name),
    attributeLabel: (name) => {
      const attribute = attributes.get(name);
      return attribute ? attributeLabel(attribute) : name;
    },
    table: (id) => tables.get(id),
    tableTitle: (id) => tables.get(id)?.title ?? id,
    quantity: (id) => quantities.get(id) ?? quantityById(id),
    get symbols() {
      symbols ??= symbolsOf(edition.quantities);
      return symbols;
    },
    document: (type) => documents.get(type),
    rule: (id) => rules.get(id),
    attributeNames: [...attributes.keys()],
    tables: edition.tables,
    ownQuantities: edition.quantities,
    ownDocuments: edition.documents,
  };
  views.set(edition, view);
  return view;
}

/** An edition does not change once it is parsed, so its look-ups are built once. */
const views = new WeakMap<object, EditionView>();

function symbolsOf(own: Quantity[]): Map<string, string[]> {
  const symbols = new Map<string, string[]>();
  for (const { id, symbol } of [...own, ...allQuantities()]) {
    symbols.set(symbol, [...new Set([...(symbols.get(symbol) ?? []), id])]);
  }
  return symbols;
}

function byKey<T>(entries: T[], key: (entry: T) => string): Map<string, T> {
  return new Map(entries.map((entry) => [key(entry), entry]));
}
