import { type ReactNode, useEffect, useRef, useState } from 'react';

/** A frame that scrolls what is wider than the page; where it does, the keyboard can reach and scroll it too. */
export function Sideways({
  label,
  className,
  children,
}: {
  /** Names the frame where it scrolls. */
  label: string;
  className?: string;
  children: ReactNode;
}) {
  const frame = useRef<HTMLDivElement>(null);
  const [scrolls, setScrolls] = useState(false);
  useEffect(() => {
    const element = frame.current;
    if (element === null) return;
    const observer = new ResizeObserver(() => setScrolls(element.scrollWidth > element.clientWidth));
    observer.observe(element);
    if (element.firstElementChild) observer.observe(element.firstElementChild);
    return () => observer.disconnect();
  }, []);
  return (
    <div
      ref={frame}
      className={className ? `sideways ${className}` : 'sideways'}
      {...(scrolls ? { tabIndex: 0, role: 'region', 'aria-label': label } : {})}
    >
      {children}
    </div>
  );
}
