/** Attributes that rule sets share, in the trade's words; a name of an edition's own is split into its words. */
const known: Record<string, string> = {
  designTraffic: 'Design traffic, million ESAL',
  course: 'Course',
  nominalMaximumSize: 'Nominal maximum size, mm',
  mixType: 'Mix type',
  binderGrade: 'Binder grade',
  compactionMethod: 'Compaction method',
  compactionBlows: 'Compaction blows',
};

/** A project rarely states more for all of its mixes. */
export const offeredFacts = ['designTraffic', 'course', 'binderGrade'];

export function factWords(name: string): string {
  const split = name.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
  return known[name] ?? split.charAt(0).toUpperCase() + split.slice(1);
}
