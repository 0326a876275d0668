import { useEffect } from 'react';

/**
 * What stands in the margins of every printed page: whose paper it is and what it is about, then what the page says
 * in its foot. Margin boxes take strings, so they go to the style of the root; print.css sets them.
 */
function usePrintHead({ agency, reference }: { agency: string; reference: string }): void {
  usePrintText('agency', agency);
  usePrintText('reference', reference);
}

/** The reference that the letter of a revision carries too. */
export function usePrintedRevision({
  agency,
  project,
  mixDesignation,
  number,
}: {
  agency: { name: string };
  project: { number: string };
  mixDesignation: string;
  number: number;
}): void {
  usePrintHead({ agency: agency.name, reference: `${project.number} / ${mixDesignation} / r${number}` });
}

/** `organisation` and `title` stand in where a page names no agency and no reference of its own. */
export function usePrintText(
  name: 'organisation' | 'title' | 'agency' | 'reference' | 'foot',
  text: string,
): void {
  useEffect(() => {
    const { style, dataset } = document.documentElement;
    // A browser without margin boxes prints head and foot once, with the page.
    if ('CSSMarginRule' in window) dataset.marginBoxes = '';
    style.setProperty(`--print-${name}`, cssString(text));
    return () => {
      style.removeProperty(`--print-${name}`);
    };
  }, [name, text]);
}

export function cssString(text: string): string {
  return `"${text.replace(/["\\]/g, '\\$&').replace(/\n/g, '\\A ')}"`;
}
