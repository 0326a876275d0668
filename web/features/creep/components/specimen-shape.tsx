/** Specimens are told apart by shape: disc, triangle, square, then diamond and cross. */
export function SpecimenShape({ index, x, y }: { index: number; x: number; y: number }) {
  switch (index % 5) {
    case 0:
      return <circle className="specimen" cx={x} cy={y} r="4" />;
    case 1:
      return <path className="specimen" d={`M${x} ${y - 5}L${x + 4.8} ${y + 3.6}H${x - 4.8}Z`} />;
    case 2:
      return <rect className="specimen" x={x - 3.8} y={y - 3.8} width="7.6" height="7.6" />;
    case 3:
      return (
        <path className="specimen" d={`M${x} ${y - 5.2}L${x + 5.2} ${y}L${x} ${y + 5.2}L${x - 5.2} ${y}Z`} />
      );
    default:
      return (
        <path
          className="specimen"
          d={`M${x - 4} ${y - 4}L${x + 4} ${y + 4}M${x - 4} ${y + 4}L${x + 4} ${y - 4}`}
        />
      );
  }
}
