import { Children, type ReactNode } from 'react';
import { RichText } from './rich-text';

/** Two pencils: ink is sent, graphite stays. The byline always ends in the word for which it is. */
export function Note({
  text,
  by,
  on,
  state,
  children,
}: {
  text: string;
  by: string;
  /** "12 Mar" */
  on: string;
  /** `internal`, `to be returned`, `reply`, or what else ends the byline. */
  state: string;
  children?: ReactNode;
}) {
  return (
    <div className={state.endsWith('internal') ? 'note note-internal' : 'note'}>
      <RichText>{text}</RichText>
      <span className="note-byline">
        {by}, {on}, {state}
      </span>
      {hasActs(children) ? <span className="note-acts">{children}</span> : null}
    </div>
  );
}

function hasActs(children: ReactNode): boolean {
  return Children.toArray(children).length > 0;
}
