import type { PDFDocumentProxy } from 'pdfjs-dist';

/** The renderer is large and only this page needs it, so it is loaded when it is needed; its worker is our own file. */
export async function openPdf(bytes: ArrayBuffer): Promise<PDFDocumentProxy> {
  const [pdf, worker] = await Promise.all([
    import('pdfjs-dist'),
    import('pdfjs-dist/build/pdf.worker.min.mjs?url'),
  ]);
  pdf.GlobalWorkerOptions.workerSrc = worker.default;
  // The bytes are handed to the worker, so it gets a copy and the cached ones stay whole.
  return pdf.getDocument({ data: bytes.slice(0), isEvalSupported: false, useWasm: false }).promise;
}
