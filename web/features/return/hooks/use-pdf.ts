import type { PDFDocumentProxy } from 'pdfjs-dist';
import { useEffect, useState } from 'react';
import { openPdf } from '../lib/open-pdf';

/** The document of some bytes. The one before stays in sight until the next is ready. */
export function usePdf(bytes: ArrayBuffer | null): {
  document: PDFDocumentProxy | null;
  error: Error | null;
} {
  const [state, setState] = useState<{ document: PDFDocumentProxy | null; error: Error | null }>({
    document: null,
    error: null,
  });
  useEffect(() => {
    if (!bytes) return;
    let isWanted = true;
    openPdf(bytes).then(
      (document) => {
        if (isWanted) setState({ document, error: null });
        else void document.destroy();
      },
      (error: unknown) => {
        if (isWanted)
          setState({ document: null, error: error instanceof Error ? error : new Error(String(error)) });
      },
    );
    return () => {
      isWanted = false;
    };
  }, [bytes]);
  useEffect(() => {
    const { document } = state;
    return () => void document?.destroy();
  }, [state]);
  return state;
}
