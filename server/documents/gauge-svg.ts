import type { Finding } from '#rules/engine/finding';
import { type GaugeGeometry, gaugeGeometry } from '#shared/gauge';
import { outcomeColours, printColours } from './print-colours';

/** The gauge of the screen, drawn for paper at its own width. Null where there is none to draw. */
export function gaugeSvg(finding: Finding, widthPoints = 110): string | null {
  const geometry = gaugeGeometry(finding, widthPoints);
  if (geometry === null) return null;
  const colour = outcomeColours[finding.outcome];
  const parts = [
    geometry.lane === null
      ? ''
      : `<rect x="${at(geometry.lane.x)}" y="4" width="${at(geometry.lane.width)}" height="13" fill="${printColours.lane}"/>`,
    line(`M0 11H${at(widthPoints)}`, printColours.rule2, 1),
    ...geometry.decades.map(({ x, long }) =>
      line(`M${at(x)} ${long ? '8V14' : '9.5V12.5'}`, printColours.rule2, 1),
    ),
    geometry.middle === null ? '' : line(`M${at(geometry.middle)} 5V17`, printColours.ink3, 1),
    ...geometry.ticks.flatMap(({ x, text }) => [
      line(`M${at(x)} 1V20`, printColours.ink, 1.5),
      label(x, text, false),
    ]),
    ...geometry.words.flatMap(({ x, text, observed }) => [
      observed ? '' : `<circle cx="${at(x)}" cy="11" r="2.5" fill="${printColours.ink3}"/>`,
      label(x, text, observed),
    ]),
    geometry.reported === null
      ? ''
      : `<path d="M${at(geometry.reported - 4)} 2.5L${at(geometry.reported)} 8.5L${at(geometry.reported + 4)} 2.5Z" fill="none" stroke="${printColours.ink2}" stroke-width="1.25"/>`,
    whisker(geometry, colour),
    dot(geometry, colour),
  ];
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${at(widthPoints)} 34" width="${at(widthPoints)}" height="34">${parts.join('')}</svg>`;
}

function whisker({ whisker: span }: GaugeGeometry, colour: string): string {
  if (span === null) return '';
  return line(`M${at(span.from)} 11H${at(span.to)}M${at(span.from)} 7V15M${at(span.to)} 7V15`, colour, 1.25);
}

function dot({ dot: place }: GaugeGeometry, colour: string): string {
  if (place === null) return '';
  const { x } = place;
  const halo = `stroke="${printColours.paper}" stroke-width="1.5"`;
  const shape = {
    disc: `<circle cx="${at(x)}" cy="11" r="5" fill="${colour}" ${halo}/>`,
    square: `<rect x="${at(x - 5)}" y="6" width="10" height="10" fill="${colour}" ${halo}/>`,
    diamond: `<path d="M${at(x)} 5L${at(x + 6)} 11L${at(x)} 17L${at(x - 6)} 11Z" fill="${printColours.paper}" stroke="${colour}" stroke-width="1.6"/><path d="M${at(x)} 5.4V16.6L${at(x - 5.6)} 11Z" fill="${colour}"/>`,
  }[place.shape];
  if (place.offScale === null) return shape;
  const side = place.offScale === 'right' ? x - 13 : x + 10;
  return `${shape}${line(`M${at(side)} 7l3 8M${at(side - 4)} 7l3 8`, printColours.ink, 1)}`;
}

function line(d: string, colour: string, width: number): string {
  return `<path d="${d}" stroke="${colour}" stroke-width="${width}" fill="none"/>`;
}

function label(x: number, text: string, strong: boolean): string {
  const colour = strong ? printColours.ink : printColours.ink2;
  return `<text x="${at(x)}" y="29" font-size="7.5" text-anchor="middle" font-family="NotoSans"${strong ? ' font-weight="bold"' : ''} fill="${colour}">${escapeXml(text)}</text>`;
}

function escapeXml(text: string): string {
  return text.replace(/[&<>"]/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

function at(position: number): string {
  return String(Math.round(position * 100) / 100);
}
