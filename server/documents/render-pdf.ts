import type { TDocumentDefinitions } from 'pdfmake/interfaces';
import { pdfFontFiles, pdfFonts } from './pdf-fonts';

/** Renders once; the bytes are what is kept, because a PDF carries the time and an id of its making. */
export async function renderPdf(definition: TDocumentDefinitions): Promise<Buffer> {
  const pdfmake = await loadLibrary();
  return pdfmake.createPdf(definition).getBuffer();
}

/** Large, and needed by few requests: loaded by the first of them. */
async function loadLibrary() {
  const { default: pdfmake } = await import('pdfmake');
  // Documents are made of text and drawings of ours alone: nothing is fetched, and no file but the fonts is opened.
  pdfmake.setUrlAccessPolicy(() => false);
  pdfmake.setLocalAccessPolicy((path: string) => pdfFontFiles.has(path));
  pdfmake.setFonts(pdfFonts);
  return pdfmake;
}
