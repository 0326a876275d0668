/** A printed formula as a tree, only so that it can be set on the page; nothing is ever calculated from it. */
export type FormulaNode =
  | { kind: 'number'; text: string }
  | { kind: 'symbol'; name: string }
  | { kind: 'operation'; operator: '+' | '−' | '·' | '^'; left: FormulaNode; right: FormulaNode }
  | { kind: 'fraction'; over: FormulaNode; under: FormulaNode }
  | { kind: 'negative'; of: FormulaNode }
  | { kind: 'group'; of: FormulaNode }
  | { kind: 'absolute'; of: FormulaNode }
  | { kind: 'call'; name: string; of: FormulaNode[] };

const token = /\s*(?:(\d+(?:\.\d+)?)|([A-Za-zµτεσΣπ%][A-Za-z0-9%_.∞]*)|([-−+*·×/∕÷^(),|√]))/uy;

interface Tokens {
  list: string[];
  at: number;
}

/** Null where the text is no formula of this small kind: it is then shown as it is written. */
export function parseFormula(text: string): FormulaNode | null {
  const list = tokensOf(text);
  if (!list) return null;
  const tokens = { list, at: 0 };
  const node = sum(tokens);
  return node && tokens.at === list.length ? node : null;
}

export function symbolsOf(node: FormulaNode): string[] {
  switch (node.kind) {
    case 'symbol':
      return [node.name];
    case 'number':
      return [];
    case 'operation':
      return [...symbolsOf(node.left), ...symbolsOf(node.right)];
    case 'fraction':
      return [...symbolsOf(node.over), ...symbolsOf(node.under)];
    case 'call':
      return node.of.flatMap(symbolsOf);
    default:
      return symbolsOf(node.of);
  }
}

function tokensOf(text: string): string[] | null {
  const list: string[] = [];
  token.lastIndex = 0;
  while (token.lastIndex < text.trimEnd().length) {
    const match = token.exec(text);
    if (!match) return null;
    list.push(match[1] ?? match[2] ?? match[3] ?? '');
  }
  return list.length > 0 ? list : null;
}

function sum(tokens: Tokens): FormulaNode | null {
  let left = product(tokens);
  for (let operator = sign(tokens); left && operator; operator = sign(tokens)) {
    tokens.at += 1;
    const right = product(tokens);
    if (!right) return null;
    left = { kind: 'operation', operator, left, right };
  }
  return left;
}

function sign(tokens: Tokens): '+' | '−' | null {
  const next = tokens.list[tokens.at];
  if (next === '+') return '+';
  return next === '-' || next === '−' ? '−' : null;
}

function product(tokens: Tokens): FormulaNode | null {
  let left = factor(tokens);
  while (left) {
    const next = tokens.list[tokens.at] ?? '';
    const divides = '/∕÷'.includes(next) && next !== '';
    if (!divides && (next === '' || !'*·×'.includes(next))) return left;
    tokens.at += 1;
    const right = factor(tokens);
    if (!right) return null;
    left = divides
      ? { kind: 'fraction', over: bare(left), under: bare(right) }
      : { kind: 'operation', operator: '·', left, right };
  }
  return null;
}

function factor(tokens: Tokens): FormulaNode | null {
  if (sign(tokens) === '−') {
    tokens.at += 1;
    const of = factor(tokens);
    return of && { kind: 'negative', of };
  }
  const base = atom(tokens);
  if (!base || tokens.list[tokens.at] !== '^') return base;
  tokens.at += 1;
  const right = factor(tokens);
  return right && { kind: 'operation', operator: '^', left: base, right };
}

function atom(tokens: Tokens): FormulaNode | null {
  const text = tokens.list[tokens.at];
  if (text === undefined) return null;
  tokens.at += 1;
  if (/^\d/.test(text)) return { kind: 'number', text };
  if (text === '√') {
    const of = atom(tokens);
    return of && { kind: 'call', name: '√', of: [bare(of)] };
  }
  if (text === '|') return absolute(tokens);
  if (text === '(') {
    const of = sum(tokens);
    return of && closes(tokens) ? { kind: 'group', of } : null;
  }
  if (!/^[A-Za-zµτεσΣπ%]/u.test(text)) return null;
  return tokens.list[tokens.at] === '(' ? callOf(tokens, text) : { kind: 'symbol', name: text };
}

function absolute(tokens: Tokens): FormulaNode | null {
  const of = sum(tokens);
  if (!of || tokens.list[tokens.at] !== '|') return null;
  tokens.at += 1;
  return { kind: 'absolute', of };
}

function callOf(tokens: Tokens, name: string): FormulaNode | null {
  const of: FormulaNode[] = [];
  do {
    tokens.at += 1;
    const argument = sum(tokens);
    if (!argument) return null;
    of.push(argument);
  } while (tokens.list[tokens.at] === ',');
  return closes(tokens) ? { kind: 'call', name, of } : null;
}

function closes(tokens: Tokens): boolean {
  if (tokens.list[tokens.at] !== ')') return false;
  tokens.at += 1;
  return true;
}

/** A fraction's bar already groups what stands over and under it. */
function bare(node: FormulaNode): FormulaNode {
  return node.kind === 'group' ? node.of : node;
}
