import type { CSSProperties, ReactNode } from 'react';

/** The record left of the double rule, people right of it. Below 900 px the margin follows the record. */
export function MarginPage({
  children,
  aside,
  marginWidthPx,
}: {
  children: ReactNode;
  /** Right of the rule; left out where rows carry their own margin, as in the ledger. */
  aside?: ReactNode;
  /** At the default text size; 292 unless a page needs another. */
  marginWidthPx?: number;
}) {
  const style = marginWidthPx
    ? ({ '--c-notes-own': `${marginWidthPx / 14}rem` } as CSSProperties)
    : undefined;
  return (
    <main id="content" className={`page page-margin${marginWidthPx ? ' page-own-margin' : ''}`} style={style}>
      {aside === undefined ? (
        children
      ) : (
        <div className="page-split">
          <div className="min-w-0">{children}</div>
          <aside className="page-aside">{aside}</aside>
        </div>
      )}
    </main>
  );
}

/** A page without a margin. */
export function PlainPage({ children }: { children: ReactNode }) {
  return (
    <main id="content" className="page">
      {children}
    </main>
  );
}
