import type { CreepGeometry } from '../lib/creep-geometry';

/** Both logarithmic axes with their decades, and the tested window behind everything. */
export function LogFrame({
  geometry: { frame, times, compliances, tested },
  timeLabel,
}: {
  geometry: CreepGeometry;
  timeLabel: string;
}) {
  return (
    <>
      <rect
        className="tested"
        x={tested.from}
        y={frame.top}
        width={Math.max(1, tested.to - tested.from)}
        height={frame.bottom - frame.top}
      />
      {times.map(({ at, label }) => (
        <g key={at}>
          {label === null ? null : <path className="grid-line" d={`M${at} ${frame.top}V${frame.bottom}`} />}
          <path className="axis" d={`M${at} ${frame.bottom}v${label === null ? 3 : 6}`} />
          {label === null ? null : (
            <text x={at} y={frame.bottom + 19} textAnchor="middle">
              {label}
            </text>
          )}
        </g>
      ))}
      {compliances.map(({ at, label }) => (
        <g key={at}>
          {label === null ? null : <path className="grid-line" d={`M${frame.left} ${at}H${frame.right}`} />}
          <path className="axis" d={`M${frame.left} ${at}h${label === null ? -3 : -6}`} />
          {label === null ? null : (
            <text x={frame.left - 9} y={at + 4} textAnchor="end">
              {label}
            </text>
          )}
        </g>
      ))}
      <path className="axis" d={`M${frame.left} ${frame.top}V${frame.bottom}H${frame.right}`} />
      <text x={frame.right} y={frame.bottom + 38} textAnchor="end">
        {timeLabel}
      </text>
      <text x={frame.left - 34} y={14}>
        D(t), 1/GPa
      </text>
    </>
  );
}

/** The fitted curve: solid within the tests, dashed beyond, its band behind it. */
export function FittedCurve({
  geometry: { curve },
  showBand,
}: {
  geometry: CreepGeometry;
  showBand: boolean;
}) {
  if (curve === null) return null;
  return (
    <>
      {showBand ? <path className="band" d={curve.band} /> : null}
      {curve.inside === '' ? null : <path className="fit" d={curve.inside} />}
      {curve.outside === '' ? null : <path className="fit fit-outside" d={curve.outside} />}
    </>
  );
}
