import { createContext, type ReactNode, useContext, useEffect, useRef, useState } from 'react';
import { createPortal } from 'react-dom';
import { usePrintText } from '../../lib/print-frame';
import { useRegisteredShortcuts } from '../../lib/shortcuts';
import { Kbd } from './kbd';

/** The place under every page where the shell keeps its foot. */
export const FootPlace = createContext<HTMLElement | null>(null);

/**
 * What the page has to say in its foot: seal or draft, then cautions; its keys; on phones its first two acts. Where
 * the foot has no room for its words they close the page.
 */
export function RunningFoot({ texts, acts }: { texts: readonly ReactNode[]; acts?: ReactNode }) {
  const place = useContext(FootPlace);
  const keys = useRegisteredShortcuts().filter((shortcut) => shortcut.foot);
  const words = usePrintedFoot();
  if (!place) return null;
  const foot = createPortal(
    <div className={`running-foot${acts ? ' has-acts' : ''}`}>
      <span className="foot-texts" ref={words}>
        {texts.map((text, index) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: at most three fixed lines.
          <span key={index} className="foot-text">
            {text}
          </span>
        ))}
      </span>
      {acts ? <span className="foot-acts">{acts}</span> : null}
      <span className="foot-keys">
        {keys.map((shortcut) => (
          <span key={`${shortcut.key}${shortcut.label}`}>
            <Kbd>{keyName(shortcut.key, shortcut.ctrl)}</Kbd>
            {shortcut.label}
          </span>
        ))}
      </span>
    </div>,
    place,
  );
  return (
    <>
      <CautionsInPage texts={texts} />
      {foot}
    </>
  );
}

function CautionsInPage({ texts }: { texts: readonly ReactNode[] }) {
  return (
    <div className="page-cautions">
      {texts.map((text, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: at most three fixed lines.
        <p key={index}>{text}</p>
      ))}
    </div>
  );
}

/** Printed pages carry the same words in their margins, as text. */
function usePrintedFoot() {
  const words = useRef<HTMLSpanElement>(null);
  const [text, setText] = useState('');
  usePrintText('foot', text);
  // The words are nodes, known as text only once they are drawn, so every drawing asks.
  useEffect(() => {
    const lines = [...(words.current?.children ?? [])].map((line) => line.textContent ?? '');
    setText(lines.join('\n'));
  });
  return words;
}

export function keyName(key: string, ctrl = false): string {
  const name = key === 'Escape' ? 'Esc' : key.length === 1 ? key.toUpperCase() : key;
  return ctrl ? `Ctrl ${name}` : name;
}
