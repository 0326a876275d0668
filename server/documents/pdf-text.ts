import type { ContentText } from 'pdfmake/interfaces';

const missingInNotoSans = /([≤≥≈→∞√]+)/u;

/** Text in runs, so that signs that Noto Sans lacks are set in Noto Sans Math instead of an empty box. */
export function pdfText(text: string, style: Omit<ContentText, 'text'> = {}): ContentText {
  const runs = text
    .split(missingInNotoSans)
    .filter((run) => run !== '')
    .map((run) =>
      missingInNotoSans.test(run)
        ? { text: run, font: 'NotoSansMath', bold: false, italics: false }
        : { text: run },
    );
  return { ...style, text: runs };
}
