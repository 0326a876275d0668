import type { Conditions } from '../../record';
import { plainText } from '../plain-text';
import type { Domain } from '../words/context-words';
import type { KeyName, Role } from '../words/key-words';
import {
  domainsIn,
  harmless,
  longestPhrase,
  type PhraseMatch,
  type Sense,
  type Vocabulary,
} from '../words/phrase-index';
import { markedTokensOf, tokensOf, withoutMark } from '../words/tokens';
import { sieveInLabel, statedConditions } from './label-conditions';
import { labelUnit } from './label-unit';
import { isMaterial } from './materials';

/** What the text of a heading, a row label or a title says. */
export interface LabelMeaning {
  text: string;
  /** Quantities that the same words may mean; empty where they name none. */
  quantities: string[];
  /** One common word, which gives way where another heading names something else. */
  weak: boolean;
  attribute: string | null;
  document: string | null;
  keys: KeyName[];
  at: Conditions;
  role: Role | null;
  unit: string | null;
  unknownUnit: string | null;
  method: string | null;
  percent: boolean;
  furniture: boolean;
  raw: boolean;
  /** Binder content that names a trial, as written. */
  binder: string | null;
  /** Which half of a moisture test. */
  subset: 'dry' | 'conditioned' | null;
  /** By mass of aggregate, not of mix. */
  onAggregate: boolean;
  /** By mass of mix, said in words. */
  onMix: boolean;
  /** A misspelt word that the quantity rests on alone. */
  misspelt: string | null;
  /** Words of it that nothing here knows. */
  unknown: string[];
  words: number;
  domains: Domain[];
}

/** True where a label says something that a table's heading would say. */
export function isHeading(meaning: LabelMeaning): boolean {
  if (meaning.unknown.length > 1) return false;
  return (
    meaning.quantities.length > 0 ||
    meaning.keys.length > 0 ||
    meaning.role !== null ||
    Object.keys(meaning.at).length > 0 ||
    meaning.binder !== null ||
    meaning.attribute !== null ||
    meaning.raw
  );
}

/** Labels come again from workbook to workbook; a stream of other texts must not pile up. */
const keptTexts = 5000;

/** Understands labels, each distinct text once. */
export class LabelReader {
  private readonly known = new Map<string, LabelMeaning>();

  constructor(private readonly vocabulary: Vocabulary) {}

  read(text: string): LabelMeaning {
    const known = this.known.get(text);
    if (known) return known;
    if (this.known.size >= keptTexts) this.known.clear();
    const meaning = text.length > 160 ? emptyMeaning(text, 30) : understandSpelling(text, this.vocabulary);
    this.known.set(text, meaning);
    return meaning;
  }
}

/** Words that turn a name into something else than the result itself. */
const changing = wordsOf(
  `dust virgin loss tolerance difference change ratio correction factor uncorrected rap ras added additional recovered extracted increase decrease slope intercept residual lost error deviation estimated assumed guess previous old
  cost price vol volume equation coefficient r2 rsq regression confidence uncertainty trial1 supplier source type name brand origin lot tank sample identification number id grade class classification level category limit limits`,
);

const weakWords = wordsOf(
  `binder asphalt bitumen bitume liant ligante betun asfalto bindemittel voids bulk apparent density strain strength flow load height thickness absorption rut lime abrasion percentage share part formule dosage dosierung anteil slope compliance
  flash coating retained passing gradation proportion durabilidad soundness strength viscosity flujo compactacion compactacion porosite densidad hohlraum vides vacios huecos las se fm fi pi sa la ac pen ri rice impression los angeles stability penetration stripping shingles deleterious refus
  ruckstand durchgang passant retenido pasa permeability saturation saturacion diameter dia espesor altura hauteur hohe dicke durchmesser height gyrations girations drehungen umdrehungen component dust ef e* cantabro dct rap ras gtr depth`,
);

function wordsOf(list: string): ReadonlySet<string> {
  return new Set(tokensOf(list));
}

/** "VMA (min. 14.0), %", "VFA (65-75)": the limit in brackets is no part of the name. */
const bracketedLimit =
  /[([]\s*(?:(?:min|max|spec|limit|target|req|mind|höchst|mini|maxi|mín|máx)[a-zé.]*\s*[:=]?\s*\d[^)\]]*|[≥≤<>]=?\s*\d[^)\]]*|\d+(?:[.,]\d+)?\s*(?:-|–|to|bis|à|a)\s*\d+(?:[.,]\d+)?\s*%?)\s*[)\]]/i;

/**
 * A label that says nothing as it is spelt is read as its words are meant. Beside a unit, or in a name of several
 * words, the misspelling is as good as the word; alone it leaves a doubt.
 */
function understandSpelling(text: string, vocabulary: Vocabulary): LabelMeaning {
  const meaning = understand(text, vocabulary);
  const { unknown } = meaning;
  if (unknown.length === 0 || unknown.length > 3 || meaning.attribute !== null || text.length > 80)
    return meaning;
  const misspelt: string[] = [];
  const spelt = plainText(text).replace(/\p{L}{5,}/gu, (word) => {
    const [token] = tokensOf(word);
    const meant = token === undefined || harmless.has(token) ? null : vocabulary.shared.nearest(word);
    if (meant === null) return word;
    misspelt.push(word);
    return meant;
  });
  if (misspelt.length === 0) return meaning;
  const meant = understand(spelt, vocabulary);
  const saysMore = meant.quantities.length > 0 && !meant.weak && !isMaterial(meant.quantities);
  if (meant.unknown.length > 0 || !(saysMore || meant.keys.length > 0 || meant.role !== null)) return meaning;
  const isAlone = meant.words < 2 && meant.unit === null;
  return { ...meant, text, misspelt: saysMore && isAlone ? misspelt.join(' ') : null };
}

function understand(text: string, vocabulary: Vocabulary): LabelMeaning {
  const domains = domainsIn(text);
  const stated = statedConditions(withoutCycles(text.replace(bracketedLimit, ' ').replace(atSieves, ' ')));
  const isRatio = /\/\s*P\s?be?\b|dust|ratio|proportion\b.*\/|polvo/i.test(text);
  const namesSieve =
    !isRatio &&
    /pass|pasa|\bp\s?#\s?\d|p[ _-]?0|p[ _-]?\d{2,3}\b|retain|reten|refus|durchgang|rückstand|minus|tamis|finer|^\s*-\s*(?:no|#)?\s*200/i.test(
      text,
    );
  const sieve = namesSieve ? sieveInLabel(stated.rest) : null;
  const taken = labelUnit(sieve ? sieve.rest : stated.rest);
  const meaning: LabelMeaning = {
    ...emptyMeaning(text, 0),
    at: stated.at,
    binder: stated.binder,
    unit: taken.unit,
    unknownUnit: taken.unknownUnit,
    method: taken.method,
    domains,
    subset: subsetIn(text),
    onAggregate:
      /\b(?:mass|weight|wt\.?) of (?:dry )?agg|% (?:of )?agg(?:regate)?s?\b|s\/a\b|s\/\s?[áa]r|s\/agr|sobre (?:los )?(?:[áa]ridos|agregados?)|ext[ée]rieure?|des granulats|bezogen auf (?:das )?gestein|by dry aggregate/i.test(
        text,
      ),
    onMix:
      /\b(?:mass|weight|wt\.?) of (?:the )?(?:total )?mix|% (?:of )?(?:total )?mix|of (?:total )?mix\b|in mix\b|s\/m\b|sobre (?:la )?mezcla|en la mezcla|du m[ée]lange|am Mischgut|int[ée]rieure?|total mix/i.test(
        text,
      ),
  };
  if (sieve) meaning.at = { ...meaning.at, sieve: sieve.sieve };
  const marked = markedTokensOf(taken.rest);
  const tokens = marked.map(withoutMark);
  meaning.words = tokens.length;
  const matches: PhraseMatch[] = [];
  for (let at = 0; at < tokens.length; ) {
    const match = longestPhrase(vocabulary, marked, at);
    if (match) {
      matches.push(match);
      at = match.to;
      continue;
    }
    const token = tokens[at] as string;
    if (token === '%') meaning.percent = true;
    else if (!harmless.has(token)) meaning.unknown.push(token);
    at += 1;
  }
  addSenses(meaning, matches, tokens);
  if (meaning.quantities.length === 0 && meaning.unit === '%' && !tokens.includes('%')) {
    // "Blend, %" and "Blend %" are one name.
    const whole = longestPhrase(vocabulary, [...tokens, '%'], 0);
    if (whole?.to === tokens.length + 1) {
      meaning.unknown = [];
      addSenses(meaning, [whole], [...tokens, '%']);
    }
  }
  addOtherOrder(meaning, tokens, vocabulary);
  addSymbol(meaning, tokens);
  const numbered = numberedSpecimen(meaning);
  if (numbered !== null) {
    meaning.at = { ...meaning.at, specimen: numbered };
    meaning.unknown = [];
  }
  if (meaning.role === 'limit' && isTargetOfBlend(text)) {
    meaning.role = null;
    meaning.at = { trial: 'design', ...meaning.at };
  }
  if (meaning.percent && meaning.unit === null) meaning.unit = '%';
  if (
    sieve &&
    meaning.quantities.length === 0 &&
    !/retain|reten|refus|rückstand/i.test(text) &&
    meaning.unknown.length === 0
  ) {
    meaning.quantities = ['percent-passing'];
  }
  return meaning;
}

/** "Siebdurchgang in M.-% bei Siebweite in mm": what stands under it is in percent. */
const atSieves =
  /\b(?:bei|at|à|a|por)\s+(?:der\s+|the\s+|el\s+)?(?:Sieb\p{L}*|sieves?(?: size)?|tamis|tamiz)(?:\s*(?:in|en|,)?\s*\(?mm\)?)?\s*$/iu;

/** "Soundness (5 cycles), %": how often the test was run is no unit of its result. */
function withoutCycles(text: string): string {
  if (!/soundness|so4|sulf|sulph/i.test(text)) return text;
  return text.replace(/[,(]?\s*\(?\b\d{1,2}\s*cyc(?:les?|\.)?\)?/i, ' ');
}

/** "Strength, dry tensile" is the name with its words in another order; nothing of it may be left over. */
function addOtherOrder(meaning: LabelMeaning, tokens: string[], vocabulary: Vocabulary): void {
  if (tokens.length < 2 || tokens.length > 6) return;
  if (meaning.quantities.length > 0 && !meaning.weak && meaning.unknown.length === 0) return;
  const senses = [vocabulary.own, vocabulary.shared].flatMap((index) => index.ofWords(tokens));
  const ids = namesOf(senses, 'quantity');
  if (ids.length === 0) return;
  meaning.quantities = [...new Set(ids)];
  meaning.weak = false;
  meaning.unknown = [];
  meaning.role = null;
}

/** Symbols that stand alone before their unit: "h (mm)", "P [kN]", "T (°C)". Without the unit they name columns. */
const symbols: { symbol: RegExp; unit: RegExp; means: Sense }[] = [
  { symbol: /^h$/i, unit: /^(?:mm|cm|in)$/, means: { kind: 'quantity', name: 'specimen-height' } },
  { symbol: /^[dø]$/i, unit: /^(?:mm|cm|in)$/, means: { kind: 'quantity', name: 'specimen-diameter' } },
  { symbol: /^t$/, unit: /^(?:mm|cm|in)$/, means: { kind: 'quantity', name: 'specimen-thickness' } },
  { symbol: /^[pf]$/i, unit: /^(?:N|kN|lbf|lb)$/, means: { kind: 'quantity', name: 'failure-load' } },
  { symbol: /^s$/i, unit: /^(?:N|kN|lbf|lb)$/, means: { kind: 'quantity', name: 'marshall-stability' } },
  {
    symbol: /^f$/i,
    unit: /^(?:mm|0\.1 mm|0\.25 mm|0\.01 in)$/,
    means: { kind: 'quantity', name: 'marshall-flow' },
  },
  {
    symbol: /^(?:s1|std)$/i,
    unit: /^(?:kPa|MPa|psi)$/,
    means: { kind: 'quantity', name: 'tensile-strength-dry' },
  },
  {
    symbol: /^(?:s2|stm|stc)$/i,
    unit: /^(?:kPa|MPa|psi)$/,
    means: { kind: 'quantity', name: 'tensile-strength-conditioned' },
  },
  { symbol: /^(?:deformation|ε)$/i, unit: /^µε$/, means: { kind: 'quantity', name: 'creep-strain' } },
  { symbol: /^[dj]$/i, unit: /^1\/[kMG]?(?:Pa|psi)$/, means: { kind: 'quantity', name: 'creep-compliance' } },
  { symbol: /^t$/i, unit: /^(?:°C|°F)$/, means: { kind: 'key', name: 'temperature' } },
  { symbol: /^(?:σ|s|tension)$/i, unit: /^(?:kPa|MPa|psi)$/, means: { kind: 'key', name: 'stress' } },
];

function addSymbol(meaning: LabelMeaning, tokens: string[]): void {
  const [only, ...more] = tokens;
  const { unit } = meaning;
  if (only === undefined || more.length > 0 || unit === null) return;
  // "Deformación" is a flow in mm and a strain in µε.
  if (meaning.quantities.some((id) => id !== 'marshall-flow')) return;
  const found = symbols.find((each) => each.symbol.test(only) && each.unit.test(unit));
  if (!found) return;
  meaning.unknown = [];
  meaning.keys = [];
  meaning.role = null;
  if (found.means.kind === 'quantity') meaning.quantities = [found.means.name];
  else addSense(meaning, found.means, { isWhole: true });
}

/** "Gemisch (Soll)", "Target blend": what the proposed mix is made to, and no limit. */
function isTargetOfBlend(text: string): boolean {
  return (
    /\b(?:soll|target|ziel|objetivo|vis[ée]e?)\b/i.test(text) &&
    /gemisch|blend|combined|\bmix\b|mischung|mezcla|m[ée]lange|gradation|sieblinie/i.test(text) &&
    !/grenz|\bmin|\bmax|tol|limit|range|band|bereich/i.test(text)
  );
}

/** "Height 2" and "Strain 3" number the specimen behind the name; "Nini (8)" states a number of gyrations. */
function numberedSpecimen({ quantities, unknown, at, text }: LabelMeaning): string | null {
  const [only, ...more] = unknown;
  if (only === undefined || more.length > 0 || quantities.length === 0 || at.specimen !== undefined)
    return null;
  if (quantities.some((id) => id.startsWith('gyrations-') || id.startsWith('coarse-aggregate'))) return null;
  return /^\d$/.test(only) && new RegExp(`\\s#?${only}\\s*(?:[(\\[,].*)?$`).test(text) ? only : null;
}

function subsetIn(text: string): 'dry' | 'conditioned' | null {
  if (
    /\b(?:unconditioned|uncond|dry|control|seco|seca|secos|trocken\w*|à sec|sec|sèches?|sans conditionnement|sin acondicionar|unkonditioniert|no acondicionad\w+)\b/i.test(
      text,
    )
  )
    return 'dry';
  const isWet =
    /\b(?:conditioned|cond|wet|moisture[- ]conditioned|freeze|húmed\w+|humed\w+|nass|wassergelagert|konditioniert|conditionn\w+|après immersion|immersion|acondicionad\w+|soaked)\b/i;
  return isWet.test(text) ? 'conditioned' : null;
}

function addSenses(meaning: LabelMeaning, matches: PhraseMatch[], tokens: string[]): void {
  const named = matches.filter(({ senses }) => senses.some(({ kind }) => kind === 'quantity'));
  const strong = named.filter((match) => !isWeak(match, tokens));
  const chosen = strong.length > 0 ? strong : named;
  const ids = chosen.map((match) => namesOf(match.senses, 'quantity'));
  const common = (ids[0] ?? []).filter((id) => ids.every((each) => each.includes(id)));
  const isChanged = meaning.unknown.some((word) => changing.has(word));
  if (common.length > 0)
    meaning.quantities = isChanged || meaning.unknown.length > 2 ? [] : told(common, meaning.text);
  else meaning.quantities = recycledOf(ids.flat());
  meaning.weak = strong.length === 0 && named.length > 0;
  const other = matches.filter(
    (match) => !named.includes(match) || meaning.quantities.length === 0 || meaning.weak,
  );
  for (const { senses, from, to } of other) {
    for (const sense of senses) addSense(meaning, sense, { isWhole: from === 0 && to === tokens.length });
  }
  if (matches.some(({ from, to }) => from === 0 && to === tokens.length)) {
    const whole = matches[0]?.senses ?? [];
    meaning.attribute = namesOf(whole, 'attribute')[0] ?? meaning.attribute;
    meaning.document = namesOf(whole, 'document')[0] ?? meaning.document;
  }
  const isTarget = meaning.quantities.includes('percent-passing') && tokens.includes('jmf');
  if (
    isTarget ||
    (meaning.quantities.includes('binder-content') && tokens.some((token) => designBinder.has(token)))
  ) {
    meaning.at = { trial: 'design', ...meaning.at };
  }
}

/** The quotient and the product of the same two are written with the same words. */
function told(ids: string[], text: string): string[] {
  if (!ids.includes('rutting-parameter') || !ids.includes('fatigue-parameter')) return ids;
  return [/\//.test(text) ? 'rutting-parameter' : 'fatigue-parameter'];
}

const designBinder = wordsOf(
  'optimum optimal optimaler optimale optimo optima design jmf oac obc selected diseno proposed retenue recommended',
);

function addSense(meaning: LabelMeaning, sense: Sense, { isWhole }: { isWhole: boolean }): void {
  switch (sense.kind) {
    case 'key':
      if (!meaning.keys.includes(sense.name)) meaning.keys.push(sense.name);
      break;
    case 'role':
      // A limit beside a name makes the whole a limit; an average gives way to it.
      if (sense.name === 'total' && meaning.quantities.length > 0) break;
      if (meaning.role === null || meaning.role === 'average') meaning.role = sense.name;
      break;
    case 'design':
      if (meaning.at.trial === undefined) meaning.at = { ...meaning.at, trial: 'design' };
      break;
    case 'laboratory':
      meaning.at = { ...meaning.at, laboratory: sense.name };
      break;
    case 'furniture':
      meaning.furniture = true;
      break;
    case 'raw':
      meaning.raw = true;
      break;
    case 'attribute':
      if (isWhole || meaning.attribute === null) meaning.attribute = sense.name;
      break;
    case 'document':
      meaning.document ??= sense.name;
      break;
    case 'quantity':
      break;
  }
}

/** "Asphalt content RAP" is the reclaimed material's; any other two names in one label are none. */
function recycledOf(ids: string[]): string[] {
  if (ids.includes('rap-content') && ids.includes('binder-content')) return ['rap-binder-content'];
  if (ids.includes('ras-content') && ids.includes('binder-content')) return ['ras-binder-content'];
  if (ids.includes('rap-content') && ids.includes('maximum-specific-gravity'))
    return ['rap-maximum-specific-gravity'];
  return [];
}

const binders = wordsOf('ac ca asphalt bitumen binder liant ligante asfalto bindemittel');

function isWeak({ from, to }: PhraseMatch, tokens: string[]): boolean {
  const words = tokens.slice(from, to).filter((token) => token !== '%');
  // "% AC" is a content and not the binder itself.
  if (words.length < to - from && binders.has(words[0] as string)) return false;
  return words.length === 1 && weakWords.has(words[0] as string);
}

function namesOf(senses: readonly Sense[], kind: 'quantity' | 'attribute' | 'document'): string[] {
  return senses.flatMap((sense) => (sense.kind === kind ? [sense.name] : []));
}

function emptyMeaning(text: string, unknownWords: number): LabelMeaning {
  return {
    text,
    quantities: [],
    weak: false,
    attribute: null,
    document: null,
    keys: [],
    at: {},
    role: null,
    unit: null,
    unknownUnit: null,
    method: null,
    percent: false,
    furniture: false,
    raw: false,
    binder: null,
    subset: null,
    onAggregate: false,
    onMix: false,
    misspelt: null,
    unknown: Array.from({ length: unknownWords }, () => '?'),
    words: unknownWords,
    domains: [],
  };
}
