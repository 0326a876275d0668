export type BoundKind = 'none' | 'number' | 'table' | 'quantity';

export function boundKindOf(value: unknown): BoundKind {
  if (value === undefined || value === null) return 'none';
  if (typeof value !== 'object') return 'number';
  if ('table' in value) return 'table';
  return 'quantity' in value ? 'quantity' : 'number';
}

/** An end of another kind; of the same kind it stays as it is. */
export function freshBound(kind: BoundKind, before: unknown): unknown {
  if (boundKindOf(before) === kind) return before;
  switch (kind) {
    case 'none':
      return undefined;
    case 'number':
      return '0.0';
    case 'table':
      return { table: '', column: '' };
    case 'quantity':
      return { quantity: 'air-voids', plus: 0 };
  }
}
