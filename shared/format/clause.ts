/** `412.03(d)` in its hanging parts: the dimmed section and the letter that hangs from it. */
export function clauseParts(clause: string): { section: string; letter: string } {
  const match = /^(.*?)(\([^)]*\).*)$/.exec(clause);
  return match ? { section: match[1] ?? '', letter: match[2] ?? '' } : { section: clause, letter: '' };
}

/** The section under which a clause stands; a consistency finding has none. */
export function sectionOfClause(clause: string | null): string | null {
  return clause === null ? null : clauseParts(clause).section;
}
