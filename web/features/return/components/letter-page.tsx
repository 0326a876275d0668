import type { PDFDocumentProxy, PDFPageProxy, RenderTask } from 'pdfjs-dist';
import { useEffect, useRef, useState } from 'react';

const sheetWidthPx = 562;

/** One page as the renderer draws it, with its text beside it for those who do not see it. */
export function LetterPage({ document, page }: { document: PDFDocumentProxy; page: number }) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const [text, setText] = useState('');
  useEffect(() => {
    let isWanted = true;
    let task: RenderTask | null = null;
    const show = async () => {
      const drawn = await document.getPage(page);
      if (!isWanted || !canvas.current) return;
      task = draw(drawn, canvas.current);
      await task.promise;
      const found = await textOf(drawn);
      if (isWanted) setText(found);
    };
    // A page that is left while it is drawn ends its drawing; the next one tells of any real failure.
    show().catch(() => undefined);
    return () => {
      isWanted = false;
      task?.cancel();
    };
  }, [document, page]);
  return (
    <div className="letter-sheet">
      <canvas ref={canvas} role="img" aria-label={`Page ${page} of the letter`} />
      <p className="hidden-text">{text}</p>
    </div>
  );
}

function draw(page: PDFPageProxy, canvas: HTMLCanvasElement): RenderTask {
  const density = Math.max(window.devicePixelRatio || 1, 1);
  const atOne = page.getViewport({ scale: 1 });
  const viewport = page.getViewport({ scale: (sheetWidthPx / atOne.width) * density });
  canvas.width = Math.round(viewport.width);
  canvas.height = Math.round(viewport.height);
  return page.render({ canvas, viewport });
}

async function textOf(page: PDFPageProxy): Promise<string> {
  const { items } = await page.getTextContent();
  return items.map((item) => ('str' in item ? item.str : '')).join(' ');
}
