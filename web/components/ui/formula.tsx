import type { ReactNode } from 'react';
import { type FormulaNode, parseFormula } from '#shared/format/formula-tree';
import { QuantitySymbol } from './quantity-symbol';
import { RichText } from './rich-text';

/** A formula set as printed, with fractions; a text that is none is shown as it is written. */
export function Formula({
  children,
  values,
}: {
  children: string;
  /** What stands in place of a symbol: its value, with its tie. */
  values?: ReadonlyMap<string, ReactNode>;
}) {
  const tree = parseFormula(children);
  if (!tree) return <RichText>{children}</RichText>;
  return <span className="equation">{setNode(tree, values)}</span>;
}

export function Fraction({ over, under }: { over: ReactNode; under: ReactNode }) {
  return (
    <span className="fraction">
      <span>{over}</span>
      <span>{under}</span>
    </span>
  );
}

function setNode(node: FormulaNode, values: ReadonlyMap<string, ReactNode> | undefined): ReactNode {
  const set = (inner: FormulaNode) => setNode(inner, values);
  switch (node.kind) {
    case 'number':
      return node.text;
    case 'symbol':
      return values?.get(node.name) ?? <QuantitySymbol>{node.name}</QuantitySymbol>;
    case 'fraction':
      return <Fraction over={set(node.over)} under={set(node.under)} />;
    case 'negative':
      return <>−{set(node.of)}</>;
    case 'group':
      return (
        <span className="equation equation-tight">
          <span>(</span>
          <span className="equation">{set(node.of)}</span>
          <span>)</span>
        </span>
      );
    case 'absolute':
      return (
        <span className="equation equation-tight">
          <span>|</span>
          <span className="equation">{set(node.of)}</span>
          <span>|</span>
        </span>
      );
    case 'call':
      return (
        <span className="equation equation-tight">
          <span>{node.name === '√' ? '√(' : `${node.name}(`}</span>
          {node.of.map((argument, index) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: the arguments of one printed formula do not move.
            <span key={index} className="equation">
              {index > 0 ? ', ' : null}
              {set(argument)}
            </span>
          ))}
          <span>)</span>
        </span>
      );
    case 'operation':
      if (node.operator === '^') {
        return (
          <span>
            {set(node.left)}
            <sup>{set(node.right)}</sup>
          </span>
        );
      }
      return (
        <>
          {set(node.left)} <span>{node.operator === '·' ? '×' : node.operator}</span> {set(node.right)}
        </>
      );
  }
}
