import { usSieveName } from '#rules/quantities/sieves';
import { round } from './invented-mix';
import { inUnit, of, type Section, volumetric } from './sections';

/** Certificate: labels with colons, values two cells apart, a title merged over all, dates beside. */
export const certificate: Section = (book, mix, { words, us }) => {
  const sheet = book.sheet('Certificate');
  sheet.put(1, 1, 'HOT MIX ASPHALT — MIX DESIGN CERTIFICATE').merge(1, 1, 8);
  sheet.put(2, 1, 'Prepared for the Carrow Valley Roads Authority').merge(2, 1, 8);
  sheet.put(4, 1, 'Project:').put(4, 3, 'CV-2026-014');
  sheet.put(4, 5, 'Date:').put(4, 7, '4 March 2026');
  sheet.put(5, 1, 'Contractor:').put(5, 3, 'Kestrel Dale Surfacing');
  sheet.put(5, 5, 'Technician:').put(5, 7, 'R. Quill, no. 2231');
  sheet.put(6, 1, `${words.grade}:`).put(6, 3, mix.grade).know('binderGrade', mix.grade);
  sheet
    .put(6, 5, `${words.course}:`)
    .put(6, 7, `${words.courses[mix.course]} course`)
    .know('course', mix.course);
  sheet
    .put(7, 1, `${words.nominal}:`)
    .put(7, 3, mix.nominalMm, { format: '0.0" mm"' })
    .know('nominalMaximumSize', mix.nominalMm);
  sheet
    .put(7, 5, `${words.traffic}:`)
    .put(7, 7, mix.trafficMillions * 1_000_000, { format: '#,##0' })
    .know('designTraffic', mix.trafficMillions);
  sheet
    .put(8, 1, `${words.optimum}, %:`)
    .read(8, 3, of('binder-content', mix.design.binder, '%', { trial: 'design' }));
  sheet.put(8, 5, `${words.gb}:`).read(8, 7, of('binder-specific-gravity', mix.binderGravity, '1'));
  sheet.put(9, 1, `${words.nIni}:`).read(9, 3, of('gyrations-initial', mix.gyrations[0], 'gyrations'));
  sheet.put(9, 5, `${words.nMax}:`).read(9, 7, of('gyrations-maximum', mix.gyrations[2], 'gyrations'));
  sheet.put(10, 1, `${words.nDes}:`).read(10, 3, of('gyrations-design', mix.gyrations[1], 'gyrations'));
  const mixing = us
    ? inUnit('mixing-temperature', mix.mixingC, '°F', '°C', {}, 0)
    : { as: mix.mixingC, reading: of('mixing-temperature', mix.mixingC, '°C') };
  sheet
    .put(11, 1, `${words.mixing}:`)
    .read(11, 3, mixing.reading, { as: `${mixing.as} ${us ? '°F' : '°C'}` });
  sheet.put(
    13,
    1,
    'Values were determined on laboratory mixed material; see the worksheets for single results.',
  );
  sheet.put(14, 1, 'Signed: R. Quill').put(14, 5, 'Page 1 of 6');
};

/** A sheet a trial: specimens across, properties down, results under them. */
export const sheetPerTrial: Section = (book, mix, { words }) => {
  for (const trial of mix.trials) {
    const sheet = book.sheet(`${words.trial} ${trial.name}`);
    sheet.put(1, 1, 'Bulk specific gravity and volumetrics');
    sheet
      .put(2, 1, `${words.pb}, %`)
      .read(2, 2, of('binder-content', trial.binder, '%', { trial: trial.name }));
    sheet.row(4, 1, [words.specimen, 1, 2, 3, words.average]);
    const lines: [string, 'air' | 'ssd' | 'water' | 'gmb' | 'height', string, string][] = [
      [`${words.height}, mm`, 'height', 'specimen-height', 'mm'],
      [`${words.air}, g`, 'air', 'mass-in-air', 'g'],
      [`${words.ssd}, g`, 'ssd', 'mass-saturated-surface-dry', 'g'],
      [`${words.water}, g`, 'water', 'mass-in-water', 'g'],
      [words.gmb, 'gmb', 'bulk-specific-gravity-mix', '1'],
    ];
    for (const [line, [label, key, quantity, unit]] of lines.entries()) {
      sheet.put(5 + line, 1, label);
      for (const [at, specimen] of trial.specimens.entries()) {
        sheet.read(
          5 + line,
          2 + at,
          of(quantity, specimen[key], unit, { trial: trial.name, specimen: String(at + 1) }),
        );
      }
      if (key === 'gmb') sheet.put(5 + line, 5, trial.gmbMean);
    }
    sheet
      .put(11, 1, words.gmm)
      .read(11, 2, of('maximum-specific-gravity', trial.gmmMean, '1', { trial: trial.name }));
    sheet.put(12, 1, `${words.va}, %`).read(12, 2, of('air-voids', trial.voids, '%', { trial: trial.name }));
    sheet
      .put(13, 1, `${words.vma}, %`)
      .read(13, 2, of('voids-in-mineral-aggregate', trial.vma, '%', { trial: trial.name }));
    sheet
      .put(14, 1, `${words.vfa}, %`)
      .read(14, 2, of('voids-filled-with-asphalt', trial.vfa, '%', { trial: trial.name }));
  }
};

/** Design values beside lower and upper limits and a verdict. */
export const designAgainstLimits: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Design properties');
  sheet.put(1, 2, 'Properties at design binder content').merge(1, 2, 6);
  sheet.row(3, 2, [words.property, words.unit, words.jmf, words.minimum, words.maximum, 'Pass/Fail']);
  const at = { trial: 'design' };
  sheet
    .row(4, 2, [words.pb, '%'])
    .read(4, 4, of('binder-content', mix.design.binder, '%', at))
    .put(4, 5, 4.5)
    .put(4, 6, 6.5)
    .put(4, 7, 'Pass');
  for (const [line, [key, quantity, word, unit]] of volumetric.entries()) {
    if (key === 'gmmMean' || key === 'gmbMean') {
      sheet
        .row(5 + line, 2, [words[word] as string, '-'])
        .read(5 + line, 4, of(quantity, mix.design[key], '1', at))
        .put(5 + line, 7, '–');
      continue;
    }
    sheet
      .row(5 + line, 2, [words[word] as string, unit === '1' ? '-' : unit])
      .read(5 + line, 4, of(quantity, mix.design[key], unit, at));
    sheet.row(5 + line, 5, [3, 90, 'Pass']);
  }
};

/** Trial blends with control points, both names of the sieves, a spacer row, figures typed as text. */
export const trialBlends: Section = (book, mix, { words, us }) => {
  const sheet = book.sheet('Blends');
  sheet.put(1, 1, 'Trial blends — total percent passing');
  sheet.row(3, 1, [words.sieve, 'mm', 'Blend 1', 'Blend 2', 'Blend 3', 'Control points']).merge(3, 6, 2);
  sheet.put(4, 6, 'Lower').put(4, 7, 'Upper');
  for (const [at, mm] of mix.sievesMm.entries()) {
    const row = 6 + at;
    sheet.put(row, 1, us ? (usSieveName(mm) ?? String(mm)) : `${mm} mm`).put(row, 2, mm, { format: '0.000' });
    for (const [blend, shift] of [0, -1.5, -3.2].entries()) {
      const value = round(Math.max(0, Math.min(100, (mix.blend[at] as number) + shift)), 1);
      sheet.read(row, 3 + blend, of('percent-passing', value, '%', { sieve: mm, blend: String(blend + 1) }), {
        as: blend === 1 ? value.toFixed(1) : value,
      });
    }
    if (at > 1 && at < 4) sheet.put(row, 6, 90).put(row, 7, 100);
  }
};

/** Two stockpiles side by side, each with its own sieves, masses and percentages. */
export const stockpilesSideBySide: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Sieve tests');
  for (const [pile, { name, passing }] of mix.stockpiles.slice(0, 2).entries()) {
    const left = 1 + pile * 5;
    sheet.put(1, left, `${words.stockpile}: ${name}`);
    sheet.row(2, left, [`${words.sieve} (mm)`, 'Mass retained, g', words.retained, words.passing]);
    for (const [at, mm] of mix.sievesMm.entries()) {
      const above = at === 0 ? 100 : (passing[at - 1] as number);
      const place = { sieve: mm, stockpile: name };
      sheet.put(3 + at, left, mm).put(3 + at, left + 1, round((above - (passing[at] as number)) * 11.7, 1));
      sheet.read(
        3 + at,
        left + 2,
        of('percent-retained', round(above - (passing[at] as number), 1), '%', place),
      );
      sheet.read(3 + at, left + 3, of('percent-passing', passing[at] as number, '%', place));
    }
    sheet.put(3 + mix.sievesMm.length, left, words.total).put(3 + mix.sievesMm.length, left + 1, 1184.2);
  }
};

/** Rut depths by passes and wheel, the test's conditions in the title. */
export const rutsByPasses: Section = (book, mix, { words, us }) => {
  const sheet = book.sheet('HWTT');
  sheet.put(1, 1, `Hamburg wheel-tracking test at ${us ? '122 °F' : '50 °C'}`);
  sheet.put(3, 2, `${words.rut} (${us ? 'in' : 'mm'})`).merge(3, 2, 2);
  sheet.row(4, 1, [words.passes, 'Left', 'Right']);
  for (const [at, passes] of [5000, 10000, 15000, 20000].entries()) {
    sheet.put(5 + at, 1, passes);
    for (const [wheel, final] of mix.ruts.entries()) {
      const place = { specimen: wheel === 0 ? 'Left' : 'Right', temperature: 50, passes };
      const depth = round(final * (passes / 20000) ** 0.4, us ? 2 : 1);
      const written = us
        ? inUnit('wheel-track-rut-depth', depth, 'in', 'mm', place, 3)
        : { as: depth, reading: of('wheel-track-rut-depth', depth, 'mm', place) };
      sheet.read(5 + at, 2 + wheel, written.reading, { as: written.as });
    }
  }
};

/** Moisture test on its side: subsets over specimens, properties down. */
export const moistureAcross: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Moisture');
  sheet.put(1, 1, 'AASHTO T 283');
  sheet.put(3, 2, words.dry).merge(3, 2, 3).put(3, 5, words.wet).merge(3, 5, 3);
  sheet.row(4, 1, [words.specimen, 1, 2, 3, 4, 5, 6]);
  const all = [
    ...mix.dry.map((each) => ({ each, variant: 'dry' })),
    ...mix.wet.map((each) => ({ each, variant: 'conditioned' })),
  ];
  sheet
    .put(5, 1, `${words.diameter}, mm`)
    .put(6, 1, `${words.thickness}, mm`)
    .put(7, 1, `${words.va}, %`)
    .put(8, 1, `${words.load}, N`)
    .put(9, 1, `${words.strength}, kPa`)
    .put(10, 1, `${words.saturation}, %`);
  for (const [at, { each, variant }] of all.entries()) {
    const specimen = String(at + 1);
    const place = { specimen, variant };
    sheet.read(5, 2 + at, of('specimen-diameter', each.diameter, 'mm', place));
    sheet.read(6, 2 + at, of('specimen-thickness', each.thickness, 'mm', place));
    sheet.read(7, 2 + at, of('air-voids', each.voids, '%', place));
    const load = inUnit('failure-load', each.loadKn, 'N', 'kN', place, 0);
    sheet.read(8, 2 + at, load.reading, { as: load.as });
    sheet.read(9, 2 + at, of(`tensile-strength-${variant}`, each.strengthKpa, 'kPa', { specimen }));
    if (variant === 'conditioned')
      sheet.read(10, 2 + at, of('degree-of-saturation', each.saturation, '%', place));
    else sheet.put(10, 2 + at, 'n/a');
  }
  sheet.put(11, 1, `${words.average} ${words.strength}, kPa`).put(11, 2, 655).put(11, 5, 570);
  sheet.put(13, 1, words.tsr).read(13, 2, of('tensile-strength-ratio', mix.strengthRatio, '%'), {
    as: round(mix.strengthRatio / 100, 4),
    format: '0.0%',
  });
};

/** Dynamic modulus: frequencies down, temperatures across as numbers under a merged head. */
export const modulus: Section = (book, mix, { us }) => {
  const sheet = book.sheet('Dynamic modulus');
  sheet.put(1, 1, `Dynamic modulus |E*| (${us ? 'ksi' : 'MPa'})`);
  sheet.put(3, 1, 'Frequency (Hz)').put(3, 2, 'Temperature (°C)').merge(3, 2, 3);
  sheet.row(4, 2, [4, 20, 40]);
  for (const [row, frequency] of [25, 10, 1, 0.1].entries()) {
    sheet.put(5 + row, 1, frequency);
    for (const [column, temperature] of [4, 20, 40].entries()) {
      const value = round(((14500 - row * 1900) / (1 + column * 2.1)) * (1 + mix.flexibility[0]! / 200), 0);
      const place = { frequency, temperature };
      const written = us
        ? inUnit('dynamic-modulus', value, 'ksi', 'MPa', place, 0)
        : { as: value, reading: of('dynamic-modulus', value, 'MPa', place) };
      sheet.read(5 + row, 2 + column, written.reading, { as: written.as });
    }
  }
};

/** Creep: a sheet a temperature, times down, strains under a stress said once. */
export const creepSheets: Section = (book, mix, { words }) => {
  for (const { temperatureC, timesS, compliance } of mix.creep) {
    const sheet = book.sheet(`Creep ${temperatureC} °C`);
    const stress = 150;
    sheet.put(1, 1, 'Axial stress (kPa)').put(1, 2, stress);
    sheet.put(3, 1, words.time).put(3, 2, 'Strain').merge(3, 2, 3);
    sheet.row(4, 2, ['S1', 'S2', 'S3']);
    sheet.row(5, 1, ['s', 'µε', 'µε', 'µε']);
    for (const [at, time] of timesS.entries()) {
      sheet.put(6 + at, 1, time);
      for (const [specimen, values] of compliance.entries()) {
        const strain = round((values[at] as number) * stress, 1);
        sheet.read(
          6 + at,
          2 + specimen,
          of('creep-strain', strain, 'µε', {
            temperature: temperatureC,
            time,
            stress,
            specimen: `S${specimen + 1}`,
          }),
        );
      }
    }
  }
};

/** Contractor beside agency, with the difference. */
export const comparison: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Verification');
  sheet.row(2, 1, [words.property, 'Contractor', 'Agency', 'Difference', 'Allowable']);
  const lines: [string, string, number, string][] = [
    [words.gmm, 'maximum-specific-gravity', mix.design.gmmMean, '1'],
    [words.gmb, 'bulk-specific-gravity-mix', mix.design.gmbMean, '1'],
    [`${words.va} (%)`, 'air-voids', mix.design.voids, '%'],
    [`${words.pb} (%)`, 'binder-content', mix.design.binder, '%'],
  ];
  for (const [at, [label, quantity, value, unit]] of lines.entries()) {
    const other = round(value + (unit === '1' ? 0.004 : 0.1), 3);
    sheet
      .put(3 + at, 1, label)
      .read(3 + at, 2, of(quantity, value, unit))
      .read(3 + at, 3, of(quantity, other, unit, { laboratory: 'agency' }));
    sheet.put(3 + at, 4, round(other - value, 3)).put(3 + at, 5, 0.02);
  }
};

/** Sublots of one lot in rows, the target over them, averages and deviations under them. */
export const sublots: Section = (book, mix, { words }) => {
  const sheet = book.sheet('QC lot 3');
  sheet.put(1, 1, 'Quality control, lot 3');
  sheet.row(3, 1, ['Sublot', 'Date', `${words.pb} (%)`, words.gmm, `${words.va} (%)`, `${words.vma} (%)`]);
  sheet.put(4, 1, 'Target').put(4, 3, mix.design.binder).put(4, 5, 4).put(4, 6, 14.8);
  for (const [at, sublot] of ['1', '2', '3', '4'].entries()) {
    const place = { specimen: sublot };
    sheet.put(5 + at, 1, Number(sublot)).put(5 + at, 2, `2026-05-0${at + 3}`);
    sheet.read(
      5 + at,
      3,
      of('binder-content', round(mix.design.binder + [0.04, -0.07, 0.11, 0.02][at]!, 2), '%', place),
    );
    sheet.read(
      5 + at,
      4,
      of(
        'maximum-specific-gravity',
        round(mix.design.gmmMean + [0.002, -0.003, 0.001, 0.004][at]!, 3),
        '1',
        place,
      ),
    );
    sheet.read(
      5 + at,
      5,
      of('air-voids', round(mix.design.voids + [0.3, -0.4, 0.1, 0.5][at]!, 1), '%', place),
    );
    sheet.read(
      5 + at,
      6,
      of('voids-in-mineral-aggregate', round(mix.design.vma + [0.2, -0.1, 0.3, 0][at]!, 1), '%', place),
    );
  }
  sheet
    .put(9, 1, words.average)
    .put(9, 3, mix.design.binder)
    .put(9, 4, mix.design.gmmMean)
    .put(9, 5, 4.1)
    .put(9, 6, 14.9);
  sheet.put(10, 1, words.deviation).put(10, 3, 0.08).put(10, 4, 0.003).put(10, 5, 0.4).put(10, 6, 0.2);
};

/** One reading a row. */
export const longList: Section = (book, mix) => {
  const sheet = book.sheet('Data');
  sheet.row(1, 1, ['Parameter', 'Trial', 'Specimen', 'Value', 'Units', 'Method']);
  let row = 2;
  for (const trial of mix.trials.slice(0, 2)) {
    for (const [at, { gmb }] of trial.specimens.entries()) {
      sheet
        .row(row, 1, ['Bulk specific gravity (Gmb)', trial.name, at + 1])
        .read(
          row,
          4,
          of('bulk-specific-gravity-mix', gmb, '1', { trial: trial.name, specimen: String(at + 1) }),
        );
      sheet.row(row, 5, ['-', 'AASHTO T 166']);
      row += 1;
    }
    sheet
      .row(row, 1, ['Air voids', trial.name, null])
      .read(row, 4, of('air-voids', trial.voids, '%', { trial: trial.name }))
      .row(row, 5, ['%', 'AASHTO T 269']);
    sheet
      .row(row + 1, 1, ['VMA', trial.name, null])
      .read(row + 1, 4, of('voids-in-mineral-aggregate', trial.vma, '%', { trial: trial.name }))
      .put(row + 1, 5, '%');
    row += 2;
  }
};

/** Marshall properties by binder content, in US customary units, with an average after each. */
export const marshall: Section = (book, mix) => {
  const sheet = book.sheet('Marshall');
  sheet.put(1, 1, 'Marshall test data');
  sheet.row(3, 1, ['% AC', 'Specimen', 'Unit weight', 'Stability', 'Flow']);
  sheet.row(4, 1, [null, null, 'pcf', 'lbf', '0.01 in']);
  let row = 5;
  for (const trial of mix.trials) {
    const name = trial.binder.toFixed(1);
    for (const [at, { gmb }] of trial.specimens.entries()) {
      const place = { trial: name, specimen: String(at + 1) };
      if (at === 0)
        sheet.read(row, 1, of('binder-content', trial.binder, '%', { trial: name }), { format: '0.0' });
      else sheet.put(row, 1, trial.binder, { format: '0.0' });
      sheet.put(row, 2, at + 1);
      for (const [column, quantity, value, unit, canonical, decimals] of [
        [3, 'bulk-density-mix', gmb * 997, 'lb/ft³', 'kg/m³', 1],
        [4, 'marshall-stability', 10.2 + at * 0.3, 'lbf', 'kN', 0],
        [5, 'marshall-flow', 2.9 + at * 0.2, '0.01 in', 'mm', 1],
      ] as const) {
        const { as, reading } = inUnit(quantity, value, unit, canonical, place, decimals);
        sheet.read(row, column, reading, { as });
      }
      row += 1;
    }
    sheet.put(row, 2, 'Avg').put(row, 3, 148.2).put(row, 4, 2350).put(row, 5, 12.1);
    row += 1;
  }
};

/** Groups of three heading rows with a blank column between the trials. */
export const spacedGroups: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Gyratory');
  sheet.put(2, 1, words.specimen);
  for (const [at, trial] of mix.trials.slice(0, 3).entries()) {
    const column = 2 + at * 4;
    sheet
      .put(2, column, `${words.trial} ${trial.name} — ${trial.binder.toFixed(1)} % AC`)
      .merge(2, column, 3);
    book.truth.readings.push(of('binder-content', trial.binder, '%', { trial: trial.name }));
    sheet.row(3, column, [words.air, words.water, words.gmb]).row(4, column, ['(g)', '(g)', '']);
    for (const [specimen, each] of trial.specimens.entries()) {
      const place = { trial: trial.name, specimen: String(specimen + 1) };
      sheet.put(5 + specimen, 1, specimen + 1);
      sheet.read(5 + specimen, column, of('mass-in-air', each.air, 'g', place));
      sheet.read(5 + specimen, column + 1, of('mass-in-water', each.water, 'g', place));
      sheet.read(5 + specimen, column + 2, of('bulk-specific-gravity-mix', each.gmb, '1', place));
    }
  }
};

/** Aggregate tests a stockpile a column, with the blend and a limit, some not tested. */
export const qualityByStockpile: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Source tests');
  sheet.row(1, 1, [words.property, ...mix.stockpiles.slice(0, 3).map(({ name }) => name), words.limits]);
  const lines: [string, string, number, number][] = [
    [`${words.abrasion}, %`, 'abrasion-loss', mix.aggregate.abrasion, 40],
    [`${words.sand}, %`, 'sand-equivalent', mix.aggregate.sand, 45],
    [words.gsb, 'bulk-specific-gravity-aggregate', mix.gsb, 0],
  ];
  for (const [line, [label, quantity, value, limit]] of lines.entries()) {
    sheet.put(2 + line, 1, label);
    for (const [pile, { name }] of mix.stockpiles.slice(0, 3).entries()) {
      if (line === 1 && pile === 0) sheet.put(2 + line, 2, 'N/A');
      else
        sheet.read(
          2 + line,
          2 + pile,
          of(quantity, round(value + pile * (line === 2 ? 0.006 : 1), 3), line === 2 ? '1' : '%', {
            stockpile: name,
          }),
        );
    }
    if (limit > 0) sheet.put(2 + line, 5, limit);
  }
};

/** Typed figures with decimal commas, as a text file brings them. */
export const decimalCommas: Section = (book, mix, { words }) => {
  const sheet = book.sheet('');
  const text = (value: number, decimals: number) => value.toFixed(decimals).replace('.', ',');
  sheet.row(1, 1, [
    words.property,
    words.unit,
    ...mix.trials.map(({ name }) => `${words.trial} ${name}`),
    words.remarks,
  ]);
  sheet.row(2, 1, [words.pb, '%']);
  for (const [at, trial] of mix.trials.entries())
    sheet.read(2, 3 + at, of('binder-content', trial.binder, '%', { trial: trial.name }), {
      as: text(trial.binder, 1),
    });
  for (const [line, [key, quantity, word, unit]] of volumetric.entries()) {
    sheet.row(3 + line, 1, [words[word] as string, unit === '1' ? '-' : unit]);
    for (const [at, trial] of mix.trials.entries()) {
      sheet.read(3 + line, 3 + at, of(quantity, trial[key], unit, { trial: trial.name }), {
        as: text(trial[key], unit === '%' ? 1 + Number(key === 'effective') : 3),
      });
    }
  }
};

/** Hidden rows and sheets, remarks, a qualifier, values that are not there. */
export const hiddenParts: Section = (book, mix, { words }) => {
  const sheet = book.sheet('Calc', { hidden: true });
  sheet.row(1, 1, [words.property, words.result]);
  sheet.put(2, 1, words.gsb).read(2, 2, of('bulk-specific-gravity-aggregate', mix.gsb, '1'));
  sheet.put(3, 1, `${words.soundness}, %`).put(3, 2, 'N/A');
  sheet
    .put(4, 1, 'Draindown, %')
    .read(4, 2, { ...of('draindown', 0.1, '%'), qualifier: '<' }, { as: '<0.1' });
  sheet.put(5, 1, words.gse).read(5, 2, of('effective-specific-gravity-aggregate', mix.design.gse, '1'), {
    comment: 'from the design Gmm',
  });
  sheet.hiddenRows.push(5);
  sheet.put(8, 1, '* Values in this sheet feed the summary; do not print.');
};

/** Cores of a road with their stations. */
export const cores: Section = (book, mix) => {
  const sheet = book.sheet('Cores');
  sheet.row(1, 1, ['Core', 'Station', 'Thickness (mm)', 'In-place density (%)', 'Remarks']);
  for (const [at, name] of ['C1', 'C2', 'C3', 'C4'].entries()) {
    const place = { specimen: name };
    sheet.row(2 + at, 1, [name, `12+${350 + at * 40}`]);
    sheet.read(2 + at, 3, of('specimen-thickness', round(48 + at * 1.3, 1), 'mm', place));
    sheet.read(2 + at, 4, of('field-density', round(93.4 + at * 0.6 + mix.design.voids / 10, 1), '%', place));
    if (at === 2) sheet.put(2 + at, 5, 'edge of lane');
  }
};

/** Enclosures as label and what stands beside it. */
export const enclosures: Section = (book) => {
  const sheet = book.sheet('Attachments');
  sheet.row(2, 1, ['Binder certificate', 'BC-2207', '2026-01-15']);
  sheet.row(3, 1, ['Laboratory accreditation', 'LA-118', '12 Nov 2025']);
  sheet.row(4, 1, ['Safety data sheet', 'attached']);
  book.truth.documents.push(
    { type: 'binder-certificate', date: '2026-01-15', validTo: null },
    { type: 'laboratory-accreditation', date: '2025-11-12', validTo: null },
    { type: 'safety-data-sheet', date: null, validTo: null },
  );
};
