import { describe, expect, it } from 'vitest';
import { LabelReader } from '#rules/reading/layout/label-meaning';
import { vocabularyOf } from '#rules/reading/words/phrase-index';
import { demoEdition } from '#tests/workbooks/demo/write-demo-workbooks';
import { headingCases } from './heading-cases';

const labels = new LabelReader(vocabularyOf(demoEdition()));

describe('a heading as a laboratory writes it', () => {
  it.each(Object.entries(headingCases))('names %s in each of its forms', (quantity, list) => {
    const unknown = list
      .split(/\s+·\s+/)
      .map((text) => text.trim())
      .filter((text) => {
        const meaning = labels.read(text);
        return !meaning.quantities.includes(quantity) || meaning.unknown.length > 0;
      });
    expect(unknown).toEqual([]);
  });

  it.each([
    ['Bulk S.G.', 'Bulk Specific Gravity'],
    ['V.M.A. (%)', 'VMA (%)'],
    ['Hohlraumgeh. [Vol.-%]', 'Hohlraumgehalt [Vol.-%]'],
    ['Grav. esp. máxima', 'Gravedad específica máxima'],
    ["Coefficient d'absorption d'eau", 'Coefficient absorption eau'],
  ])('reads "%s" as it reads "%s"', (short, full) => {
    expect(labels.read(short).quantities).toEqual(labels.read(full).quantities);
    expect(labels.read(short).quantities).not.toEqual([]);
  });

  it.each(['Density, % of Gmm', 'Sp. Gr.', 'P200/Pbe'])('takes "%s" for no other quantity', (text) => {
    const taken = labels.read(text).quantities;
    const never = [
      'maximum-specific-gravity',
      'softening-point',
      'effective-binder-content',
      'percent-passing',
    ];
    expect(taken.filter((id) => never.includes(id))).toEqual([]);
  });
});
