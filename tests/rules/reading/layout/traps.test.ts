import { describe, expect, it } from 'vitest';
import { readAnyLayout } from '#rules/reading/read-any-layout';
import { unreadReasons } from '#rules/reading/unread-reason';
import { demoEdition } from '#tests/workbooks/demo/write-demo-workbooks';
import { type GridSheet, gridOf } from '#tests/workbooks/grid-of';
import { typedSheet } from '#tests/workbooks/typed-sheet';

const edition = demoEdition();

function read(sheets: string | Record<string, string | GridSheet>) {
  const all = typeof sheets === 'string' ? { Sheet: sheets } : sheets;
  const grid = gridOf(
    Object.fromEntries(
      Object.entries(all).map(([name, sheet]) => [
        name,
        typeof sheet === 'string' ? typedSheet(sheet) : sheet,
      ]),
    ),
  );
  const result = readAnyLayout({ grid, edition, answers: [] });
  return {
    ...result,
    /** "air-voids A/1 5.4" */
    said: result.record.readings.map(({ quantity, value, qualifier, at }) => {
      const conditions = Object.entries(at)
        .toSorted(([a], [b]) => (a < b ? -1 : 1))
        .map(([name, each]) => `${name}=${each}`);
      return [quantity, ...conditions, `${qualifier ?? ''}${value ?? ''}`].join(' ');
    }),
    doubted: result.doubts.map(({ cell }) => cell),
    unused: Object.fromEntries(result.unread.map(({ cell, reason }) => [cell, reason])),
  };
}

describe('percentages', () => {
  it('are a hundred times the stored number where the format is a percentage', () => {
    expect(read('Property | Result\nAir voids | =4.1%').said).toEqual(['air-voids 4.1']);
  });
  it('are in doubt where a column of fractions has no percent format', () => {
    const { said, doubted } = read('Sieve (mm) | % Passing\n19 | 1\n12.5 | 0.92\n4.75 | 0.61\n0.075 | 0.051');
    expect([said, doubted]).toEqual([[], ['B2', 'B3', 'B4', 'B5']]);
  });
  it('are in doubt where a content below the plausible range fits a hundred times over', () => {
    const { said, doubts } = read('Binder content (%) | 0.053');
    expect(said).toEqual([]);
    expect(doubts[0]?.alternatives.map(({ answer }) => answer)).toContain('5.3 %');
  });
});

describe('figures that are typed as text', () => {
  it('are read with their unit, qualifier, full-width digits and no-break spaces', () => {
    const sheet =
      "Property | Value\nAir voids | '4.2 %\nDraindown, % | '<0.1\nVMA (%) | '１４.６\nFlow number | '> 740\nRut depth at 20,000 passes | '4.2\u00a0mm";
    expect(read(sheet).said).toEqual([
      'air-voids 4.2',
      'draindown <0.1',
      'voids-in-mineral-aggregate 14.6',
      'flow-number >740',
      'wheel-track-rut-depth passes=20000 4.2',
    ]);
  });
  it('have decimal commas where the sheet uses them throughout', () => {
    expect(
      read("Versuch | Hohlraumgehalt [Vol.-%] | Gmb\nA | '4,2 | '2,388\nB | '3,1 | '2,401").said,
    ).toEqual([
      'air-voids trial=A 4.2',
      'bulk-specific-gravity-mix trial=A 2.388',
      'air-voids trial=B 3.1',
      'bulk-specific-gravity-mix trial=B 2.401',
    ]);
  });
  it('with a mark or a spread behind them are in doubt', () => {
    const { said, doubted } = read("Property | Result\nGmb | '2.41*\nAir voids | '4.1 ± 0.3");
    expect([said, doubted]).toEqual([[], ['B2', 'B3']]);
  });
  it('that say there is no value are no zero and no doubt', () => {
    const { said, doubts, unused } = read(
      'Property | Result | Unit\nSand equivalent | N/A | %\nLA abrasion | – | %\nAir voids | ND | %',
    );
    expect([said, doubts]).toEqual([[], []]);
    expect([unused.B2, unused.B3, unused.B4]).toEqual(Array(3).fill(unreadReasons.noValue));
  });
  it('are results where a test has them in words', () => {
    expect(read('Property | Result\nPlasticity index | NP\nStripping inflection point | none').said).toEqual([
      'plasticity-index non-plastic',
      'stripping-inflection-point none',
    ]);
  });
});

describe('cells that hold no number', () => {
  it('are doubts where a number belongs: errors, words, formulas without results said once', () => {
    const { said, doubted, uses } = read(
      'Specimen | Gmb | Gmm\n1 | 2.371 | #DIV/0!\n2 | abc | =?\n3 | 2.374 | =?',
    );
    expect(said).toEqual([
      'bulk-specific-gravity-mix specimen=1 2.371',
      'bulk-specific-gravity-mix specimen=3 2.374',
    ]);
    expect(doubted).toEqual(['C2', 'B3', 'C3']);
    expect(uses.find(({ cell }) => cell === 'C4')?.use).toBe('doubt');
  });
});

describe('averages, deviations, limits and totals', () => {
  const sheet = `
Trial | Specimen | Gmb | Va (%) | Min | Max
A | 1 | 2.371 | 5.4 | 3 | 5
A | 2 | 2.374 | 5.3 | 3 | 5
 | Average | 2.3725 | 5.35
 | Std. dev. | 0.002 | 0.07`;
  it('are never taken for specimens or results', () => {
    const { said, unused } = read(sheet);
    expect(said).toEqual([
      'bulk-specific-gravity-mix specimen=1 trial=A 2.371',
      'air-voids specimen=1 trial=A 5.4',
      'bulk-specific-gravity-mix specimen=2 trial=A 2.374',
      'air-voids specimen=2 trial=A 5.3',
    ]);
    expect([unused.C4, unused.C5, unused.E2]).toEqual([
      unreadReasons.average,
      unreadReasons.spread,
      unreadReasons.limit,
    ]);
  });
  it('are a reading where a mean is all that is stated', () => {
    expect(read('Trial | Average Gmb\nA | 2.371\nB | 2.388').said).toEqual([
      'bulk-specific-gravity-mix trial=A 2.371',
      'bulk-specific-gravity-mix trial=B 2.388',
    ]);
  });
  it('are passed over in a summary that repeats the mean of specimens', () => {
    const { said } = read({
      Specimens: 'Trial | Specimen | Gmb\nA | 1 | 2.371\nA | 2 | 2.375',
      Summary: 'Trial | Gmb | VMA (%)\nA | 2.373 | 14.5',
    });
    expect(said).not.toContain('bulk-specific-gravity-mix trial=A 2.373');
    expect(said).toContain('voids-in-mineral-aggregate trial=A 14.5');
  });
  it('in brackets behind a name belong to the limit and not to the name', () => {
    expect(read('VMA (min. 14.0), % | 14.6\nVFA (65-75), % | 72').said).toEqual([
      'voids-in-mineral-aggregate 14.6',
      'voids-filled-with-asphalt 72',
    ]);
  });
  it('under shares are a total', () => {
    const { said, unused } = read('Stockpile | Percent used\nStone | 60\nSand | 40\nTotal | 100');
    expect(said).toEqual(['stockpile-share stockpile=Stone 60', 'stockpile-share stockpile=Sand 40']);
    expect(unused.B4).toBe(unreadReasons.total);
  });
});

describe('what does not agree', () => {
  it('is a doubt where two columns of gravities are changed over', () => {
    expect(read('Trial | Gmm | Gmb\nA | 2.372 | 2.512\nB | 2.385 | 2.494')).toMatchObject({
      said: [],
      doubted: ['B2', 'C2', 'B3', 'C3'],
    });
  });
  it('is a doubt where one thing has two values', () => {
    const { said, doubts } = read({ A: 'Gsb | 2.640', B: 'Gsb | 2.651' });
    expect(said).toEqual([]);
    expect(doubts[0]?.alternatives).toHaveLength(3);
  });
  it('is a doubt where a heading fits two quantities', () => {
    const { said, doubts } = read('Trial | Density (pcf)\nA | 148.1\nB | 149.0');
    expect(said).toEqual([]);
    expect(doubts[0]?.alternatives.map(({ answer }) => answer)).toEqual([
      'bulk-density-mix',
      'maximum-density-mix',
      'leave out',
    ]);
  });
  it('leaves identical replicates as they are', () => {
    expect(read('Specimen | Gmb\n1 | 2.371\n2 | 2.371').said).toHaveLength(2);
  });
});

describe('units', () => {
  it('are the header’s, the row’s, the cell’s or the format’s, also where sheets differ', () => {
    const { said } = read({
      TSR: 'Specimen | Dry ITS (psi)\n1 | 100',
      Second: 'Specimen | Conditioned ITS (kPa)\n2 | 620',
      Cover: 'Mixing temperature | 311 °F\nCompaction temperature (°C) | 145',
    });
    // 100 psi = 689.4757 kPa; (311 − 32)·5/9 = 155 °C.
    expect(said.map((each) => each.replace(/(\d+\.\d{3})\d+$/, '$1'))).toEqual([
      'tensile-strength-dry specimen=1 689.475',
      'tensile-strength-conditioned specimen=2 620',
      'mixing-temperature 155',
      'compaction-temperature 145',
    ]);
  });
  it('that are missing leave a doubt where two would do', () => {
    expect(read('Specimen | Dry tensile strength\n1 | 112').doubted).toEqual(['B2']);
  });
  it('of temperature that are missing leave a doubt where the test would be too hot', () => {
    expect(read('Temperature | Rut depth (mm) | Passes\n122 | 4.2 | 20000')).toMatchObject({
      said: [],
      doubted: ['A2'],
    });
  });
  it('of binder by mass of aggregate are converted to mass of mix', () => {
    // 5.6 of 105.6 is 5.303030… %.
    expect(read('Binder content (% by mass of aggregate) | 5.6').record.readings[0]).toMatchObject({
      value: expect.closeTo(5.30303, 5),
      origin: 'converted',
    });
  });
});

describe('gradations', () => {
  it('are told by their figures where no heading says passing or retained', () => {
    const { said } = read({
      A: 'Sieve (mm) | Stone\n19 | 100\n12.5 | 92\n4.75 | 58\n0.075 | 5',
      B: 'Sieve (mm) | Retained (%)\n19 | 0\n12.5 | 8\n9.5 | 20\n4.75 | 42\n2.36 | 58\n0.6 | 80\n0.075 | 95',
    });
    expect(said.filter((each) => each.startsWith('percent-passing'))).toHaveLength(4);
    expect(said.filter((each) => each.startsWith('cumulative-percent-retained'))).toHaveLength(7);
  });
  it('know sieves by inches, numbers, micrometres and openings, rising and falling', () => {
    const { said } = read('Sieve | % Passing\n#200 | 5.1\nNo. 8 | 41\n3/8" | 88\n1 1/2 in | 100');
    expect(said).toEqual([
      'percent-passing sieve=0.075 5.1',
      'percent-passing sieve=2.36 41',
      'percent-passing sieve=9.5 88',
      'percent-passing sieve=37.5 100',
    ]);
    expect(read('Sieve (µm) | % Passing\n75 | 5.1\n600 | 22').said).toEqual([
      'percent-passing sieve=0.075 5.1',
      'percent-passing sieve=0.6 22',
    ]);
  });
  it('doubt a sieve that is in no series and one that turned into a date', () => {
    const grid = typedSheet('Sieve | % Passing\n7.7 mm | 80\nx | 88');
    grid.cells.A3 = { kind: 'date', value: '2026-03-08', text: '8-Mar' };
    const { said, doubted } = read({ Sheet: grid });
    expect([said, doubted]).toEqual([[], ['A2', 'A3']]);
  });
});

describe('whose a result is', () => {
  it('follows a title over each of two tables with the same headings', () => {
    const { said } = read(
      'Trial 1 - 4.5 % asphalt\nSpecimen | Gmb\n1 | 2.371\n\nTrial 2 - 5.0 % asphalt\nSpecimen | Gmb\n1 | 2.388',
    );
    expect(said).toEqual([
      'binder-content trial=1 4.5',
      'bulk-specific-gravity-mix specimen=1 trial=1 2.371',
      'binder-content trial=2 5',
      'bulk-specific-gravity-mix specimen=1 trial=2 2.388',
    ]);
  });
  it('is a doubt where two tables with the same headings are not told apart', () => {
    expect(read('Specimen | Gmb\n1 | 2.371\n\nSpecimen | Gmb\n1 | 2.388')).toMatchObject({
      said: [],
      doubted: ['B5'],
    });
  });
  it('is the binder content where nothing else names the trials, and a sublot’s is not', () => {
    expect(read('AC (%) | Gmm\n4.5 | 2.512\n5.0 | 2.494').said).toContain(
      'maximum-specific-gravity trial=4.5 2.512',
    );
    expect(read('Sublot | AC (%)\n1 | 5.21\n2 | 5.28').said).toEqual([
      'binder-content specimen=1 5.21',
      'binder-content specimen=2 5.28',
    ]);
  });
  it('is the agency beside the contractor, and their difference is no result', () => {
    const { said, unused } = read('Property | Contractor | Agency | Difference\nGmm | 2.488 | 2.491 | 0.003');
    expect(said).toEqual([
      'maximum-specific-gravity laboratory=contractor 2.488',
      'maximum-specific-gravity laboratory=agency 2.491',
    ]);
    expect(unused.D2).toBe(unreadReasons.difference);
  });
  it.each(['JMF', 'Design', 'Selected', 'At optimum', 'Job mix formula'])(
    'is the design under "%s"',
    (head) => {
      expect(read(`Property | Trial A | Trial B | ${head}\nAir voids, % | 5.4 | 3.1 | 4.0`).said).toContain(
        'air-voids trial=design 4',
      );
    },
  );
  it('is the stockpile in a column called RAP, and the reclaimed material on its own sheet', () => {
    expect(read('Property | RAP | Sand\nGsb | 2.640 | 2.618').said).toContain(
      'bulk-specific-gravity-aggregate stockpile=RAP 2.64',
    );
    expect(read({ RAP: 'Sample | Binder content (%)\n1 | 5.1\n2 | 5.3' }).said).toEqual([
      'rap-binder-content specimen=1 5.1',
      'rap-binder-content specimen=2 5.3',
    ]);
  });
});

describe('columns that only their group tells apart', () => {
  it('belong to the stockpile that the group names', () => {
    const { said } = read(
      ' | Stone {2} | | Sand {2}\nSieve | % Ret. | % Pass. | % Ret. | % Pass.\n19 mm | 0 | 100 | 0 | 100\n4.75 mm | 88 | 12 | 2 | 98',
    );
    expect(said).toContain('percent-passing sieve=4.75 stockpile=Stone 12');
    expect(said).toContain('percent-retained sieve=4.75 stockpile=Sand 2');
  });
  it('are doubts throughout where nothing tells them apart, also where they agree', () => {
    const { said, doubted } = read('Sieve (mm) | % Passing | % Passing\n19 | 100 | 100\n4.75 | 12 | 98');
    expect([said, doubted]).toEqual([[], ['B2', 'C2', 'B3', 'C3']]);
  });
  it('are specimens by the figure behind their name, at the gyrations beside them', () => {
    expect(
      read('Gyrations | Height 1 (mm) | Height 2 (mm)\n8 | 130.1 | 129.8\n100 | 115.2 | 114.9').said,
    ).toEqual([
      'specimen-height gyrations=8 specimen=1 130.1',
      'specimen-height gyrations=8 specimen=2 129.8',
      'specimen-height gyrations=100 specimen=1 115.2',
      'specimen-height gyrations=100 specimen=2 114.9',
    ]);
  });
});

describe('a machine’s log', () => {
  it('of more values of one thing than anybody states is raw data and no doubt', () => {
    const rows = Array.from({ length: 40 }, (_, at) => `${at} | ${10 + at / 10}`).join('\n');
    const { said, doubts, unused } = read(`Index | Load (kN)\n${rows}`);
    expect([said, doubts]).toEqual([[], []]);
    expect(unused.B2).toBe(unreadReasons.rawData);
  });
});

describe('weighings', () => {
  it('under short names stand together as dry, surface-dry and in water', () => {
    expect(read('Specimen | Dry | SSD | Water\n1 | 4721.1 | 4730.2 | 2740.5').said).toEqual([
      'mass-in-air specimen=1 4721.1',
      'mass-saturated-surface-dry specimen=1 4730.2',
      'mass-in-water specimen=1 2740.5',
    ]);
  });
  it('of a maximum gravity test are no weighings of a compacted specimen', () => {
    const { said, unused } = read(
      'Trial | Dry mass (g) | Flask + water (g) | Gmm\nA | 2015.2 | 7432.1 | 2.512',
    );
    expect(said).toEqual(['maximum-specific-gravity trial=A 2.512']);
    expect([unused.B2, unused.C2]).toEqual([unreadReasons.rawData, unreadReasons.rawData]);
  });
});

describe('tests over time', () => {
  it('take temperature from a group heading, a sheet’s name, a title or a column', () => {
    const { said } = read({
      Groups:
        'Creep compliance, 1/GPa\n | -20 °C {2} | | -10 °C {2}\nTime (s) | 1 | 2 | 1 | 2\n10 | 0.05 | 0.052 | 0.077 | 0.08',
      'Creep -5C':
        'Time (s) | Specimen 1 strain (µε) | Specimen 2 strain (µε)\n10 | 44.0 | 45.9\nStress (kPa) | 200 | 200',
      List: 'Temp | Time | Horizontal deformation\n(°C) | (s) | (µm)\n0 | 10 | 1.7',
    });
    expect(said).toEqual([
      'creep-compliance specimen=1 temperature=-20 time=10 0.05',
      'creep-compliance specimen=2 temperature=-20 time=10 0.052',
      'creep-compliance specimen=1 temperature=-10 time=10 0.077',
      'creep-compliance specimen=2 temperature=-10 time=10 0.08',
      'creep-strain specimen=1 stress=200 temperature=-5 time=10 44',
      'creep-strain specimen=2 stress=200 temperature=-5 time=10 45.9',
      'horizontal-deformation temperature=0 time=10 1.7',
    ]);
  });
  it('keep a condition to the test that it stands with', () => {
    const { said } = read(
      'Test | Parameter | Result\nHamburg | Rut depth at 20000 passes, mm | 4.6\n | Test temperature, °C | 50\nIDEAL-CT | CT index | 98',
    );
    expect(said).toEqual([
      'wheel-track-rut-depth passes=20000 temperature=50 4.6',
      'cracking-tolerance-index 98',
    ]);
  });
});

describe('parts that are hidden or remarked upon', () => {
  it('are read, and it is said of them', () => {
    const { said, uses } = read({ Calc: typedSheet('Gsb | 2.640', { hidden: true }) });
    expect(said).toEqual(['bulk-specific-gravity-aggregate 2.64']);
    expect(uses.find(({ cell }) => cell === 'B1')?.taken).toContain('hidden in the workbook');
  });
  it('carry remarks with them', () => {
    const sheet = typedSheet('Gsb | 2.640');
    sheet.cells.B1 = { kind: 'number', value: '2.64', text: '2.640', comment: 'from the quarry' };
    expect(read({ Sheet: sheet }).uses.find(({ cell }) => cell === 'B1')?.taken).toContain(
      'remark: from the quarry',
    );
  });
  it('say why they were so read', () => {
    expect(read('Air voids (VTM), % | 4.1').uses.find(({ cell }) => cell === 'B1')?.taken).toContain(
      'by Air voids (VTM), %',
    );
  });
});

describe('documents and attributes', () => {
  it('are read with their dates, and a date of two readings is a doubt', () => {
    const { record, doubts } = read(
      'Document | Reference | Date | Valid until\nBinder certificate | BC-1 | 4 Mar 2026 | 2027-03-04\nMix design report | MD-2 | 03/04/2026',
    );
    expect(record.documents).toMatchObject([
      { type: 'binder-certificate', reference: 'BC-1', date: '2026-03-04', validTo: '2027-03-04' },
    ]);
    expect(doubts[0]?.alternatives.map(({ answer }) => answer)).toEqual([
      '2026-04-03',
      '2026-03-04',
      'leave out',
    ]);
  });
  it('stand beside, under and two cells from their labels', () => {
    const beside =
      'Nominal maximum aggregate size | 12.5 mm | | Design ESALs | 10,000,000\nCourse | Surface course | | Binder grade | PG 64-22';
    expect(Object.entries(read(beside).record.attributes).map(([name, { value }]) => [name, value])).toEqual([
      ['nominalMaximumSize', 12.5],
      ['course', 'surface'],
      ['designTraffic', 10],
      ['binderGrade', 'PG 64-22'],
    ]);
    expect(read('Binder grade | Course\nPG 64-22 | Surface').record.attributes).toMatchObject({
      binderGrade: { value: 'PG 64-22' },
      course: { value: 'surface' },
    });
    expect(read('Binder grade: | | PG 64-22\nGb: | | 1.028').said).toEqual(['binder-specific-gravity 1.028']);
  });
  it('leave reclaimed material without a basis in doubt', () => {
    expect(read('RAP content (%) | 20')).toMatchObject({ said: [], doubted: ['B1'] });
    expect(read('RAP content (% by mass of mix) | 20').said).toEqual(['rap-content 20']);
  });
});

describe('air voids under the title of a test of its own', () => {
  it('say for which test their specimens were made', () => {
    const { said } = read(
      'Hamburg wheel tracking at 50 °C\n\nSpecimen | Air voids (%) | Rut depth at 20,000 passes (mm)\n1 | 7.1 | 5.2\n2 | 6.8 | 5.6',
    );
    expect(said.filter((each) => each.startsWith('air-voids'))).toEqual([
      'air-voids specimen=1 variant=wheel tracking 7.1',
      'air-voids specimen=2 variant=wheel tracking 6.8',
    ]);
  });
  it('are those of the design under a title of the mix', () => {
    const { said } = read('Mix properties\n\nSpecimen | Air voids (%)\n1 | 4.1\n2 | 3.8');
    expect(said).toEqual(['air-voids specimen=1 4.1', 'air-voids specimen=2 3.8']);
  });
});
