/** Shorter words differ from each other by one letter too often. */
const shortest = 5;

/**
 * Finds the known word that a misspelt one is nearest to: one letter wrong, missing, too many, or two changed over.
 * Where two words are as near, neither is meant.
 */
export class NearWords {
  private readonly bySpelling = new Map<string, Set<string>>();
  private readonly known = new Set<string>();

  add(word: string): void {
    if (word.length < shortest || this.known.has(word) || !/^\p{L}+$/u.test(word)) return;
    this.known.add(word);
    for (const spelling of [word, ...shortened(word)]) {
      const words = this.bySpelling.get(spelling);
      if (words) words.add(word);
      else this.bySpelling.set(spelling, new Set([word]));
    }
  }

  nearest(word: string): string | null {
    if (word.length < shortest || this.known.has(word) || !/^\p{L}+$/u.test(word)) return null;
    const found = new Set<string>();
    for (const spelling of [word, ...shortened(word)]) {
      for (const known of this.bySpelling.get(spelling) ?? []) if (isOneApart(word, known)) found.add(known);
    }
    const [only, ...more] = found;
    return only !== undefined && more.length === 0 ? only : null;
  }
}

function shortened(word: string): string[] {
  return Array.from(word, (_, at) => word.slice(0, at) + word.slice(at + 1));
}

function isOneApart(a: string, b: string): boolean {
  let from = 0;
  while (from < Math.min(a.length, b.length) && a[from] === b[from]) from += 1;
  // The first letter is hardly ever wrong, and tells words apart.
  if (from === 0) return false;
  const [restA, restB] = [a.slice(from), b.slice(from)];
  return (
    restA.slice(1) === restB ||
    restA === restB.slice(1) ||
    restA.slice(1) === restB.slice(1) ||
    (restA.slice(2) === restB.slice(2) && restA[0] === restB[1] && restA[1] === restB[0])
  );
}
