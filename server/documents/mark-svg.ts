import type { Outcome } from '#rules/engine/finding';
import { outcomeColours } from './print-colours';

const shapes: Record<Outcome | 'waived', (colour: string) => string> = {
  pass: (c) => `<path d="M2.4 8.6 6.3 12.6 13.8 3.8" fill="none" stroke="${c}" stroke-width="2.2"/>`,
  fail: (c) =>
    `<path fill-rule="evenodd" d="M1 1H15V15H1ZM4.3 5.5 6.8 8 4.3 10.5 5.5 11.7 8 9.2 10.5 11.7 11.7 10.5 9.2 8 11.7 5.5 10.5 4.3 8 6.8 5.5 4.3Z" fill="${c}"/>`,
  'not shown': (c) =>
    `<rect x="1.9" y="1.9" width="12.2" height="12.2" fill="none" stroke="${c}" stroke-width="1.8" stroke-dasharray="3.05 3.05" stroke-dashoffset="1.52"/>`,
  undecided: (c) =>
    `<path d="M8 .9 15.1 8 8 15.1.9 8Z" fill="none" stroke="${c}" stroke-width="1.7"/><path d="M8 1V15L1 8Z" fill="${c}"/>`,
  'not applicable': (c) => `<path d="M2 8H14" stroke="${c}" stroke-width="2.2" fill="none"/>`,
  waived: (c) =>
    `<rect x="3" y=".9" width="10" height="10" fill="none" stroke="${c}" stroke-width="1.7"/><path d="M5.7 3.6 10.3 8.2M10.3 3.6 5.7 8.2" stroke="${c}" stroke-width="1.5"/><circle cx="3.6" cy="14.2" r="1.35" fill="${c}"/><circle cx="8" cy="14.2" r="1.35" fill="${c}"/><circle cx="12.4" cy="14.2" r="1.35" fill="${c}"/>`,
};

/** The outcome's mark as on screen. Waived keeps fail's colour: the outcome does not change. */
export function markSvg(outcome: Outcome, waived = false): string {
  const shape = waived && outcome === 'fail' ? shapes.waived : shapes[outcome];
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 16 16" width="9" height="9">${shape(outcomeColours[outcome])}</svg>`;
}
