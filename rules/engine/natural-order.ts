/** Text with its numbers compared as numbers: 412.2 before 412.10, 412.03(b) before 412.03(k). */
export function naturalOrder(left: string, right: string): number {
  if (left === right) return 0;
  const a = partsOf(left);
  const b = partsOf(right);
  for (let i = 0; i < Math.max(a.length, b.length); i += 1) {
    const one = a[i];
    const other = b[i];
    if (one === undefined) return -1;
    if (other === undefined) return 1;
    const difference = compareParts(one, other);
    if (difference !== 0) return difference;
  }
  return left < right ? -1 : left > right ? 1 : 0;
}

/** Clauses and subjects are compared again and again while a list is sorted. */
function partsOf(text: string): string[] {
  const kept = partsByText.get(text);
  if (kept) return kept;
  const parts = text.match(/\d+|[a-z]+|[^a-z\d]+/gi) ?? [];
  if (partsByText.size >= KEPT_TEXTS) partsByText.clear();
  partsByText.set(text, parts);
  return parts;
}

const KEPT_TEXTS = 2000;
const partsByText = new Map<string, string[]>();

function compareParts(one: string, other: string): number {
  const areNumbers = /^\d/.test(one) && /^\d/.test(other);
  if (areNumbers) return Number(one) - Number(other);
  const left = one.toLowerCase();
  const right = other.toLowerCase();
  // (z) before (aa), as clauses are lettered on.
  if (
    /^[a-z]/.test(left) &&
    /^[a-z]/.test(right) &&
    left.length <= 2 &&
    right.length <= 2 &&
    left.length !== right.length
  ) {
    return left.length - right.length;
  }
  return left < right ? -1 : left > right ? 1 : 0;
}
