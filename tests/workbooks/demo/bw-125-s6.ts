import type { TemplateContent } from '#tests/workbooks/fill-template';
import { brightwaterSurfaceMended } from './bw-125-s4';
import { contentOf, type DemoDates } from './demo-mix';

/** A sister of BW-125-S4 whose workbook was typed in a hurry: four cells that a person has to settle. */
export function brightwaterInDoubt(dates: DemoDates): TemplateContent {
  const content = contentOf({ ...brightwaterSurfaceMended(dates), designation: 'BW-125-S6' });
  const trials = (content.tables.Trials ?? []).map((row) => ({ ...row }));
  const rowOf = (trial: string, specimen: number | string) => {
    const row = trials.find((each) => each.Trial === trial && each.Specimen === specimen);
    if (!row) throw new Error(`no specimen ${specimen} of trial ${trial}`);
    return row;
  };
  rowOf('A', 1)['Tested on'] = '03/04/2026';
  rowOf('D', 1)['Bulk specific gravity of the compacted mix'] = '2.40*';
  rowOf('D', 3)['Saturated surface-dry mass'] = '4721,5';
  rowOf('design', 'mean')['Voids filled with asphalt'] = { value: 0.721, format: '0.000' };
  return { ...content, tables: { ...content.tables, Trials: trials } };
}
