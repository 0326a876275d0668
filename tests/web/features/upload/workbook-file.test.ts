import { describe, expect, it } from 'vitest';
import { workbookFileFault } from '../../../../web/features/upload/lib/workbook-file';

const most = 25 * 1024 * 1024;
const fault = (name: string, size = 1000) => workbookFileFault({ name, size }, most);

describe('choosing a workbook', () => {
  it('takes .xlsx and .csv whatever the case of the ending', () => {
    expect(fault('BW-125-S4 r1.xlsx')).toBeNull();
    expect(fault('GRADATION.CSV')).toBeNull();
  });

  it('names the remedy for the old format and for macros', () => {
    expect(fault('trials.xls')).toBe(
      'trials.xls is in the old .xls format. Save it as .xlsx and choose that file.',
    );
    expect(fault('trials.xlsm')).toContain('without macros');
  });

  it('refuses what is not a workbook', () => {
    expect(fault('certificate.pdf')).toContain('saved as .xlsx, .csv or .tsv');
  });

  it('takes a file of exactly the largest size and refuses one byte more', () => {
    expect(fault('a.xlsx', most)).toBeNull();
    expect(fault('a.xlsx', most + 1)).toContain('larger than 25 MB');
  });

  it('refuses an empty file', () => {
    expect(fault('a.xlsx', 0)).toContain('is empty');
  });
});
