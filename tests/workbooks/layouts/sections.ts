import { usSieveName } from '#rules/quantities/sieves';
import { convert } from '#rules/quantities/units';
import type { Conditions } from '#rules/record';
import type { Book, SheetOf, TrueReading } from './book';
import type { Headings } from './headings';
import { type InventedMix, type InventedTrial, round } from './invented-mix';

export interface Style {
  words: Headings;
  us: boolean;
}

export type Section = (book: Book, mix: InventedMix, style: Style) => void;

export const of = (quantity: string, value: number, unit: string, at: Conditions = {}): TrueReading => ({
  quantity,
  value,
  unit,
  at,
});

/** A figure in another unit, as it stands in the sheet, and the reading in the canonical unit that follows from it. */
export function inUnit(
  quantity: string,
  value: number,
  unit: string,
  canonical: string,
  at: Conditions,
  decimals: number,
): { as: number; reading: TrueReading } {
  const shown = convert(value, canonical, unit);
  const as = round(shown.ok ? shown.value : value, decimals);
  const back = convert(as, unit, canonical);
  return { as, reading: of(quantity, back.ok ? back.value : value, canonical, at) };
}

export const volumetric: [
  key: 'gmmMean' | 'gmbMean' | 'voids' | 'vma' | 'vfa' | 'dust' | 'effective' | 'gse',
  quantity: string,
  word: keyof Headings,
  unit: string,
][] = [
  ['gmmMean', 'maximum-specific-gravity', 'gmm', '1'],
  ['gmbMean', 'bulk-specific-gravity-mix', 'gmb', '1'],
  ['voids', 'air-voids', 'va', '%'],
  ['vma', 'voids-in-mineral-aggregate', 'vma', '%'],
  ['vfa', 'voids-filled-with-asphalt', 'vfa', '%'],
  ['dust', 'dust-proportion', 'dust', '1'],
  ['effective', 'effective-binder-content', 'pbe', '%'],
  ['gse', 'effective-specific-gravity-aggregate', 'gse', '1'],
];

/** Cover: label in A, value in B, unit in the label. */
export const coverBeside: Section = (book, mix, { words, us }) => {
  const sheet = book.sheet('Cover');
  sheet.put(1, 1, 'Mix Design Submittal').put(2, 1, 'Project').put(2, 2, 'Route 12 resurfacing, lot 4711');
  let row = 4;
  const line = (label: string, write: (row: number) => void) => {
    sheet.put(row, 1, label);
    write(row);
    row += 1;
  };
  line(words.grade, (at) => sheet.put(at, 2, mix.grade).know('binderGrade', mix.grade));
  line(words.course, (at) => sheet.put(at, 2, words.courses[mix.course]).know('course', mix.course));
  line(`${words.nominal} (mm)`, (at) =>
    sheet.put(at, 2, mix.nominalMm).know('nominalMaximumSize', mix.nominalMm),
  );
  line(`${words.traffic}, million ESAL`, (at) =>
    sheet.put(at, 2, mix.trafficMillions).know('designTraffic', mix.trafficMillions),
  );
  line(words.gb, (at) => sheet.read(at, 2, of('binder-specific-gravity', mix.binderGravity, '1')));
  line(words.nDes, (at) => sheet.read(at, 2, of('gyrations-design', mix.gyrations[1], 'gyrations')));
  const temperature = (quantity: string, value: number) => (at: number) => {
    if (!us) return sheet.read(at, 2, of(quantity, value, '°C'));
    const { as, reading } = inUnit(quantity, value, '°F', '°C', {}, 0);
    return sheet.read(at, 2, reading, { as });
  };
  line(`${words.mixing} (${us ? '°F' : '°C'})`, temperature('mixing-temperature', mix.mixingC));
  line(`${words.compaction} (${us ? '°F' : '°C'})`, temperature('compaction-temperature', mix.compactionC));
  line(`${words.optimum} (%)`, (at) =>
    sheet.read(at, 2, of('binder-content', mix.design.binder, '%', { trial: 'design' })),
  );
};

/** Cover in two pairs of columns with a unit cell between, and a column left blank. */
export const coverTwoColumns: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Summary');
  sheet.put(2, 2, 'JOB MIX').merge(2, 2, 6);
  sheet.row(4, 2, [words.grade, null, mix.grade]).know('binderGrade', mix.grade);
  sheet.row(5, 2, [words.course, null, words.courses[mix.course]]).know('course', mix.course);
  sheet.row(6, 2, [words.nominal, 'mm', mix.nominalMm]).know('nominalMaximumSize', mix.nominalMm);
  sheet.row(7, 2, ['Project no.', null, 48213]);
  sheet.put(4, 6, words.gb).read(4, 8, of('binder-specific-gravity', mix.binderGravity, '1'));
  sheet
    .put(5, 6, words.mixing)
    .put(5, 7, '°C')
    .read(5, 8, of('mixing-temperature', mix.mixingC, '°C'));
  sheet
    .put(6, 6, words.compaction)
    .put(6, 7, '°C')
    .read(6, 8, of('compaction-temperature', mix.compactionC, '°C'));
  sheet
    .put(7, 6, words.optimum)
    .put(7, 7, '%')
    .read(7, 8, of('binder-content', mix.design.binder, '%', { trial: 'design' }));
};

/** Cover with each value under its label. */
export const coverBelow: Section = (book, mix, { words }) => {
  const sheet = book.sheet('JMF');
  sheet.row(2, 1, [words.grade, words.course, `${words.nominal}, mm`]);
  sheet.row(3, 1, [mix.grade, words.courses[mix.course], mix.nominalMm]);
  sheet.know('binderGrade', mix.grade).know('course', mix.course).know('nominalMaximumSize', mix.nominalMm);
  sheet.row(5, 1, [words.gb, `${words.mixing}, °C`, `${words.optimum}, %`]);
  sheet.read(6, 1, of('binder-specific-gravity', mix.binderGravity, '1'));
  sheet.read(6, 2, of('mixing-temperature', mix.mixingC, '°C'));
  sheet.read(6, 3, of('binder-content', mix.design.binder, '%', { trial: 'design' }));
};

/** Stockpiles in rows with a total under the shares. */
export const stockpilesInRows: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Aggregates');
  sheet.put(1, 1, 'Aggregate stockpiles');
  sheet.row(3, 1, [words.stockpile, `${words.share} (%)`, words.gsb, words.gsa, `${words.absorption} (%)`]);
  for (const [at, pile] of mix.stockpiles.entries()) {
    const row = 4 + at;
    const place = { stockpile: pile.name };
    sheet.put(row, 1, pile.name);
    sheet.read(row, 2, of('stockpile-share', pile.share, '%', place));
    sheet.read(row, 3, of('bulk-specific-gravity-aggregate', pile.gsb, '1', place), { format: '0.000' });
    sheet.read(row, 4, of('apparent-specific-gravity-aggregate', pile.gsa, '1', place), { format: '0.000' });
    sheet.read(row, 5, of('water-absorption', pile.absorption, '%', place));
  }
  sheet.put(8, 1, words.total).put(8, 2, 100);
};

/** Stockpiles in columns, percentages in a percent format, blend gravity in the last column. */
export const stockpilesInColumns: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Stockpiles');
  sheet.put(1, 1, words.property);
  sheet.put(2, 1, words.share).put(3, 1, words.gsb).put(4, 1, `${words.absorption}, %`);
  for (const [at, pile] of mix.stockpiles.entries()) {
    const place = { stockpile: pile.name };
    sheet.put(1, 2 + at, pile.name);
    sheet.read(2, 2 + at, of('stockpile-share', pile.share, '%', place), {
      as: round(pile.share / 100, 4),
      format: '0.0%',
    });
    sheet.read(3, 2 + at, of('bulk-specific-gravity-aggregate', pile.gsb, '1', place));
    sheet.read(4, 2 + at, of('water-absorption', pile.absorption, '%', place));
  }
  sheet.put(1, 6, words.blend).read(3, 6, of('bulk-specific-gravity-aggregate', mix.gsb, '1'));
};

/** Sieves in rows in mm, stockpiles and blend in columns, limits at the end. */
export const gradationSi: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Gradation');
  sheet.put(1, 1, words.passing);
  const heads = [
    `${words.sieve} (mm)`,
    ...mix.stockpiles.map(({ name }) => name),
    words.blend,
    words.jmf,
    words.minimum,
    words.maximum,
  ];
  sheet.row(2, 1, heads);
  for (const [at, mm] of mix.sievesMm.entries()) {
    const row = 3 + at;
    sheet.put(row, 1, mm);
    for (const [pile, { name, passing }] of mix.stockpiles.entries()) {
      sheet.read(
        row,
        2 + pile,
        of('percent-passing', passing[at] as number, '%', { sieve: mm, stockpile: name }),
      );
    }
    sheet.read(row, 6, of('percent-passing', mix.blend[at] as number, '%', { sieve: mm }));
    sheet.read(row, 7, of('percent-passing', mix.jobMix[at] as number, '%', { sieve: mm, trial: 'design' }));
    sheet
      .put(row, 8, Math.max(0, Math.round((mix.jobMix[at] as number) - 6)))
      .put(row, 9, Math.min(100, Math.round((mix.jobMix[at] as number) + 6)));
  }
};

/** US sieve names, shares in a row over the gradation, only the target beside. */
export const gradationUs: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Sieve Analysis');
  sheet.put(1, 1, 'Combined gradation').put(2, 2, words.stockpile).merge(2, 2, 4);
  sheet.row(3, 1, [words.sieve, ...mix.stockpiles.map(({ name }) => name), words.jmf]);
  sheet.put(4, 1, words.share);
  for (const [pile, { name, share }] of mix.stockpiles.entries())
    sheet.read(4, 2 + pile, of('stockpile-share', share, '%', { stockpile: name }));
  for (const [at, mm] of mix.sievesMm.entries()) {
    const row = 5 + at;
    sheet.put(row, 1, (usSieveName(mm) ?? `${mm} mm`).replace(' in', '"').replace('No. ', '#'));
    for (const [pile, { name, passing }] of mix.stockpiles.entries()) {
      sheet.read(
        row,
        2 + pile,
        of('percent-passing', passing[at] as number, '%', { sieve: mm, stockpile: name }),
      );
    }
    sheet.read(row, 6, of('percent-passing', mix.jobMix[at] as number, '%', { sieve: mm, trial: 'design' }));
  }
};

/** Sieves across, gradations in rows. */
export const gradationAcross: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Grading');
  sheet.put(1, 1, words.passing);
  sheet.row(3, 1, [`${words.sieve}, mm`, ...mix.sievesMm]);
  for (const [pile, { name, passing }] of mix.stockpiles.entries()) {
    sheet.put(4 + pile, 1, name);
    for (const [at, mm] of mix.sievesMm.entries())
      sheet.read(
        4 + pile,
        2 + at,
        of('percent-passing', passing[at] as number, '%', { sieve: mm, stockpile: name }),
      );
  }
  sheet.put(8, 1, words.jmf);
  for (const [at, mm] of mix.sievesMm.entries())
    sheet.read(
      8,
      2 + at,
      of('percent-passing', mix.jobMix[at] as number, '%', { sieve: mm, trial: 'design' }),
    );
};

/** One gradation, rising, as retained, cumulative retained and passing beside masses. */
export const gradationRetained: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Sieve test');
  sheet.row(2, 1, [words.sieve, 'Mass retained (g)', words.retained, words.cumulative, words.passing]);
  const rising = mix.sievesMm
    .map((mm, at) => ({
      mm,
      passing: mix.blend[at] as number,
      above: at === 0 ? 100 : (mix.blend[at - 1] as number),
    }))
    .toReversed();
  for (const [at, { mm, passing, above }] of rising.entries()) {
    const row = 3 + at;
    sheet.put(row, 1, `${mm} mm`).put(row, 2, round((above - passing) * 12.3, 1));
    sheet.read(row, 3, of('percent-retained', round(above - passing, 1), '%', { sieve: mm }));
    sheet.read(row, 4, of('cumulative-percent-retained', round(100 - passing, 1), '%', { sieve: mm }));
    sheet.read(row, 5, of('percent-passing', passing, '%', { sieve: mm }));
  }
  sheet
    .put(3 + rising.length, 1, 'Pan')
    .put(3 + rising.length, 2, 61.2)
    .put(3 + rising.length, 3, mix.blend.at(-1) ?? 0);
};

/** A row a specimen, masses to voids, with averages and deviations under each trial. */
export const trialsInRows: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Trials');
  sheet.row(1, 1, [
    words.trial,
    words.specimen,
    `${words.pb} (%)`,
    `${words.air} (g)`,
    `${words.ssd} (g)`,
    `${words.water} (g)`,
    words.gmb,
    `${words.va} (%)`,
  ]);
  let row = 2;
  for (const trial of mix.trials) {
    for (const [at, specimen] of trial.specimens.entries()) {
      const place = { trial: trial.name, specimen: String(at + 1) };
      sheet.put(row, 1, trial.name).put(row, 2, at + 1);
      if (at === 0) sheet.read(row, 3, of('binder-content', trial.binder, '%', { trial: trial.name }));
      else sheet.put(row, 3, trial.binder);
      sheet.read(row, 4, of('mass-in-air', specimen.air, 'g', place));
      sheet.read(row, 5, of('mass-saturated-surface-dry', specimen.ssd, 'g', place));
      sheet.read(row, 6, of('mass-in-water', specimen.water, 'g', place));
      sheet.read(row, 7, of('bulk-specific-gravity-mix', specimen.gmb, '1', place), {
        format: '0.000',
        formula: `D${row}/(E${row}-F${row})`,
      });
      sheet.read(row, 8, of('air-voids', specimen.voids, '%', place));
      row += 1;
    }
    sheet.put(row, 2, words.average).put(row, 7, trial.gmbMean).put(row, 8, trial.voids);
    sheet
      .put(row + 1, 2, words.deviation)
      .put(row + 1, 7, 0.004)
      .put(row + 1, 8, 0.2);
    row += 2;
  }
};

/** Properties in rows, trials in columns, limits in the last. */
export const trialsInColumns: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Volumetrics');
  sheet.put(1, 1, 'Mixture properties');
  sheet.row(3, 1, [words.property, ...mix.trials.map(({ name }) => `${words.trial} ${name}`), words.limits]);
  sheet.put(4, 1, `${words.pb}, %`);
  for (const [at, trial] of mix.trials.entries())
    sheet.read(4, 2 + at, of('binder-content', trial.binder, '%', { trial: trial.name }));
  for (const [line, [key, quantity, word, unit]] of volumetric.entries()) {
    sheet.put(5 + line, 1, unit === '1' ? (words[word] as string) : `${words[word]}, ${unit}`);
    for (const [at, trial] of mix.trials.entries())
      sheet.read(5 + line, 2 + at, of(quantity, trial[key], unit, { trial: trial.name }));
    sheet.put(5 + line, 2 + mix.trials.length, unit === '%' ? 14 : null);
  }
};

/** The binder content names the columns; nothing else does. */
export const trialsByBinder: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Mix data');
  sheet.put(2, 1, `${words.pb} (%)`);
  for (const [at, trial] of mix.trials.entries())
    sheet.read(2, 2 + at, of('binder-content', trial.binder, '%', { trial: shown(trial) }), {
      format: '0.0',
    });
  for (const [line, [key, quantity, word, unit]] of volumetric.entries()) {
    sheet.put(3 + line, 1, unit === '1' ? (words[word] as string) : `${words[word]} (${unit})`);
    for (const [at, trial] of mix.trials.entries())
      sheet.read(3 + line, 2 + at, of(quantity, trial[key], unit, { trial: shown(trial) }));
  }
};

export const shown = (trial: InventedTrial) => trial.binder.toFixed(1);

/** Summary with trials in rows and the proposed design last, a limit row under it. */
export const summaryInRows: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Mix summary');
  sheet.put(1, 1, 'Volumetric properties');
  sheet.row(3, 1, [words.trial, words.pb, ...volumetric.map(([, , word]) => words[word] as string)]);
  sheet.row(4, 1, ['', '%', ...volumetric.map(([, , , unit]) => (unit === '1' ? '-' : unit))]);
  for (const [at, trial] of [...mix.trials, mix.design].entries()) {
    const name = trial.name;
    const row = 5 + at;
    sheet.put(row, 1, name === 'design' ? words.jmf : name);
    sheet.read(row, 2, of('binder-content', trial.binder, '%', { trial: name }));
    for (const [line, [key, quantity, , unit]] of volumetric.entries())
      sheet.read(row, 3 + line, of(quantity, trial[key], unit, { trial: name }));
  }
  const row = 6 + mix.trials.length;
  sheet.put(row, 1, words.limits).put(row, 5, 4).put(row, 6, 14).put(row, 7, 65);
};

/** Group heads over two rows: trials over their quantities, specimens in rows. */
export const trialsGrouped: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Specimens');
  sheet.put(1, 1, words.specimen);
  for (const [at, trial] of mix.trials.entries()) {
    const column = 2 + at * 2;
    sheet.put(1, column, `${words.trial} ${trial.name}`).merge(1, column, 2);
    sheet.put(2, column, words.gmb).put(2, column + 1, `${words.height} (mm)`);
    for (const [specimen, { gmb, height }] of trial.specimens.entries()) {
      const place = { trial: trial.name, specimen: String(specimen + 1) };
      if (at === 0) sheet.put(3 + specimen, 1, specimen + 1);
      sheet.read(3 + specimen, column, of('bulk-specific-gravity-mix', gmb, '1', place));
      sheet.read(3 + specimen, column + 1, of('specimen-height', height, 'mm', place));
    }
    sheet.put(6, column, trial.gmbMean);
  }
  sheet.put(6, 1, words.average);
};

/** Rice worksheet: flask masses that nobody asks for, two results a trial. */
export const maximumGravities: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Rice');
  sheet.row(2, 1, [
    words.trial,
    words.specimen,
    'Dry mass (g)',
    'Flask + water (g)',
    'Flask + water + sample (g)',
    words.gmm,
  ]);
  let row = 3;
  for (const trial of mix.trials) {
    for (const [at, gmm] of trial.gmm.entries()) {
      sheet.row(row, 1, [at === 0 ? trial.name : null, at + 1, 2012.4, 7450.2, 8660.9]);
      sheet.read(
        row,
        6,
        of('maximum-specific-gravity', gmm, '1', { trial: trial.name, specimen: String(at + 1) }),
      );
      row += 1;
    }
    sheet.put(row, 2, words.average).put(row, 6, trial.gmmMean);
    row += 1;
  }
};

/** Aggregate tests as property, method, result, unit, limit, remark. */
export const aggregateTests: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Quality');
  sheet.put(1, 1, 'Consensus and source properties');
  sheet.row(2, 1, [words.property, 'Method', words.result, words.unit, words.limits, words.remarks]);
  const lines: [string, string, number, string, Conditions][] = [
    [words.faces1, 'AASHTO T 335', mix.aggregate.faces1, 'coarse-aggregate-angularity-one-face', {}],
    [words.faces2, 'AASHTO T 335', mix.aggregate.faces2, 'coarse-aggregate-angularity-two-faces', {}],
    [words.faa, 'AASHTO T 304', mix.aggregate.fineAngularity, 'fine-aggregate-angularity', {}],
    [words.flat, 'ASTM D4791', mix.aggregate.flat, 'flat-and-elongated', { variant: '5:1' }],
    [words.sand, 'AASHTO T 176', mix.aggregate.sand, 'sand-equivalent', {}],
    [words.abrasion, 'AASHTO T 96', mix.aggregate.abrasion, 'abrasion-loss', {}],
    [words.soundness, 'AASHTO T 104', mix.aggregate.soundness, 'soundness-loss', { variant: 'sodium' }],
  ];
  for (const [at, [label, method, value, quantity, place]] of lines.entries()) {
    sheet.row(3 + at, 1, [label, method]).read(3 + at, 3, of(quantity, value, '%', place));
    sheet.row(3 + at, 4, ['%', 45, 'ok']);
  }
};

/** Moisture: the subsets under titles of their own, ratio at the foot. */
export const moistureStacked: Section = (book, mix, style) => {
  const { words, us } = style;
  const sheet = book.sheet('TSR');
  sheet.put(1, 1, 'Moisture susceptibility');
  let row = 3;
  for (const [subset, variant] of [
    [mix.dry, 'dry'],
    [mix.wet, 'conditioned'],
  ] as const) {
    sheet.put(row, 1, variant === 'dry' ? words.dry : words.wet);
    sheet.row(row + 1, 1, [
      words.specimen,
      `${words.thickness} (mm)`,
      `${words.load} (${us ? 'lbf' : 'kN'})`,
      `${words.va} (%)`,
      `${words.strength} (${us ? 'psi' : 'kPa'})`,
    ]);
    for (const [at, each] of subset.entries()) moistureRow(sheet, row + 2 + at, { each, at, variant, us });
    sheet.put(row + 5, 1, words.average).put(row + 5, 5, us ? 121 : 640);
    row += 7;
  }
  sheet.put(row, 1, `${words.tsr} (%)`).read(row, 2, of('tensile-strength-ratio', mix.strengthRatio, '%'));
};

function moistureRow(
  sheet: SheetOf,
  row: number,
  {
    each,
    at,
    variant,
    us,
  }: { each: InventedMix['dry'][number]; at: number; variant: 'dry' | 'conditioned'; us: boolean },
): void {
  const name = `${variant === 'dry' ? 'D' : 'W'}${at + 1}`;
  const place = { specimen: name, variant };
  sheet.put(row, 1, name).read(row, 2, of('specimen-thickness', each.thickness, 'mm', place));
  const load = us
    ? inUnit('failure-load', each.loadKn, 'lbf', 'kN', place, 0)
    : { as: each.loadKn, reading: of('failure-load', each.loadKn, 'kN', place) };
  sheet.read(row, 3, load.reading, { as: load.as });
  sheet.read(row, 4, of('air-voids', each.voids, '%', place));
  const quantity = `tensile-strength-${variant}`;
  const strength = us
    ? inUnit(quantity, each.strengthKpa, 'psi', 'kPa', { specimen: name }, 1)
    : { as: each.strengthKpa, reading: of(quantity, each.strengthKpa, 'kPa', { specimen: name }) };
  sheet.read(row, 5, strength.reading, { as: strength.as });
}

/** Rutting and cracking: conditions as lines over the tables. */
export const performanceSheets: Section = (book, mix, { words, us }) => {
  const hamburg = book.sheet('Hamburg');
  hamburg.put(1, 1, 'Hamburg wheel tracking');
  const temperature = us ? 122 : 50;
  hamburg.row(2, 1, [words.temperature, us ? '122 °F' : '50 °C']).row(3, 1, [words.passes, 20000]);
  hamburg.row(5, 1, [words.specimen, `${words.rut} (mm)`]);
  for (const [at, rut] of mix.ruts.entries()) {
    hamburg.put(6 + at, 1, at + 1).read(
      6 + at,
      2,
      of('wheel-track-rut-depth', rut, 'mm', {
        specimen: String(at + 1),
        temperature: us ? 50 : temperature,
        passes: 20000,
      }),
    );
  }
  hamburg.put(8, 1, words.average).put(8, 2, round((mix.ruts[0]! + mix.ruts[1]!) / 2, 2));
  hamburg
    .put(10, 1, words.sip)
    .read(10, 2, of('stripping-inflection-point', mix.inflection, 'passes', { temperature: 50 }));
  const cracking = book.sheet('Cracking');
  cracking.row(1, 1, [words.specimen, words.ct]);
  for (const [at, value] of mix.cracking.entries())
    cracking
      .put(2 + at, 1, at + 1)
      .read(2 + at, 2, of('cracking-tolerance-index', value, '1', { specimen: String(at + 1) }));
  cracking.put(7, 1, words.average).put(7, 2, 101);
  cracking.row(10, 1, [words.specimen, ...mix.flexibility.map((_, at) => at + 1), words.average]);
  cracking.put(11, 1, words.fi);
  for (const [at, value] of mix.flexibility.entries())
    cracking.read(11, 2 + at, of('flexibility-index', value, '1', { specimen: String(at + 1) }));
  cracking.put(11, 6, 10.2);
};

/** Creep as one long list. */
export const creepList: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Creep');
  sheet.row(1, 1, [
    `${words.temperature} (°C)`,
    words.specimen,
    `${words.time} (s)`,
    `${words.compliance} (1/GPa)`,
  ]);
  let row = 2;
  for (const { temperatureC, timesS, compliance } of mix.creep) {
    for (const [specimen, values] of compliance.entries()) {
      for (const [at, time] of timesS.entries()) {
        sheet.row(row, 1, [temperatureC, specimen + 1, time]);
        sheet.read(
          row,
          4,
          of('creep-compliance', values[at] as number, '1/GPa', {
            temperature: temperatureC,
            time,
            specimen: String(specimen + 1),
          }),
        );
        row += 1;
      }
    }
  }
};

/** Creep as a matrix a temperature, one under the other: times down, specimens across. */
export const creepMatrices: Section = (book, mix, { words, us }) => {
  const sheet = book.sheet('Creep test');
  let row = 1;
  for (const { temperatureC, timesS, compliance } of mix.creep) {
    sheet.put(row, 1, `${words.compliance} (${us ? '1/psi' : '1/GPa'}) at ${temperatureC} °C`);
    sheet.row(row + 1, 1, [
      `${words.time} (s)`,
      ...compliance.map((_, at) => `${words.specimen} ${at + 1}`),
      words.average,
    ]);
    for (const [at, time] of timesS.entries()) {
      sheet.put(row + 2 + at, 1, time);
      for (const [specimen, values] of compliance.entries()) {
        const place = { temperature: temperatureC, time, specimen: String(specimen + 1) };
        const value = values[at] as number;
        const written = us
          ? inUnit('creep-compliance', value, '1/psi', '1/GPa', place, 12)
          : { as: value, reading: of('creep-compliance', value, '1/GPa', place) };
        sheet.read(row + 2 + at, 2 + specimen, written.reading, { as: written.as });
      }
      sheet.put(row + 2 + at, 5, us ? 4e-7 : 0.05);
    }
    row += timesS.length + 4;
  }
};

/** A list of documents under headings. */
export const documentList: Section = (book) => {
  const sheet = book.sheet('Enclosures');
  sheet.row(1, 1, ['Document', 'Issued by', 'Reference', 'Date', 'Valid until']);
  sheet.row(2, 1, ['Binder certificate', 'Halden Refining', 'BC-1207', '2026-02-11', '2027-02-11']);
  sheet.row(3, 1, ['Mix design report', 'Tollhouse Laboratory', 'MD-77', '4 Mar 2026']);
  book.truth.documents.push(
    { type: 'binder-certificate', date: '2026-02-11', validTo: '2027-02-11' },
    { type: 'mix-design-report', date: '2026-03-04', validTo: null },
  );
};
