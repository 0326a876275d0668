import type { ReactNode } from 'react';

/** The work left, what it will look like right. */
export function TwoHalves({ work, sight }: { work: ReactNode; sight: ReactNode }) {
  return (
    <main id="content" className="page">
      <div className="halves">
        <div className="half-work">{work}</div>
        <aside className="half-sight">{sight}</aside>
      </div>
    </main>
  );
}
