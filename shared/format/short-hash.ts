/** "7f3a 91c0 … 5be2": enough of a seal or of a file's hash to compare by eye. */
export function shortHash(hash: string): string {
  const digits = hash.replace(/^[a-z0-9-]+:/i, '');
  return `${digits.slice(0, 4)} ${digits.slice(4, 8)} … ${digits.slice(-4)}`;
}
