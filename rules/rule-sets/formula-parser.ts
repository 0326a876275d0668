import { createParse } from 'mathjs/number';
import { FormulaFault } from './formula-fault';

/** A formula as a tree of the few things that it may consist of. Numbers keep the digits they are written with. */
export type Expression =
  | { kind: 'number'; written: string }
  | { kind: 'name'; name: string }
  | { kind: 'operation'; operator: Operator; operands: Expression[] }
  | { kind: 'call'; name: FormulaFunction; operands: Expression[] };

export type Operator = 'add' | 'subtract' | 'multiply' | 'divide' | 'pow' | 'unaryMinus' | 'unaryPlus';

/** Functions that a formula may use, with the fewest and the most values they take. */
export const FORMULA_FUNCTIONS = {
  abs: [1, 1],
  min: [2, Number.POSITIVE_INFINITY],
  max: [2, Number.POSITIVE_INFINITY],
  sqrt: [1, 1],
  exp: [1, 1],
  ln: [1, 1],
  log10: [1, 1],
} as const;

export type FormulaFunction = keyof typeof FORMULA_FUNCTIONS;

/**
 * The tree of a formula. The library only parses: it is given our own classes of nodes, so that it has nothing to
 * evaluate or to compile, and whatever a formula may not contain is refused while the tree is built.
 *
 * Throws a `FormulaFault` for what is not allowed and the library's own SyntaxError for what is no formula.
 */
export function parseExpression(text: string): Expression {
  const node = parse(text);
  if (!(node instanceof FormulaNode)) throw refused('a list of formulas');
  return node.expression;
}

class FormulaNode {
  // The library asks for this mark before it looks at any other.
  get isNode(): boolean {
    return true;
  }
  constructor(readonly expression: Expression) {}
}

class NumberNode extends FormulaNode {
  readonly isConstantNode = true;
  constructor(written: unknown) {
    if (written === undefined)
      throw new FormulaFault('the formula is empty.', 'Write a formula such as Gse - Gsb.');
    // The library stands a number of its own beside the sign for percent, and nothing else that is no text.
    if (typeof written !== 'string') throw refused('the sign % or a word of a language');
    super({ kind: 'number', written });
  }
}

class NameNode extends FormulaNode {
  readonly isSymbolNode = true;
  constructor(readonly name: string) {
    super({ kind: 'name', name });
  }
}

class OperationNode extends FormulaNode {
  readonly isOperatorNode = true;
  readonly fn: string;
  constructor(
    readonly op: string,
    fn: string,
    readonly args: FormulaNode[],
    isImplicit = false,
    isPercentage = false,
  ) {
    if (isPercentage || !OPERATORS.has(fn)) throw refused(`the sign ${isPercentage ? '%' : op}`);
    if (isImplicit) {
      throw new FormulaFault(
        'two terms stand side by side without a sign between them.',
        'Write * for a product.',
      );
    }
    super({
      kind: 'operation',
      operator: fn as Operator,
      operands: args.map(({ expression }) => expression),
    });
    this.fn = fn;
  }
}

class CallNode extends FormulaNode {
  readonly isFunctionNode = true;
  constructor(
    readonly fn: unknown,
    readonly args: FormulaNode[],
  ) {
    const name = fn instanceof NameNode ? fn.name : '';
    const arity = isFunction(name) ? FORMULA_FUNCTIONS[name] : null;
    if (arity === null)
      throw new FormulaFault(`${name} is not a function that a formula can use.`, FUNCTIONS_FIX);
    if (args.length < arity[0] || args.length > arity[1]) {
      throw new FormulaFault(
        `${name} is given ${args.length} value${args.length === 1 ? '' : 's'}.`,
        `Give ${arity[1] === 1 ? 'one value' : `${arity[0]} values or more`}.`,
      );
    }
    super({
      kind: 'call',
      name: name as FormulaFunction,
      operands: args.map(({ expression }) => expression),
    });
  }
}

function isFunction(name: string): name is FormulaFunction {
  return Object.hasOwn(FORMULA_FUNCTIONS, name);
}

/** What brackets hold stands for itself. */
class BracketNode extends FormulaNode {
  constructor(content: FormulaNode) {
    super(content.expression);
  }
}

function forbidden(what: string) {
  return class {
    constructor() {
      throw refused(what);
    }
  };
}

function refused(what: string): FormulaFault {
  return new FormulaFault(
    `it holds ${what}, which a formula cannot.`,
    `Use + - * / ^, brackets, numbers, trade symbols and ${Object.keys(FORMULA_FUNCTIONS).join(', ')}.`,
  );
}

const OPERATORS = new Set<string>([
  'add',
  'subtract',
  'multiply',
  'divide',
  'pow',
  'unaryMinus',
  'unaryPlus',
] satisfies Operator[]);

const FUNCTIONS_FIX = `Use one of ${Object.keys(FORMULA_FUNCTIONS).join(', ')}, or write * for a product.`;

const parse = createParse({
  typed: Object.assign(
    (_name: string, signatures: { string: (text: string) => unknown }) => signatures.string,
    { addConversion: () => undefined },
  ),
  // The digits as written: they are read as decimals, never through a binary number.
  numeric: (written: string) => written,
  config: { number: 'number', numberFallback: 'number' },
  AccessorNode: forbidden('a dot or brackets after a name'),
  ArrayNode: forbidden('a list'),
  AssignmentNode: forbidden('an assignment'),
  BlockNode: forbidden('more than one formula'),
  ConditionalNode: forbidden('a condition'),
  ConstantNode: NumberNode,
  FunctionAssignmentNode: forbidden('a definition of a function'),
  FunctionNode: CallNode,
  IndexNode: forbidden('an index'),
  ObjectNode: forbidden('an object'),
  OperatorNode: OperationNode,
  ParenthesisNode: BracketNode,
  RangeNode: forbidden('a range'),
  RelationalNode: forbidden('a comparison'),
  SymbolNode: NameNode,
});
