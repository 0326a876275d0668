import type { Finding } from '#rules/engine/finding';
import { gaugeText } from '#shared/format/margin';
import { type GaugeGeometry, gaugeGeometry } from '#shared/gauge';
import { colourOfMark, markOfOutcome } from './marks';

const heightPx = 34;

/**
 * The limit gauge of a finding: base line, lane of what is allowed, ticks at the limits, the judged value and its
 * precision. Nothing where a finding has none. Widths are drawn, never scaled: 208, 150, 132.
 */
export function Gauge({
  finding,
  widthPx = 208,
  otherLimits,
}: {
  finding: Finding;
  widthPx?: 208 | 150 | 132;
  /** The limits of another edition, as dotted ticks. */
  otherLimits?: readonly number[];
}) {
  const geometry = gaugeGeometry(finding, widthPx, otherLimits);
  if (!geometry) return null;
  return (
    <svg
      className={`gauge ${colourOfMark[markOfOutcome[finding.outcome]]}`}
      viewBox={`0 0 ${widthPx} ${heightPx}`}
      style={{ width: `${widthPx / 14}rem`, height: `${heightPx / 14}rem` }}
      role="img"
      aria-label={gaugeText(finding)}
    >
      <Scale geometry={geometry} />
      <Words geometry={geometry} />
      <Value geometry={geometry} />
    </svg>
  );
}

function Scale({ geometry: { width, lane, decades, middle, ticks, otherTicks, reported } }: Part) {
  return (
    <>
      {lane ? <rect className="lane" x={at(lane.x)} y="4" width={at(lane.width)} height="13" /> : null}
      <path className="base" d={`M0 11H${width}`} />
      {decades.map(({ x, long }) => (
        <path key={x} className="decade" d={`M${at(x)} ${long ? '8V14' : '9.5V12.5'}`} />
      ))}
      {middle === null ? null : <path className="target" d={`M${at(middle)} 5V17`} />}
      {ticks.map(({ x, text }) => (
        <g key={`${x} ${text}`}>
          <path className="tick" d={`M${at(x)} 1V20`} />
          <text x={at(x)} y="31" textAnchor="middle">
            {text}
          </text>
        </g>
      ))}
      {otherTicks.map((x) => (
        <path key={x} className="tick tick-other" d={`M${at(x)} 1V20`} />
      ))}
      {reported === null ? null : (
        <path
          className="reported"
          d={`M${at(reported - 4)} 2.5L${at(reported)} 8.5L${at(reported + 4)} 2.5Z`}
        />
      )}
    </>
  );
}

function Words({ geometry: { words } }: Part) {
  return words.map(({ x, text, observed }) => (
    <g key={text}>
      {observed ? null : <circle className="allowed-word" cx={at(x)} cy="11" r="2.5" />}
      <text x={at(x)} y="31" textAnchor="middle" className={observed ? 'observed-word' : undefined}>
        {text}
      </text>
    </g>
  ));
}

function Value({ geometry: { whisker, beyond, dot } }: Part) {
  return (
    <>
      {whisker ? (
        <path
          className="whisker"
          d={`M${at(whisker.from)} 11H${at(whisker.to)}M${at(whisker.from)} 7V15M${at(whisker.to)} 7V15`}
        />
      ) : null}
      {beyond ? (
        <>
          <path className="beyond" d={`M${at(beyond.from)} 11H${at(beyond.to)}`} />
          <path className="whisker" d={`M${at(beyond.from)} 7V15`} />
        </>
      ) : null}
      {dot ? <Dot x={dot.x} shape={dot.shape} /> : null}
      {dot?.offScale ? <ScaleBreak x={dot.x} side={dot.offScale} /> : null}
    </>
  );
}

function Dot({ x, shape }: { x: number; shape: NonNullable<GaugeGeometry['dot']>['shape'] }) {
  if (shape === 'disc') return <circle className="dot" cx={at(x)} cy="11" r="5" />;
  if (shape === 'square') return <rect className="dot" x={at(x - 5)} y="6" width="10" height="10" />;
  return (
    <>
      <path className="half-outline" d={`M${at(x)} 5L${at(x + 6)} 11L${at(x)} 17L${at(x - 6)} 11Z`} />
      <path className="half-fill" d={`M${at(x)} 5.4V16.6L${at(x - 5.6)} 11Z`} />
    </>
  );
}

/** Two strokes between the scale and a value that is off it. */
function ScaleBreak({ x, side }: { x: number; side: 'left' | 'right' }) {
  const [first, second] = side === 'right' ? [x - 13, x - 17] : [x + 10, x + 14];
  return <path className="scale-break" d={`M${at(first)} 7l3 8M${at(second)} 7l3 8`} />;
}

interface Part {
  geometry: GaugeGeometry;
}

/** To a tenth of a pixel, so that a whisker that reaches the limit by its numbers reaches the tick as drawn. */
function at(position: number): number {
  return Math.round(position * 10) / 10;
}
