import type { CreepFindingView } from '#shared/contracts/creep';
import { formatPlain, groupThousands } from '#shared/format/numbers';
import { colourOfMark, markOfOutcome } from '../../../components/ui/marks';
import type { Flag } from '../lib/creep-geometry';

/** A rule's limit at its loading time, with the value that was judged in the outcome's own marker. */
export function LimitFlag({ flag: { x, limits, value, view }, bottom }: { flag: Flag; bottom: number }) {
  const { finding, time } = view;
  const times = `${groupThousands(formatPlain(time))} s`;
  return (
    <g className={colourOfMark[markOfOutcome[finding.outcome]]}>
      <path className="flag-drop" d={`M${x} ${value?.y ?? limits[0]?.y ?? bottom}V${bottom}`} />
      {limits.map(({ y, towards, label, labelX, anchor }) => (
        <g key={towards}>
          <rect className="lane" x={x - 4} y={towards === 'up' ? y - POLE : y} width="8" height={POLE} />
          <path className="flag-arrow" d={arrow(x, towards === 'up' ? y - POLE : y + POLE, towards)} />
          <path className="limit-tick" d={`M${x - 15} ${y}h30`} />
          <text className="flag-label" x={labelX} y={y + (towards === 'up' ? 16 : -8)} textAnchor={anchor}>
            <tspan className="flag-clause">{finding.clause ?? finding.title}</tspan>
            {label === '' ? '' : ` ${times}, ${label}`}
          </text>
        </g>
      ))}
      {value === null ? null : <Value x={x} value={value} view={view} />}
    </g>
  );
}

const POLE = 26;

function arrow(x: number, y: number, towards: 'up' | 'down'): string {
  const back = towards === 'up' ? 5 : -5;
  return `M${x - 4} ${y + back}L${x} ${y}L${x + 4} ${y + back}`;
}

function Value({ x, value, view }: { x: number; value: NonNullable<Flag['value']>; view: CreepFindingView }) {
  const { y, low, high } = value;
  const { finding, band, estimate, confidence, source } = view;
  const isBeyond = source === 'extrapolated';
  const percent = formatPlain(confidence * 100, 4);
  return (
    <>
      {low === null || high === null ? null : (
        <path className="flag-interval" d={`M${x} ${low}V${high}M${x - 5} ${low}h10M${x - 5} ${high}h10`} />
      )}
      <Marker x={x} y={y} outcome={finding.outcome} />
      {isBeyond && estimate !== null ? (
        <text className="flag-value" x={x - 14} y={y - 22} textAnchor="end">
          <tspan className="flag-estimate">{formatPlain(estimate, 3)} estimated</tspan>
          {band?.lower == null ? null : (
            <tspan x={x - 14} dy="15">
              {percent} % low {formatPlain(band.lower, 3)}
            </tspan>
          )}
        </text>
      ) : null}
    </>
  );
}

/** As on the gauge: a disc passes, a square fails, half a diamond is undecided. */
function Marker({
  x,
  y,
  outcome,
}: {
  x: number;
  y: number;
  outcome: CreepFindingView['finding']['outcome'];
}) {
  if (outcome === 'fail') return <rect className="flag-dot" x={x - 5} y={y - 5} width="10" height="10" />;
  if (outcome === 'pass') return <circle className="flag-dot" cx={x} cy={y} r="5.5" />;
  return (
    <>
      <path className="flag-outline" d={`M${x} ${y - 7}L${x + 7} ${y}L${x} ${y + 7}L${x - 7} ${y}Z`} />
      <path className="flag-dot" d={`M${x} ${y - 6.4}V${y + 6.4}L${x - 6.4} ${y}Z`} />
    </>
  );
}
