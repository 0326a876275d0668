import { isStandardSieve } from '../quantities/sieves';
import type { EditionView } from './edition-view';
import { FormulaFault } from './formula-fault';
import { type Expression, FORMULA_FUNCTIONS, parseExpression } from './formula-parser';

/** A trade symbol of a formula: the quantity, and the sieve where the symbol names one. */
export interface FormulaSymbol {
  /** As written: `Gse`, `P0.075`. */
  symbol: string;
  quantity: string;
  /** mm; null where the symbol names none. */
  sieve: number | null;
}

export interface Formula {
  /** Names in it are those of `symbols`. */
  expression: Expression;
  symbols: FormulaSymbol[];
  /** As a reader sees it: "(P0.6 − P0.075)/(P2.36 − P0.075)". */
  text: string;
}

export type FormulaResult = { ok: true; formula: Formula } | { ok: false; detail: string; fix: string };

/**
 * A formula over trade symbols of the registry and of the edition's own quantities. A quantity measured by sieve is
 * followed by the opening in mm, `P0.075`; without one it takes the sieve of the rule's own conditions.
 */
export function readFormula(expression: string, view: EditionView): FormulaResult {
  const ofView = formulas.get(view) ?? new Map<string, FormulaResult>();
  formulas.set(view, ofView);
  const kept = ofView.get(expression);
  if (kept) return kept;
  const result = read(expression, view);
  ofView.set(expression, result);
  return result;
}

/** An edition does not change once it is parsed; each of its formulas is read once. */
const formulas = new WeakMap<EditionView, Map<string, FormulaResult>>();

function read(expression: string, view: EditionView): FormulaResult {
  try {
    const pieces = piecesOf(expression, view);
    const symbols: FormulaSymbol[] = [];
    const names = new Map<string, string>();
    const text = pieces.map((piece) => {
      if (typeof piece === 'string') return piece;
      const known = symbols.findIndex(({ symbol }) => symbol === piece.symbol);
      const place = known < 0 ? symbols.push(piece) - 1 : known;
      // A symbol such as `Va,field` or `P0.075` is no name to a parser: it reads a stand-in.
      const name = `q${place}`;
      names.set(name, piece.symbol);
      return ` ${name} `;
    });
    if (symbols.length === 0 && expression.trim() !== '') {
      throw new FormulaFault('the formula names no quantity.', 'Use trade symbols such as Gse or P0.075.');
    }
    const tree = renamed(parsed(text.join(''), names), names);
    return { ok: true, formula: { expression: tree, symbols, text: shown(pieces) } };
  } catch (error) {
    if (error instanceof FormulaFault) return { ok: false, detail: error.detail, fix: error.fix };
    throw error;
  }
}

function parsed(text: string, names: ReadonlyMap<string, string>): Expression {
  try {
    return parseExpression(text);
  } catch (error) {
    if (error instanceof FormulaFault) {
      throw new FormulaFault(withSymbols(error.detail, names), error.fix);
    }
    const message = error instanceof Error ? error.message : '';
    const cause = withSymbols(message.replace(/\s*\(char \d+\)/, ''), names);
    throw new FormulaFault(
      `the formula cannot be read: ${cause.charAt(0).toLowerCase()}${cause.slice(1)}.`,
      'Close every bracket and put a value on both sides of every sign.',
    );
  }
}

function withSymbols(text: string, names: ReadonlyMap<string, string>): string {
  return text.replace(/\bq\d+\b/g, (name) => names.get(name) ?? name);
}

function renamed(expression: Expression, names: ReadonlyMap<string, string>): Expression {
  if (expression.kind === 'number') return expression;
  if (expression.kind === 'name')
    return { kind: 'name', name: names.get(expression.name) ?? expression.name };
  return { ...expression, operands: expression.operands.map((each) => renamed(each, names)) };
}

/** Symbols, and what stands between them as the parser wants it. */
function piecesOf(expression: string, view: EditionView): (string | FormulaSymbol)[] {
  const pieces: (string | FormulaSymbol)[] = [];
  let rest = withPlainSigns(expression);
  while (rest !== '') {
    const number = NUMBER.exec(rest)?.[0];
    const piece = number ?? symbolAt(rest, view) ?? functionAt(rest) ?? plainAt(rest);
    pieces.push(piece);
    rest = rest.slice(typeof piece === 'string' ? piece.length : piece.symbol.length);
  }
  return pieces;
}

const NUMBER = /^(?:\d+(?:\.\d+)?|\.\d+)(?:[eE][+-]?\d+)?/;
const WORD = /^[\p{L}_][\p{L}\p{N}_]*/u;

function symbolAt(rest: string, view: EditionView): FormulaSymbol | null {
  const indexed = /^(\p{L}+)(\d+(?:\.\d+)?)(?![\p{L}\p{N}_])/u.exec(rest);
  const whole = longestSymbol(rest, view);
  if (indexed && (whole === null || indexed[0].length > whole.length)) {
    const [symbol = '', base = '', opening = ''] = indexed;
    const quantity = quantityOf(base, view);
    if (quantity !== null && isBySieve(quantity, view)) return atSieve(symbol, quantity, Number(opening));
  }
  if (whole === null) return null;
  const quantity = quantityOf(whole, view);
  return quantity === null ? null : { symbol: whole, quantity, sieve: null };
}

/** The longest symbol that stands here as a whole: `Gsb` is not `Gs` and a b. */
function longestSymbol(rest: string, view: EditionView): string | null {
  let longest: string | null = null;
  for (const symbol of view.symbols.keys()) {
    const isHere = rest.startsWith(symbol) && !/^[\p{L}\p{N}_]/u.test(rest.slice(symbol.length));
    if (isHere && (longest === null || symbol.length > longest.length)) longest = symbol;
  }
  return longest;
}

function quantityOf(symbol: string, view: EditionView): string | null {
  const [only, ...others] = view.symbols.get(symbol) ?? [];
  if (only === undefined) return null;
  if (others.length === 0) return only;
  throw new FormulaFault(
    `the symbol ${symbol} stands for ${[only, ...others].join(' and ')}.`,
    "Give the edition's own quantity a symbol of its own.",
  );
}

function isBySieve(quantity: string, view: EditionView): boolean {
  return view.quantity(quantity)?.conditions.includes('sieve') ?? false;
}

function atSieve(symbol: string, quantity: string, sieve: number): FormulaSymbol {
  if (isStandardSieve(sieve)) return { symbol, quantity, sieve };
  throw new FormulaFault(
    `${symbol} names a sieve of ${sieve} mm, which neither series has.`,
    'Write the opening in mm, such as P0.075 for No. 200.',
  );
}

function functionAt(rest: string): string | null {
  const word = WORD.exec(rest)?.[0];
  if (word === undefined) return null;
  if (/^\s*\(/.test(rest.slice(word.length))) return word;
  const isFunction = Object.hasOwn(FORMULA_FUNCTIONS, word);
  throw new FormulaFault(
    isFunction ? `the function ${word} is given nothing.` : `the symbol ${word} is not known.`,
    isFunction
      ? `Write ${word}(…).`
      : 'Use a trade symbol of the registry, such as Gmm, or declare a quantity with this symbol.',
  );
}

/** Brackets, signs and spaces, up to where a number or a name could begin. */
function plainAt(rest: string): string {
  return /^\s+/.exec(rest)?.[0] ?? rest.charAt(0);
}

function withPlainSigns(expression: string): string {
  return expression
    .normalize('NFC')
    .replace(/[−–]/g, '-')
    .replace(/[·×∙⋅]/g, '*')
    .replace(/÷/g, '/');
}

function shown(pieces: (string | FormulaSymbol)[]): string {
  return pieces
    .map((piece) => (typeof piece === 'string' ? piece.replace('-', '−').replace('*', '·') : piece.symbol))
    .join('')
    .replace(/\s+/g, ' ')
    .replace(/ · /g, '·')
    .trim();
}
