import { useNavigate } from 'react-router-dom';
import type { CreepCurveView, CreepFitView } from '#shared/contracts/creep';
import { formatPlain, groupThousands } from '#shared/format/numbers';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useMediaQuery } from '../../../lib/use-media-query';
import { type CreepGeometry, creepGeometry } from '../lib/creep-geometry';
import { DrawnSymbol } from './drawn-symbol';
import { LimitFlag } from './limit-flag';
import { FittedCurve, LogFrame } from './log-frame';
import { SpecimenShape } from './specimen-shape';

const wide = { widthPx: 1040, heightPx: 620 };
const narrow = { widthPx: 358, heightPx: 420 };

/** Compliance against loading time, both logarithmic: what was tested, the curve with its band, the limits as flags. */
export function CreepChart({
  curve,
  fit,
  showBand,
  params,
}: {
  curve: CreepCurveView;
  fit: CreepFitView | null;
  showBand: boolean;
  params: RevisionParams;
}) {
  const size = useMediaQuery('screen and (max-width: 759px)') ? narrow : wide;
  const { points, findings, specimens } = curve;
  const geometry = creepGeometry({ points, fit, findings, size });
  return (
    <figure className="creep-figure">
      {/* biome-ignore lint/a11y/useSemanticElements: a drawing whose points are links is a group, and SVG has no other word for it. */}
      <svg
        className="chart creep-chart"
        viewBox={`0 0 ${size.widthPx} ${size.heightPx}`}
        role="group"
        aria-label="Creep compliance by loading time on logarithmic axes; the same as a table below"
      >
        <LogFrame geometry={geometry} timeLabel="loading time, s" />
        <FittedCurve geometry={geometry} showBand={showBand} />
        <Asymptotes geometry={geometry} />
        <Brackets geometry={geometry} points={points} />
        {points.map((point) => (
          <Point
            key={`${point.specimen} ${point.time} ${point.stress} ${point.value}`}
            point={point}
            index={Math.max(0, specimens.indexOf(point.specimen ?? ''))}
            geometry={geometry}
            params={params}
          />
        ))}
        {geometry.flags.map((flag) => (
          <LimitFlag key={flag.key} flag={flag} bottom={geometry.frame.bottom} />
        ))}
      </svg>
      <figcaption className="creep-legend">
        {specimens.map((specimen, index) => (
          <span key={specimen}>
            <svg className="creep-key" viewBox="0 0 14 14" aria-hidden="true">
              <SpecimenShape index={index} x={7} y={7} />
            </svg>
            specimen {specimen}
          </span>
        ))}
      </figcaption>
    </figure>
  );
}

/** What the curve tends to, and whether any tested point holds it. */
function Asymptotes({ geometry: { asymptotes, frame } }: { geometry: CreepGeometry }) {
  return asymptotes.map(({ symbol, y, value, low, high, held }) => {
    const interval =
      low === null || high === null ? '' : ` (${formatPlain(low, 2)} to ${formatPlain(high, 2)})`;
    const words = held
      ? symbol === 'D0'
        ? ', glassy'
        : ', long-term'
      : `, held by no tested point${interval}`;
    return (
      <g key={symbol}>
        <path className="asymptote" d={`M${frame.left} ${y}H${frame.right}`} />
        <text x={frame.right - 4} y={symbol === 'D0' ? y + 15 : y - 6} textAnchor="end">
          <DrawnSymbol>{symbol}</DrawnSymbol>
          {formatPlain(value, 3)}
          {words}
        </text>
      </g>
    );
  });
}

function Brackets({ geometry, points }: { geometry: CreepGeometry; points: CreepCurveView['points'] }) {
  const { tested, beyond, frame } = geometry;
  const times = points.map(({ time }) => time);
  const y = frame.top - 12;
  // A label wider than its bracket begins with it, so that the two labels never touch.
  const isShort = beyond !== null && beyond.to - beyond.from < 120;
  const span = `${seconds(Math.min(...times))} to ${seconds(Math.max(...times))} s`;
  return (
    <>
      <path className="bracket" d={`M${tested.from} ${frame.top - 2}V${y}H${tested.to}V${frame.top - 2}`} />
      <text className="bracket-label" x={(tested.from + tested.to) / 2} y={y - 6} textAnchor="middle">
        tested, {span}
      </text>
      {beyond === null ? null : (
        <>
          <path className="bracket bracket-beyond" d={`M${beyond.from} ${y}H${beyond.to}V${frame.top - 2}`} />
          <text
            className="bracket-label bracket-label-beyond"
            x={isShort ? beyond.from + 6 : (beyond.from + beyond.to) / 2}
            y={y - 6}
            textAnchor={isShort ? 'start' : 'middle'}
          >
            {beyond.decades.toFixed(1)} {beyond.decades.toFixed(1) === '1.0' ? 'decade' : 'decades'} beyond
          </text>
        </>
      )}
    </>
  );
}

/** A point opens to its cell in the sheet. */
function Point({
  point,
  index,
  geometry,
  params,
}: {
  point: CreepCurveView['points'][number];
  index: number;
  geometry: CreepGeometry;
  params: RevisionParams;
}) {
  const navigate = useNavigate();
  const { source, time, value, specimen, stress } = point;
  const of = specimen === null ? '' : `specimen ${specimen}, `;
  const under = stress === null ? '' : ` under ${formatPlain(stress)} kPa`;
  const said = `${of}${seconds(time)} s${under}: ${formatPlain(value, 3)} 1/GPa`;
  const open =
    source === null
      ? undefined
      : () =>
          void navigate(
            paths.reading(params.submittalId, params.number, { sheet: source.sheet, cell: source.cell }),
          );
  const [x, y] = [geometry.x(time), geometry.y(value)];
  return (
    // biome-ignore lint/a11y/useSemanticElements: a link inside a drawing; an SVG anchor would reload the page.
    <g
      className="point"
      role="link"
      tabIndex={0}
      aria-label={open ? `${said}. Open its cell.` : said}
      aria-disabled={open === undefined || undefined}
      onClick={open}
      onKeyDown={(event) => {
        if (event.key === 'Enter') open?.();
      }}
    >
      <title>{said}</title>
      <circle className="hit-area" cx={x} cy={y} r="12" />
      <SpecimenShape index={index} x={x} y={y} />
    </g>
  );
}

function seconds(time: number): string {
  return groupThousands(formatPlain(time));
}
