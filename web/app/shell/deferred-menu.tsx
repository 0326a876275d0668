import { type ComponentType, lazy, type ReactNode, Suspense, useMemo, useState } from 'react';

/**
 * A menu's button, whose menu is fetched when a reader turns to it: menus are a third of what a first page would
 * otherwise have to load.
 */
export function DeferredMenu<Props extends object>({
  text,
  className,
  load,
  props,
}: {
  text: ReactNode;
  className: string;
  load: () => Promise<{ default: ComponentType<Props> }>;
  props: Props;
}) {
  const [isWanted, setWanted] = useState(false);
  // biome-ignore lint/correctness/useExhaustiveDependencies: a lazy component must stay the same for the life of its button.
  const Loaded = useMemo(() => lazy(load), []);
  const button = (
    <button
      type="button"
      className={className}
      aria-haspopup="menu"
      aria-expanded={false}
      onPointerEnter={() => void load()}
      onFocus={() => void load()}
      onClick={() => setWanted(true)}
      onKeyDown={(event) => {
        if (event.key !== 'ArrowDown') return;
        event.preventDefault();
        setWanted(true);
      }}
    >
      {text}
    </button>
  );
  if (!isWanted) return button;
  return (
    <Suspense fallback={button}>
      <Loaded {...props} />
    </Suspense>
  );
}
