import { useEffect } from 'react';
import { usePrintText } from './print-frame';

/** Names the page in the browser's tab and history, and for a screen reader on arrival. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = title === '' ? 'Clauseway' : `${title} · Clauseway`;
  }, [title]);
  usePrintText('title', title);
}
