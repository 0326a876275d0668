/** Attributes that rule sets share, in the trade's words; a name of an edition's own is split into its words. */
const known: Record<string, { words: string; isNumber: boolean }> = {
  designTraffic: { words: 'Design traffic, million ESAL', isNumber: true },
  course: { words: 'Course', isNumber: false },
  nominalMaximumSize: { words: 'Nominal maximum size, mm', isNumber: true },
  mixType: { words: 'Mix type', isNumber: false },
  binderGrade: { words: 'Binder grade', isNumber: false },
  compactionMethod: { words: 'Compaction method', isNumber: false },
  compactionBlows: { words: 'Compaction blows', isNumber: true },
};

/** A project rarely states more for all of its mixes. */
export const offeredFacts = ['designTraffic', 'course', 'binderGrade'];

export function factWords(name: string): string {
  const split = name.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
  return known[name]?.words ?? split.charAt(0).toUpperCase() + split.slice(1);
}

/** As typed, but a number where the attribute is one. */
export function factOf(name: string, text: string): string | number {
  const isNumber = known[name]?.isNumber && /^-?\d+([.]\d+)?$/.test(text.trim());
  return isNumber ? Number(text) : text;
}
