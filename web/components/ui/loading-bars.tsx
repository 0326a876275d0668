import { useEffect, useState } from 'react';

const widths = ['86%', '64%', '72%', '58%', '81%', '69%'];
const longMilliseconds = 10_000;

/** Rows as flat bars at real row height; nothing pulses. Says what takes long once it does. */
export function LoadingBars({
  what,
  rows = 3,
  whenLong,
}: {
  what: string;
  rows?: number;
  whenLong?: string;
}) {
  const long = useAfter(longMilliseconds);
  return (
    <div className="state" role="status">
      <b>{what}</b>
      {long && whenLong ? <p className="mute">{whenLong}</p> : null}
      {Array.from({ length: rows }, (_, row) => (
        <span
          // biome-ignore lint/suspicious/noArrayIndexKey: bars have no identity.
          key={row}
          className="bar-lane"
          style={{ width: widths[row % widths.length] }}
          aria-hidden="true"
        />
      ))}
    </div>
  );
}

function useAfter(milliseconds: number): boolean {
  const [passed, setPassed] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setPassed(true), milliseconds);
    return () => clearTimeout(timer);
  }, [milliseconds]);
  return passed;
}
