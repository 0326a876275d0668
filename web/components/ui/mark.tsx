import type { ReactNode } from 'react';
import { colourOfMark, type MarkName, wordOfMark } from './marks';

/** Drawn on a 16 px grid, shown at 14. Beside its word it is hidden from screen readers; alone it says the word. */
export function Mark({ name, alone = false }: { name: MarkName; alone?: boolean }) {
  return (
    // biome-ignore lint/a11y/noSvgWithoutTitle: a mark either stands beside its word or carries it as its label.
    <svg
      className={`mark ${colourOfMark[name]}`}
      viewBox="0 0 16 16"
      {...(alone ? { role: 'img', 'aria-label': wordOfMark[name] } : { 'aria-hidden': true })}
      data-mark={name}
    >
      {shapes[name]}
    </svg>
  );
}

const shapes: Record<MarkName, ReactNode> = {
  pass: <path d="M2.4 8.6 6.3 12.6 13.8 3.8" fill="none" stroke="currentColor" strokeWidth="2.2" />,
  fail: (
    <path
      fillRule="evenodd"
      fill="currentColor"
      d="M1 1H15V15H1ZM4.3 5.5 6.8 8 4.3 10.5 5.5 11.7 8 9.2 10.5 11.7 11.7 10.5 9.2 8 11.7 5.5 10.5 4.3 8 6.8 5.5 4.3Z"
    />
  ),
  notshown: (
    <rect
      x="1.9"
      y="1.9"
      width="12.2"
      height="12.2"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.8"
      strokeDasharray="3.05 3.05"
      strokeDashoffset="1.52"
    />
  ),
  undecided: (
    <>
      <path d="M8 .9 15.1 8 8 15.1.9 8Z" fill="none" stroke="currentColor" strokeWidth="1.7" />
      <path d="M8 1V15L1 8Z" fill="currentColor" />
    </>
  ),
  na: <path d="M2 8H14" stroke="currentColor" strokeWidth="2.2" fill="none" />,
  borderline: (
    <>
      <path d="M8 .5V3.6M8 12.4V15.5" stroke="currentColor" strokeWidth="2" fill="none" />
      <circle cx="8" cy="8" r="4" fill="none" stroke="currentColor" strokeWidth="1.9" />
    </>
  ),
  waived: (
    <>
      <rect x="3" y=".9" width="10" height="10" fill="none" stroke="currentColor" strokeWidth="1.7" />
      <path d="M5.7 3.6 10.3 8.2M10.3 3.6 5.7 8.2" stroke="currentColor" strokeWidth="1.5" />
      <g fill="currentColor">
        <circle cx="3.6" cy="14.2" r="1.35" />
        <circle cx="8" cy="14.2" r="1.35" />
        <circle cx="12.4" cy="14.2" r="1.35" />
      </g>
    </>
  ),
};
