import { symbolParts } from '#shared/format/symbols';

/** A trade symbol within a text of a drawing: italic, its subscript lowered. */
export function DrawnSymbol({ children }: { children: string }) {
  const { base, sub } = symbolParts(children);
  return (
    <>
      <tspan fontStyle="italic">{base}</tspan>
      {sub === '' ? null : (
        <tspan fontSize="9" dy="3">
          {sub}
        </tspan>
      )}
      {/* What follows stands on the line again. */}
      {sub === '' ? ' ' : <tspan dy="-3"> </tspan>}
    </>
  );
}
