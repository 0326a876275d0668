import type { ReactNode } from 'react';

/** What would be here, and the next useful act: one sentence and one link. */
export function EmptyState({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div className="state">
      <b>{title}</b>
      {children ? <p className="mute">{children}</p> : null}
    </div>
  );
}
