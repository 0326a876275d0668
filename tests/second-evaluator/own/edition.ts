import type { Layer, Rule, RuleSet } from '#rules/rule-sets/schema';

export type Table = RuleSet['tables'][number];
export type Row = Table['rows'][number];
export type Cell = Row[string];
type Attribute = RuleSet['attributes'][number];

/** A base with its layers laid over it, the later wins. */
export interface LaidOut {
  rules: Rule[];
  tables: Table[];
  attributes: Attribute[];
  /** How a property is read between trials. */
  fit: 'quadratic' | 'linear';
}

export function layOut(base: RuleSet, layers: Layer[]): LaidOut {
  let rules = [...base.rules];
  let tables = base.tables.map((table) => ({ ...table, rows: [...table.rows] }));
  let attributes = [...base.attributes];
  for (const layer of layers) {
    rules = changed(rules, layer.add.rules, layer.replace.rules, layer.remove.rules, (rule) => rule.id);
    tables = changed(
      tables,
      layer.add.tables,
      layer.replace.tables,
      layer.remove.tables,
      (table) => table.id,
    );
    attributes = changed(
      attributes,
      layer.add.attributes,
      layer.replace.attributes,
      layer.remove.attributes,
      (attribute) => attribute.name,
    );
    for (const patch of layer.patchRows) {
      tables = tables.map((table) => {
        if (table.id !== patch.table) return table;
        const rows = table.rows.map((row) => (isNamed(row, patch.key) ? { ...row, ...patch.set } : row));
        return { ...table, rows };
      });
    }
  }
  return { rules, tables, attributes, fit: base.designPoint.fit };
}

function changed<T>(present: T[], add: T[], replace: T[], remove: string[], key: (entry: T) => string): T[] {
  const result: T[] = [];
  for (const entry of present) {
    if (remove.includes(key(entry))) continue;
    result.push(replace.find((each) => key(each) === key(entry)) ?? entry);
  }
  for (const entry of add) result.push(entry);
  return result;
}

function isNamed(row: Row, key: Row): boolean {
  for (const [name, cell] of Object.entries(key)) {
    if (JSON.stringify(row[name]) !== JSON.stringify(cell)) return false;
  }
  return true;
}
