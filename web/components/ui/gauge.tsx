import type { Outcome } from '#rules/engine/finding';
import {
  type DotShape,
  type GaugeGeometry,
  type GaugeInput,
  gaugeGeometry,
  gaugeHeight,
} from '#shared/format/gauge-geometry';
import { colourOfMark, markOfOutcome } from './marks';

/** The limit gauge: base line, lane of what is allowed, ticks at the limits, the judged value and its precision. */
export function Gauge({ input, text }: { input: GaugeInput; text: string }) {
  const geometry = gaugeGeometry(input);
  if (!geometry) return null;
  return (
    <GaugeFrame widthPx={geometry.widthPx} outcome={input.outcome} text={text}>
      <rect className="lane" x={geometry.lane.x} y="4" width={geometry.lane.width} height="13" />
      <path className="base" d={`M0 11H${geometry.widthPx}`} />
      {geometry.decades.map(({ x, long }) => (
        <path key={x} className="decade" d={long ? `M${x} 8V14` : `M${x} 9.5V12.5`} />
      ))}
      {geometry.targetX === null ? null : <path className="target" d={`M${geometry.targetX} 5V17`} />}
      {geometry.ticks.map(({ x, figure }) => (
        <g key={`${x} ${figure}`}>
          <path className="tick" d={`M${x} 1V20`} data-tick={x} />
          <text x={x} y="31" textAnchor="middle">
            {figure}
          </text>
        </g>
      ))}
      {geometry.otherTicks.map((x) => (
        <path key={x} className="tick tick-other" d={`M${x} 1V20`} />
      ))}
      {geometry.reportedX === null ? null : <ReportedWedge x={geometry.reportedX} />}
      <ValueOf geometry={geometry} />
    </GaugeFrame>
  );
}

/** The drawing's frame, shared with the gauge of words. */
export function GaugeFrame({
  widthPx,
  outcome,
  text,
  children,
}: {
  widthPx: number;
  outcome: Outcome;
  text: string;
  children: React.ReactNode;
}) {
  return (
    <svg
      className={`gauge ${colourOfMark[markOfOutcome[outcome]]}`}
      viewBox={`0 0 ${widthPx} ${gaugeHeight}`}
      style={{ width: `${widthPx / 14}rem`, height: `${gaugeHeight / 14}rem` }}
      role="img"
      aria-label={text}
    >
      {children}
    </svg>
  );
}

export function Dot({ x, shape }: { x: number; shape: DotShape }) {
  if (shape === 'disc') return <circle className="dot" cx={x} cy="11" r="5" />;
  if (shape === 'square') return <rect className="dot" x={x - 5} y="6" width="10" height="10" />;
  return (
    <>
      <path className="half-outline" d={`M${x} 5L${x + 6} 11L${x} 17L${x - 6} 11Z`} />
      <path className="half-fill" d={`M${x} 5.4V16.6L${x - 5.6} 11Z`} />
    </>
  );
}

function ValueOf({ geometry: { whisker, beyond, dot } }: { geometry: GaugeGeometry }) {
  return (
    <>
      {whisker ? (
        <path
          className="whisker"
          data-from={whisker.from}
          data-to={whisker.to}
          d={`M${whisker.from} 11H${whisker.to}M${whisker.from} 7V15M${whisker.to} 7V15`}
        />
      ) : null}
      {beyond ? (
        <>
          <path className="beyond" d={`M${beyond.from} 11H${beyond.to}`} />
          <path className="whisker" d={`M${beyond.from} 7V15`} />
        </>
      ) : null}
      {dot ? <Dot x={dot.x} shape={dot.shape} /> : null}
      {dot?.pinned ? <ScaleBreak x={dot.x} side={dot.pinned} /> : null}
    </>
  );
}

function ReportedWedge({ x }: { x: number }) {
  return <path className="reported" d={`M${x - 4} 2.5L${x} 8.5L${x + 4} 2.5Z`} />;
}

/** Two strokes between the scale and a value that is off it. */
function ScaleBreak({ x, side }: { x: number; side: 'left' | 'right' }) {
  const [first, second] = side === 'right' ? [x - 13, x - 17] : [x + 10, x + 14];
  return <path className="scale-break" d={`M${first} 7l3 8M${second} 7l3 8`} />;
}
