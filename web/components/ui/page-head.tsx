import type { ReactNode } from 'react';

/** One title a page: what it is in ink, what it is about in ink-2 behind it. */
export function PageHead({
  kicker,
  kickerOnPhones = true,
  title,
  rest,
  lede,
  children,
}: {
  kicker?: ReactNode;
  /** False where a narrow page can do without it. */
  kickerOnPhones?: boolean;
  title: ReactNode;
  rest?: ReactNode;
  lede?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <div className="page-head">
      {kicker ? <p className={`kicker${kickerOnPhones ? '' : ' kicker-optional'}`}>{kicker}</p> : null}
      <h1>
        {title}
        {rest ? <span> {rest}</span> : null}
      </h1>
      {lede ? <p className="lede">{lede}</p> : null}
      {children}
    </div>
  );
}
