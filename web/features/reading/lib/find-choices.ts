export interface Findable {
  id: string;
  label: string;
  symbol?: string;
  aliases?: readonly string[];
  /** Asked for by the section's rules: such come first. */
  judged?: boolean;
}

export interface Found<Choice> {
  choice: Choice;
  /** The name under which workbooks give it, where that is what was typed. */
  alias: string | null;
}

const mostFound = 40;

/** Choices in which every word that was typed occurs, the nearest name first. */
export function findChoices<Choice extends Findable>(
  choices: readonly Choice[],
  search: string,
): Found<Choice>[] {
  const words = plain(search)
    .split(' ')
    .filter((word) => word !== '');
  return choices
    .flatMap((choice) => {
      const rank = rankOf(choice, plain(search), words);
      return rank === null ? [] : [{ choice, ...rank }];
    })
    .sort((one, other) => one.rank - other.rank || judgedFirst(one.choice, other.choice))
    .slice(0, mostFound)
    .map(({ choice, alias }) => ({ choice, alias }));
}

function rankOf(
  { id, label, symbol = '', aliases = [] }: Findable,
  search: string,
  words: readonly string[],
): { rank: number; alias: string | null } | null {
  if (words.length === 0) return { rank: 5, alias: null };
  const own = plain(label);
  if (plain(symbol) === search) return { rank: 0, alias: null };
  if (own === search) return { rank: 1, alias: null };
  const exact = aliases.find((alias) => plain(alias) === search);
  if (exact !== undefined) return { rank: 2, alias: exact };
  if (own.startsWith(search)) return { rank: 3, alias: null };
  if (holdsAll(`${own} ${plain(symbol)} ${plain(id)}`, words)) return { rank: 4, alias: null };
  const alias = aliases.find((each) => holdsAll(plain(each), words));
  return alias === undefined ? null : { rank: 5, alias };
}

function judgedFirst(one: Findable, other: Findable): number {
  return Number(other.judged ?? false) - Number(one.judged ?? false);
}

function holdsAll(text: string, words: readonly string[]): boolean {
  return words.every((word) => text.includes(word));
}

/** Without case and accents, so that `Körnung` is found by `kornung`. */
function plain(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().replace(/\s+/g, ' ').trim();
}
