import type { ContentText } from 'pdfmake/interfaces';

const missingInNotoSans = /([≤≥≈→∞√]+)/u;

type TextStyle = Omit<ContentText, 'text'>;
type Run = TextStyle & { text: string };

/** Text in runs, so that signs that Noto Sans lacks are set in Noto Sans Math instead of an empty box. */
export function pdfText(text: string, style: TextStyle = {}): TextStyle & { text: Run[] } {
  return { ...style, text: pdfRuns(text) };
}

/** The runs alone, each with the style, for a line that mixes styles. */
export function pdfRuns(text: string, style: TextStyle = {}): Run[] {
  return text
    .split(missingInNotoSans)
    .filter((run) => run !== '')
    .map((run) =>
      missingInNotoSans.test(run)
        ? { ...style, text: run, font: 'NotoSansMath', bold: false, italics: false }
        : { ...style, text: run },
    );
}
