import pdfmake from 'pdfmake';
import type { TDocumentDefinitions } from 'pdfmake/interfaces';
import { pdfFontFiles, pdfFonts } from './pdf-fonts';

// Documents are made of text and drawings of ours alone: nothing is fetched, and no file but the fonts is opened.
pdfmake.setUrlAccessPolicy(() => false);
pdfmake.setLocalAccessPolicy((path: string) => pdfFontFiles.has(path));

/** Renders once; the bytes are what is kept, because a PDF carries the time and an id of its making. */
export async function renderPdf(definition: TDocumentDefinitions): Promise<Buffer> {
  pdfmake.setFonts(pdfFonts);
  return pdfmake.createPdf(definition).getBuffer();
}
