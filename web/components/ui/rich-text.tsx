import { Fragment } from 'react';
import { splitSymbols } from '#shared/format/symbols';

/** Plain words in which trade symbols are set as such: italic with a roman subscript. */
export function RichText({ children }: { children: string }) {
  return (
    <>
      {splitSymbols(children).map((part, index) =>
        part.kind === 'text' ? (
          // biome-ignore lint/suspicious/noArrayIndexKey: the parts of one unchanging text.
          <Fragment key={index}>{part.text}</Fragment>
        ) : (
          // biome-ignore lint/suspicious/noArrayIndexKey: the parts of one unchanging text.
          <Fragment key={index}>
            <var>{part.base}</var>
            {part.sub ? <sub>{part.sub}</sub> : null}
          </Fragment>
        ),
      )}
    </>
  );
}
