import { allQuantities } from '../../quantities/registry';
import { withStandardAttributes } from '../../rule-sets/attribute';
import { withStandardDocuments } from '../../rule-sets/document-types';
import type { ReadingEdition } from '../edition-contents';
import { submittalFacts } from '../submittal-facts';
import { aggregateWords } from './aggregate-words';
import { attributeWords, documentWords } from './attribute-words';
import { type Domain, domainWords } from './context-words';
import {
  designWords,
  furnitureWords,
  harmlessWords,
  type KeyName,
  keyWords,
  laboratoryWords,
  type Role,
  rawWords,
  roleWords,
} from './key-words';
import { NearWords } from './near-words';
import { performanceWords } from './performance-words';
import { sameWords } from './same-words';
import { shortWords } from './short-words';
import { foldedText, tokensOf, withoutMark } from './tokens';
import { volumetricWords } from './volumetric-words';

/** One thing that a phrase can mean; a phrase may mean several. */
export type Sense =
  | { kind: 'quantity'; name: string }
  | { kind: 'key'; name: KeyName }
  | { kind: 'role'; name: Role }
  | { kind: 'design' }
  | { kind: 'laboratory'; name: 'contractor' | 'agency' }
  | { kind: 'furniture' }
  | { kind: 'raw' }
  | { kind: 'attribute'; name: string }
  | { kind: 'document'; name: string };

interface PhraseNode {
  next: Map<string, PhraseNode>;
  senses: Sense[];
}

export interface PhraseMatch {
  from: number;
  /** The first token behind it. */
  to: number;
  senses: Sense[];
}

/** Phrases by their words, for the longest match at each place of a label. */
export class PhraseIndex {
  private readonly root: PhraseNode = { next: new Map(), senses: [] };
  private readonly byWords = new Map<string, Sense[]>();
  private readonly near = new NearWords();

  constructor() {
    for (const word of [...sameWords.keys(), ...sameWords.values(), 'specific', 'gravity'])
      this.near.add(word);
  }

  add(phrase: string, sense: Sense): void {
    const tokens = tokensOf(phrase);
    if (tokens.length === 0 || (sense.kind !== 'key' && tokens.join('').length < 2)) return;
    let node = this.root;
    for (const token of tokens) {
      let next = node.next.get(token);
      if (!next) {
        next = { next: new Map(), senses: [] };
        node.next.set(token, next);
      }
      node = next;
    }
    addTo(node.senses, sense);
    for (const word of phrase.match(/\p{L}+/gu) ?? []) this.near.add(foldedText(word));
    if (tokens.length < 2) return;
    const words = wordsKey(tokens);
    const senses = this.byWords.get(words) ?? [];
    addTo(senses, sense);
    this.byWords.set(words, senses);
  }

  addAll(phrases: string, sense: Sense): void {
    for (const phrase of phrases.split('|')) this.add(phrase, sense);
  }

  /** What a phrase of just these words means, in whatever order. */
  ofWords(tokens: readonly string[]): readonly Sense[] {
    return this.byWords.get(wordsKey(tokens)) ?? [];
  }

  /** The word that a misspelt one stands for, where that is one. */
  nearest(word: string): string | null {
    return this.near.nearest(foldedText(word));
  }

  /** A token with a point behind it is a word cut short, and stands for the words that begin so where none is it. */
  longestAt(tokens: readonly string[], from: number): PhraseMatch | null {
    let nodes = [this.root];
    let best: PhraseMatch | null = null;
    for (let at = from; at < tokens.length && nodes.length > 0; at += 1) {
      const token = tokens[at] as string;
      nodes = nodes.flatMap((node) => follow(node, token));
      const senses = sensesOf(nodes);
      if (senses.length > 0) best = { from, to: at + 1, senses };
    }
    return best;
  }
}

function wordsKey(tokens: readonly string[]): string {
  return tokens.toSorted().join(' ');
}

function addTo(senses: Sense[], sense: Sense): void {
  if (!senses.some((known) => isSame(known, sense))) senses.push(sense);
}

function follow(node: PhraseNode, token: string): PhraseNode[] {
  const bare = withoutMark(token);
  const exact = node.next.get(bare);
  if (exact) return [exact];
  if (bare === token || bare.length < 3) return [];
  return [...node.next].flatMap(([word, next]) => (word.startsWith(bare) ? [next] : []));
}

/** What one word cut short may stand for is known only where all that it can be mean one thing. */
function sensesOf(nodes: readonly PhraseNode[]): Sense[] {
  const [first, ...others] = nodes.filter(({ senses }) => senses.length > 0);
  if (!first || others.length === 0) return first?.senses ?? [];
  return first.senses.filter((sense) =>
    others.every(({ senses }) => senses.some((each) => isSame(each, sense))),
  );
}

function isSame(a: Sense, b: Sense): boolean {
  return a.kind === b.kind && nameOf(a) === nameOf(b);
}

function nameOf(sense: Sense): string {
  return 'name' in sense ? sense.name : '';
}

/** `A`, `D` and `S1` are names of trials and specimens as often as symbols; alone they say nothing. */
const isTelling = (phrase: string) => !/^\s*(?:\p{L}|[A-Z]\d)\s*$/u.test(phrase);

let shared: PhraseIndex | null = null;

function sharedIndex(): PhraseIndex {
  if (shared) return shared;
  const index = new PhraseIndex();
  for (const { id, label, symbol, aliases } of allQuantities()) {
    for (const name of [label, symbol, ...aliases].filter(isTelling))
      index.add(name, { kind: 'quantity', name: id });
  }
  for (const words of [volumetricWords, aggregateWords, performanceWords, shortWords]) {
    for (const [id, phrases] of Object.entries(words)) index.addAll(phrases, { kind: 'quantity', name: id });
  }
  for (const [name, phrases] of Object.entries(keyWords))
    index.addAll(phrases, { kind: 'key', name: name as KeyName });
  for (const [name, phrases] of Object.entries(roleWords))
    index.addAll(phrases, { kind: 'role', name: name as Role });
  index.addAll(designWords, { kind: 'design' });
  index.addAll(laboratoryWords.contractor, { kind: 'laboratory', name: 'contractor' });
  index.addAll(laboratoryWords.agency, { kind: 'laboratory', name: 'agency' });
  index.addAll(furnitureWords, { kind: 'furniture' });
  index.addAll(rawWords, { kind: 'raw' });
  for (const [name, phrases] of Object.entries(attributeWords))
    index.addAll(phrases, { kind: 'attribute', name });
  shared = index;
  return index;
}

export interface Vocabulary {
  shared: PhraseIndex;
  /** What the edition itself declares. */
  own: PhraseIndex;
}

export function vocabularyOf(edition: ReadingEdition): Vocabulary {
  return { shared: sharedIndex(), own: ownIndex(edition) };
}

function ownIndex(edition: ReadingEdition): PhraseIndex {
  const own = new PhraseIndex();
  for (const { id, label, symbol, aliases } of edition.quantities) {
    for (const name of [label, symbol, ...aliases].filter(isTelling))
      own.add(name, { kind: 'quantity', name: id });
  }
  for (const { name, label, aliases } of [...withStandardAttributes(edition.attributes), ...submittalFacts]) {
    for (const phrase of [name, label ?? name, ...(aliases ?? [])])
      own.add(phrase, { kind: 'attribute', name });
  }
  for (const { type, label, aliases } of withStandardDocuments(edition.documents)) {
    for (const phrase of [type, label ?? type, ...(aliases ?? [])])
      own.add(phrase, { kind: 'document', name: type });
    if (documentWords[type]) own.addAll(documentWords[type], { kind: 'document', name: type });
  }
  return own;
}

/** The longest phrase of either index; where both know it, all that it can mean. */
export function longestPhrase(
  vocabulary: Vocabulary,
  tokens: readonly string[],
  from: number,
): PhraseMatch | null {
  const known = vocabulary.shared.longestAt(tokens, from);
  const own = vocabulary.own.longestAt(tokens, from);
  if (!known || !own) return known ?? own;
  if (known.to !== own.to) return known.to > own.to ? known : own;
  return { ...known, senses: [...own.senses, ...known.senses] };
}

const domains: [Domain, string[][]][] = Object.entries(domainWords).map(([domain, phrases]) => [
  domain as Domain,
  phrases.split('|').map(tokensOf),
]);

/** The kinds of test that a title speaks of. */
export function domainsIn(text: string): Domain[] {
  const line = ` ${tokensOf(text).join(' ')} `;
  return domains.flatMap(([domain, phrases]) =>
    phrases.some((phrase) => phrase.length > 0 && line.includes(` ${phrase.join(' ')} `)) ? [domain] : [],
  );
}

export const harmless: ReadonlySet<string> = new Set(tokensOf(harmlessWords));
