import { symbolParts } from '#shared/format/symbols';

/** `Pbe` set as the trade sets it: italic P, roman subscript be. */
export function QuantitySymbol({ children }: { children: string }) {
  const { base, sub } = symbolParts(children);
  return (
    <span className="whitespace-nowrap">
      <var>{base}</var>
      {sub ? <sub>{sub}</sub> : null}
    </span>
  );
}
