import type { Quantity } from '#rules/quantities/quantity';
import { countOf, formatPlain, groupThousands } from '#shared/format/numbers';
import { Formula } from './formula';
import { QuantitySymbol } from './quantity-symbol';
import { Sideways } from './sideways';
import './quantity-table.css';

export interface QuantityRow {
  quantity: Quantity;
  /** How workbooks write it, besides label and symbol. */
  names: readonly string[];
  /** The one of them that a search found. */
  writtenAs?: string | null;
}

/** Entries of the registry, or those that a rule set declares: unit, range, methods, formula and source of each. */
export function QuantityTable({ caption, rows }: { caption: string; rows: readonly QuantityRow[] }) {
  return (
    <Sideways label={caption} className="quantity-frame">
      <table className="table quantity-table">
        <caption className="hidden-text">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">Quantity</th>
            <th scope="col">Symbol</th>
            <th scope="col">Unit</th>
            <th scope="col">Plausible</th>
            <th scope="col">Test methods</th>
            <th scope="col">Formula and source</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ quantity, names, writtenAs }) => (
            <tr key={quantity.id} id={quantity.id} tabIndex={-1}>
              <th scope="row">
                {capitalised(quantity.label)}
                <small className="font-mono">{quantity.id}</small>
                {writtenAs ? <small>written as “{writtenAs}”</small> : null}
                {names.length > 0 ? (
                  <details>
                    <summary>{countOf(names.length, 'name')} in workbooks</summary>
                    {names.join(' · ')}
                  </details>
                ) : null}
              </th>
              <td className="quantity-symbol">
                <QuantitySymbol>{quantity.symbol}</QuantitySymbol>
              </td>
              <td>
                {unitWords(quantity.unit)}
                <Aside text={alsoAccepted(quantity)} />
                <Aside text={conditionWords(quantity)} />
              </td>
              <td>
                <span className="whitespace-nowrap">{rangeWords(quantity)}</span>
                <Aside text={decimalWords(quantity.decimals)} />
              </td>
              <td>
                {quantity.methods.length > 0 ? (
                  quantity.methods.join(', ')
                ) : (
                  <span className="mute">none</span>
                )}
                <Aside text={precisionWords(quantity)} />
              </td>
              <td>
                {quantity.derivation ? <Formula>{quantity.derivation}</Formula> : 'as tested or stated'}
                <Aside text={quantity.source} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </Sideways>
  );
}

function Aside({ text }: { text: string | null }) {
  return text === null ? null : <small>{text}</small>;
}

function unitWords(unit: string): string {
  return unit === '1' ? 'a number' : unit;
}

function alsoAccepted({ unit, acceptedUnits }: Quantity): string | null {
  const others = acceptedUnits.filter((each) => each !== unit);
  return others.length === 0 ? null : `or ${others.join(', ')}`;
}

const conditionNames: Partial<Record<Quantity['conditions'][number], string>> = {
  variant: 'form of the test',
  time: 'loading time',
};

function conditionWords({ conditions }: Quantity): string | null {
  if (conditions.length === 0) return null;
  return `with its ${conditions.map((name) => conditionNames[name] ?? name).join(', ')}`;
}

/** A range as wide as the schema's own is none that anybody set. */
const widestPlausible = 1e12;

function rangeWords({ plausible: { min, max } }: Quantity): string {
  if (min <= -widestPlausible && max >= widestPlausible) return 'any';
  return `${numberOf(min)} to ${numberOf(max)}`;
}

function numberOf(value: number): string {
  return value >= 1e6 ? value.toExponential().replace('e+', ' × 10^') : groupThousands(formatPlain(value));
}

function decimalWords(decimals: number): string {
  return decimals === 0 ? 'whole numbers' : countOf(decimals, 'decimal');
}

function precisionWords({ methodPrecision, unit }: Quantity): string | null {
  if (methodPrecision === null) return null;
  const { singleOperatorStandardDeviation, source, origin } = methodPrecision;
  const value = `${formatPlain(singleOperatorStandardDeviation)}${unit === '1' ? '' : ` ${unit}`}`;
  const memory = origin === 'memory' ? '; from memory, verify' : '';
  return `single operator s ${value}, ${source}${memory}`;
}

function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
