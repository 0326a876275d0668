import { useNavigate } from 'react-router-dom';
import type { GradationPoint } from '#shared/contracts/checks';
import { formatFixed, formatPlain } from '#shared/format/numbers';
import { formatSieve } from '#shared/format/units';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useMediaQuery } from '../../../lib/use-media-query';
import { type GradationGeometry, gradationGeometry, type PlacedPoint } from '../lib/gradation-geometry';

const wide = { widthPx: 960, heightPx: 560 };
const narrow = { widthPx: 358, heightPx: 380 };

/** Passing against opening^0.45; control points as lanes, the densest line dash-dot, what fails a square. */
export function GradationChart({
  points,
  maximumSizeMm,
  params,
}: {
  points: readonly GradationPoint[];
  maximumSizeMm: number | null;
  params: RevisionParams;
}) {
  const size = useMediaQuery('screen and (max-width: 759px)') ? narrow : wide;
  const geometry = gradationGeometry(points, maximumSizeMm, size);
  return (
    <figure>
      {/* biome-ignore lint/a11y/useSemanticElements: a drawing whose points are links is a group, and SVG has no other word for it. */}
      <svg
        className="chart"
        viewBox={`0 0 ${size.widthPx} ${size.heightPx}`}
        role="group"
        aria-label="Percent passing by sieve opening to the power 0.45; the same as a table below"
      >
        <Frame geometry={geometry} sieveNames={points} />
        <Controls geometry={geometry} />
        <path className="blend" d={geometry.blend} />
        {geometry.points.map((placed) => (
          <Point key={placed.point.sieve} placed={placed} params={params} />
        ))}
        <text x={geometry.frame.right} y={size.heightPx - 4} textAnchor="end">
          sieve opening, mm, to the power 0.45
        </text>
        <text x={geometry.frame.left + 10} y={geometry.frame.top + 20}>
          passing, %
        </text>
      </svg>
    </figure>
  );
}

function Frame({
  geometry: { frame, percents, sieves, maximumDensity },
  sieveNames,
}: {
  geometry: GradationGeometry;
  sieveNames: readonly GradationPoint[];
}) {
  const names = new Map(sieveNames.map((point) => [point.sieve, point.usName]));
  return (
    <>
      {percents.map(({ percent, y, isLabelled }) => (
        <g key={percent}>
          <path className="grid-line" d={`M${frame.left} ${y}H${frame.right}`} />
          {isLabelled ? (
            <text x={frame.left - 7} y={y + 4} textAnchor="end">
              {percent}
            </text>
          ) : null}
        </g>
      ))}
      {sieves.map(({ sieve, x, label }) => (
        <g key={sieve}>
          <title>{names.get(sieve) ?? formatSieve(sieve)}</title>
          <path className="grid-line" d={`M${x} ${frame.top}V${frame.bottom}`} />
          <path className="axis" d={`M${x} ${frame.bottom}v5`} />
          {label === null ? null : (
            <text x={x} y={frame.bottom + 18} textAnchor="middle">
              {label}
            </text>
          )}
        </g>
      ))}
      {maximumDensity ? (
        <>
          <path
            className="maximum-density"
            d={`M${maximumDensity.x1} ${maximumDensity.y1}L${maximumDensity.x2} ${maximumDensity.y2}`}
          />
          <text
            x={(maximumDensity.x1 + maximumDensity.x2) / 2 + 16}
            y={(maximumDensity.y1 + maximumDensity.y2) / 2 + 16}
          >
            maximum density
          </text>
        </>
      ) : null}
      <path className="axis" d={`M${frame.left} ${frame.top}V${frame.bottom}H${frame.right}`} />
    </>
  );
}

function Controls({ geometry: { controls } }: { geometry: GradationGeometry }) {
  return controls.map(({ x, from, to, ticks }) => (
    <g key={x}>
      <rect className="lane" x={x - 5} y={from} width="10" height={Math.max(0, to - from)} />
      {ticks.map(({ y, label, labelX, labelY, anchor }) => (
        <g key={y}>
          <path className="limit-tick" d={`M${x - 9} ${y}h18`} />
          <text className="direct-label" x={labelX} y={labelY} textAnchor={anchor}>
            {label}
          </text>
        </g>
      ))}
    </g>
  ));
}

/** A point opens to its cell in the sheet. */
function Point({ placed: { point, x, y, fails }, params }: { placed: PlacedPoint; params: RevisionParams }) {
  const navigate = useNavigate();
  const { sheet, cell } = point;
  const said = `${formatSieve(point.sieve)}: ${formatPlain(point.passing)} % passing${limitsOf(point)}${
    point.outcome ? `, ${point.outcome}` : ''
  }`;
  const open =
    sheet === null || cell === null
      ? undefined
      : () => void navigate(paths.reading(params.submittalId, params.number, { sheet, cell }));
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
      {fails ? (
        <>
          <rect className="fail-square" x={x - 5} y={y - 5} width="10" height="10" />
          <text className="fail-label" x={x - 10} y={y - 8} textAnchor="end">
            {formatFixed(point.passing, 1)}
          </text>
        </>
      ) : (
        <circle className="open-dot" cx={x} cy={y} r="4" />
      )}
    </g>
  );
}

export function limitsOf({ min, max }: Pick<GradationPoint, 'min' | 'max'>): string {
  if (min !== null && max !== null) return `, ${formatPlain(min)} to ${formatPlain(max)} allowed`;
  if (min !== null) return `, at least ${formatPlain(min)}`;
  return max === null ? '' : `, at most ${formatPlain(max)}`;
}
