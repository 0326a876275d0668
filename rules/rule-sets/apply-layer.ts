import { viewOf } from './edition-view';
import { patchRow, rowsDisplaced } from './patch-row';
import type { DocumentProblem } from './problem';
import { documentName, type Provenance, type ResolvedEdition } from './resolve';
import type { Layer } from './schema';
import { cellWords, limitWords } from './sentences';

/** One layer over an edition: what it removes, replaces, adds and patches, in that order. */
export function applyLayer(
  edition: ResolvedEdition,
  layer: Layer,
): { edition: ResolvedEdition; problems: DocumentProblem[] } {
  const document = documentName(layer);
  const problems: DocumentProblem[] = [];
  const view = viewOf(edition);
  const removed = [...edition.removed];
  const context = { document, problems, removed };

  const rules = applyList({
    ...context,
    kind: 'rule',
    list: 'rules',
    add: layer.add.rules,
    replace: layer.replace.rules,
    remove: layer.remove.rules,
    present: edition.rules,
    key: (rule) => rule.id,
    words: (rule) => `${rule.title}: ${limitWords(rule, view)}`,
    dress: (rule, supplied) => ({ ...rule, supplied }),
  });
  const tables = applyList({
    ...context,
    kind: 'table',
    list: 'tables',
    add: layer.add.tables,
    replace: layer.replace.tables,
    remove: layer.remove.tables,
    present: edition.tables,
    key: (table) => table.id,
    words: (table) => table.title ?? table.id,
    dress: (table, supplied) => {
      const earlier = edition.tables.find(({ id }) => id === table.id);
      return { ...table, supplied, rowsSupplied: rowsDisplaced(table, earlier, document, cellWords) };
    },
  });
  const attributes = applyList({
    ...context,
    kind: 'attribute',
    list: 'attributes',
    add: layer.add.attributes,
    replace: layer.replace.attributes,
    remove: layer.remove.attributes,
    present: edition.attributes,
    key: (attribute) => attribute.name,
    words: (attribute) => attribute.label ?? attribute.name,
    dress: (attribute, supplied) => ({ ...attribute, supplied }),
  });
  const patched = layer.patchRows.reduce(
    (current, patch, i) =>
      patchRow({ tables: current, patch, at: `/patchRows/${i}`, document, problems, cellWords }),
    tables,
  );
  const gone = new Set(
    edition.rules.map((rule) => rule.id).filter((id) => !rules.some((rule) => rule.id === id)),
  );
  return {
    problems,
    edition: {
      ...edition,
      layers: [...edition.layers, { id: layer.id, title: layer.title, edition: layer.edition }],
      designPoint: layer.designPoint ?? edition.designPoint,
      roomToMove: layer.roomToMove ?? edition.roomToMove.filter((id) => !gone.has(id)),
      reportedTolerance: { ...edition.reportedTolerance, ...layer.reportedTolerance },
      quantities: laterWins(edition.quantities, layer.quantities, (each) => each.id),
      documents: laterWins(edition.documents, layer.documents, (each) => each.type),
      attributes,
      tables: patched,
      rules,
      removed,
      cases: edition.layers.length === 0 ? layer.cases : [...edition.cases, ...layer.cases],
    },
  };
}

interface ListChange<Given, Kept> {
  document: string;
  problems: DocumentProblem[];
  removed: ResolvedEdition['removed'];
  kind: 'rule' | 'table' | 'attribute';
  list: 'rules' | 'tables' | 'attributes';
  add: Given[];
  replace: Given[];
  remove: string[];
  present: Kept[];
  key: (entry: Given) => string;
  words: (entry: Kept) => string;
  dress: (entry: Given, supplied: Provenance) => Kept;
}

function applyList<Given, Kept extends Given & { supplied: Provenance }>(
  change: ListChange<Given, Kept>,
): Kept[] {
  const { document, problems, removed, kind, list, key, words, dress } = change;
  let kept = change.present;
  const dangling = (pointer: string, act: string, id: string) =>
    problems.push({
      pointer,
      detail: `${document} ${act} the ${kind} ${id}, which the edition does not have.`,
      fix: `Correct the id, or take the ${kind} ${id} out of the layer.`,
    });

  change.remove.forEach((id, i) => {
    const gone = kept.find((entry) => key(entry) === id);
    if (!gone) {
      dangling(`/remove/${list}/${i}`, 'removes', id);
      return;
    }
    removed.push({ kind, id, document, text: words(gone) });
    kept = kept.filter((entry) => entry !== gone);
  });
  change.replace.forEach((entry, i) => {
    const old = kept.find((each) => key(each) === key(entry));
    if (!old) {
      dangling(`/replace/${list}/${i}`, 'replaces', key(entry));
      return;
    }
    const displaced = [...old.supplied.displaced, { document: old.supplied.document, text: words(old) }];
    kept = kept.map((each) => (each === old ? dress(entry, { document, displaced }) : each));
  });
  change.add.forEach((entry, i) => {
    if (kept.some((each) => key(each) === key(entry))) {
      problems.push({
        pointer: `/add/${list}/${i}`,
        detail: `${document} adds the ${kind} ${key(entry)}, which the edition already has.`,
        fix: 'Put it under replace, or give it an id of its own.',
      });
      return;
    }
    kept = [...kept, dress(entry, { document, displaced: [] })];
  });
  return kept;
}

function laterWins<T>(earlier: T[], later: T[], key: (entry: T) => string): T[] {
  const own = new Set(later.map(key));
  return [...earlier.filter((entry) => !own.has(key(entry))), ...later];
}
