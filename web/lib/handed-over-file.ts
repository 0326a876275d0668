/** A file dropped on one page for another to send; it lives as long as the page and is taken once. */
let waiting: File | null = null;

export function handOverFile(file: File): void {
  waiting = file;
}

export function takeHandedOverFile(): File | null {
  const file = waiting;
  waiting = null;
  return file;
}
