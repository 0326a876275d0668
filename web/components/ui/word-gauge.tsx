import type { Outcome } from '#rules/engine/finding';
import { Dot, GaugeFrame } from './gauge';

const mostWords = 4;

/** Allowed words under small dots in the lane; the observed one bold under its own mark, outside where not allowed. */
export function WordGauge({
  allowed,
  observed,
  outcome,
  text,
  widthPx,
}: {
  allowed: readonly string[];
  observed: string | null;
  outcome: Outcome;
  text: string;
  widthPx: number;
}) {
  const isAllowed = observed !== null && allowed.some((word) => same(word, observed));
  const outside = observed !== null && !isAllowed;
  const places = placesOf(allowed, outside, widthPx);
  return (
    <GaugeFrame widthPx={widthPx} outcome={outcome} text={text}>
      <path className="base" d={`M0 11H${widthPx}`} />
      <rect className="lane" x={places.lane.x} y="5" width={places.lane.width} height="12" />
      {places.words.map(({ word, x }) => {
        const isObserved = observed !== null && same(word, observed);
        return (
          <g key={word}>
            {isObserved ? (
              <Dot x={x} shape={outcome === 'undecided' ? 'half diamond' : 'disc'} />
            ) : (
              <circle className="allowed-word" cx={x} cy="11" r="2.5" />
            )}
            <text x={x} y="31" textAnchor="middle" className={isObserved ? 'observed-word' : undefined}>
              {word}
            </text>
          </g>
        );
      })}
      {places.count ? (
        <text x={places.count.x} y="31" textAnchor="middle">
          {places.count.text}
        </text>
      ) : null}
      {isAllowed && places.count ? (
        <>
          <Dot x={places.count.x} shape={outcome === 'undecided' ? 'half diamond' : 'disc'} />
        </>
      ) : null}
      {outside ? (
        <>
          <Dot x={places.outsideX} shape={outcome === 'undecided' ? 'half diamond' : 'square'} />
          <text x={places.outsideX} y="31" textAnchor="middle" className="observed-word">
            {observed}
          </text>
        </>
      ) : null}
    </GaugeFrame>
  );
}

/** Too many words to stand side by side are counted: "one of 6". */
function placesOf(allowed: readonly string[], outside: boolean, widthPx: number) {
  const end = outside ? 0.68 * widthPx : widthPx;
  const most = outside ? mostWords - 2 : mostWords;
  const outsideX = 0.86 * widthPx;
  if (allowed.length > most) {
    const lane = { x: 0.14 * end, width: 0.72 * end };
    return { lane, words: [], count: { x: end / 2, text: `one of ${allowed.length}` }, outsideX };
  }
  const wide = allowed.length === mostWords;
  const first = (wide ? 0.125 : 0.25) * end;
  const step = allowed.length > 1 ? ((wide ? 0.75 : 0.5) * end) / (allowed.length - 1) : 0;
  const words = allowed.map((word, index) => ({
    word,
    x: allowed.length === 1 ? end / 2 : first + index * step,
  }));
  const pad = wide ? 0 : 0.144 * end;
  return { lane: { x: pad, width: end - 2 * pad }, words, count: null, outsideX };
}

function same(one: string, other: string): boolean {
  const normal = (word: string) => word.toLowerCase().replace(/[\s-]+/g, '');
  return normal(one) === normal(other);
}
