/** How one unit is written here, what the conversion library calls it, and how workbooks write it. */
export interface UnitEntry {
  unit: string;
  expression: string;
  aliases: string[];
}

/**
 * The units a workbook may state. Aliases are compared after compatibility normalisation (superscripts
 * become digits, both micro signs one), first with case, then without it.
 */
export const unitTable: UnitEntry[] = [
  { unit: '1', expression: 'ratio', aliases: ['-', '–', 'none', 'unitless', 'dimensionless', 'ratio'] },
  {
    unit: '%',
    expression: 'percent',
    aliases: ['percent', 'pct', 'per cent', '% by mass', '% by weight', 'wt%', '% mix'],
  },
  { unit: 'mm', expression: 'mm', aliases: ['millimeter', 'millimeters', 'millimetre', 'millimetres'] },
  { unit: 'cm', expression: 'cm', aliases: ['centimeter', 'centimeters', 'centimetre', 'centimetres'] },
  { unit: 'm', expression: 'm', aliases: ['meter', 'meters', 'metre', 'metres'] },
  {
    unit: 'µm',
    expression: 'um',
    aliases: ['um', 'micron', 'microns', 'micrometer', 'micrometre', 'micrometers'],
  },
  { unit: 'in', expression: 'in', aliases: ['in.', 'inch', 'inches', '"', '″', '”'] },
  { unit: 'microinch', expression: 'microinch', aliases: ['µin', 'uin', 'microinches', 'micro-inch'] },
  {
    unit: '0.01 in',
    expression: 'hundredthInch',
    aliases: ['0.01in', '.01 in', '0.01 inch', '1/100 in', '0.01"'],
  },
  { unit: '0.25 mm', expression: 'quarterMillimetre', aliases: ['0.25mm', '.25 mm'] },
  { unit: 'ft', expression: 'ft', aliases: ['foot', 'feet'] },
  { unit: 'dmm', expression: 'penetrationUnit', aliases: ['0.1 mm', '1/10 mm', '0.1mm'] },
  { unit: 'g', expression: 'g', aliases: ['gram', 'grams', 'gm', 'gms'] },
  { unit: 'kg', expression: 'kg', aliases: ['kilogram', 'kilograms', 'kgs'] },
  { unit: 'lb', expression: 'lbm', aliases: ['lbs', 'lbm', 'pound', 'pounds'] },
  { unit: 't', expression: 'tonne', aliases: ['tonne', 'tonnes'] },
  { unit: 'kN', expression: 'kN', aliases: ['kilonewton', 'kilonewtons'] },
  { unit: 'N', expression: 'N', aliases: ['newton', 'newtons'] },
  { unit: 'lbf', expression: 'lbf', aliases: ['pounds-force', 'pound-force'] },
  { unit: 'kgf', expression: 'kilogramForce', aliases: ['kilogram-force', 'kp'] },
  { unit: 'Pa', expression: 'Pa', aliases: ['pascal', 'pascals', 'N/m2', 'N/m^2'] },
  { unit: 'kPa', expression: 'kPa', aliases: ['kilopascal', 'kilopascals', 'kN/m2', 'kN/m^2'] },
  { unit: 'MPa', expression: 'MPa', aliases: ['megapascal', 'megapascals'] },
  { unit: 'N/mm²', expression: 'MPa', aliases: ['N/mm^2', 'N/mm2'] },
  { unit: 'GPa', expression: 'GPa', aliases: ['gigapascal'] },
  { unit: 'psi', expression: 'psi', aliases: ['lb/in2', 'lb/in^2', 'lbf/in2', 'lbf/in^2', 'p.s.i.'] },
  { unit: 'ksi', expression: 'ksi', aliases: ['kip/in2', 'kip/in^2'] },
  { unit: '1/Pa', expression: 'Pa^-1', aliases: ['Pa^-1', 'Pa-1', '/Pa'] },
  { unit: '1/kPa', expression: 'kPa^-1', aliases: ['kPa^-1', 'kPa-1', '/kPa'] },
  { unit: '1/MPa', expression: 'MPa^-1', aliases: ['MPa^-1', 'MPa-1', '/MPa'] },
  { unit: '1/GPa', expression: 'GPa^-1', aliases: ['GPa^-1', 'GPa-1', '/GPa'] },
  { unit: '1/psi', expression: 'psi^-1', aliases: ['psi^-1', 'psi-1', '/psi', 'in2/lb', 'in^2/lb'] },
  { unit: 'kg/m³', expression: 'kg/m^3', aliases: ['kg/m^3', 'kg/m3', 'kg/cu.m', 'kg/cum'] },
  { unit: 'Mg/m³', expression: 'Mg/m^3', aliases: ['Mg/m^3', 'Mg/m3', 't/m3', 't/m^3'] },
  { unit: 'g/cm³', expression: 'g/cm^3', aliases: ['g/cm^3', 'g/cm3', 'g/cc', 'gm/cc', 'g/ml'] },
  {
    unit: 'lb/ft³',
    expression: 'lbm/ft^3',
    aliases: ['lb/ft^3', 'lb/ft3', 'pcf', 'lbs/ft3', 'lb/cu ft', 'lb/cf'],
  },
  {
    unit: '°C',
    expression: 'degC',
    aliases: ['C', 'degC', 'deg C', 'deg. C', 'celsius', '℃', 'ºC', 'º C', '° C'],
  },
  {
    unit: '°F',
    expression: 'degF',
    aliases: ['F', 'degF', 'deg F', 'deg. F', 'fahrenheit', '℉', 'ºF', 'º F', '° F'],
  },
  { unit: 'K', expression: 'K', aliases: ['kelvin'] },
  { unit: 'J/m²', expression: 'J/m^2', aliases: ['J/m^2', 'J/m2', 'N/m (energy)'] },
  { unit: 'kJ/m²', expression: 'kJ/m^2', aliases: ['kJ/m^2', 'kJ/m2'] },
  { unit: 'm²/kg', expression: 'm^2/kg', aliases: ['m^2/kg', 'm2/kg'] },
  { unit: 'ft²/lb', expression: 'ft^2/lbm', aliases: ['ft^2/lb', 'ft2/lb', 'sq ft/lb', 'sqft/lb'] },
  { unit: 'kN/mm', expression: 'kN/mm', aliases: [] },
  { unit: 'N/mm', expression: 'N/mm', aliases: [] },
  { unit: 'N/m', expression: 'N/m', aliases: [] },
  {
    unit: 'µε',
    expression: 'microstrain',
    aliases: ['microstrain', 'ue', 'µm/m', 'um/m', 'µstrain', 'micro strain'],
  },
  { unit: 'mm/mm', expression: 'strain', aliases: ['in/in', 'm/m', 'strain'] },
  { unit: '% strain', expression: 'percentStrain', aliases: ['percent strain'] },
  { unit: 'Pa·s', expression: 'Pa s', aliases: ['Pa.s', 'Pa s', 'Pa-s', 'Pas', 'Pa*s'] },
  { unit: 'mm²/s', expression: 'mm^2/s', aliases: ['mm2/s', 'mm^2/s', 'cSt', 'centistokes'] },
  { unit: '°', expression: 'deg', aliases: ['deg', 'degree', 'degrees'] },
  { unit: 'mg/g', expression: 'mg/g', aliases: ['g/kg'] },
  {
    unit: '10⁻⁵ cm/s',
    expression: 'permeabilityUnit',
    aliases: ['10^-5 cm/s', '1e-5 cm/s', 'x10^-5 cm/s', '10-5 cm/s'],
  },
  { unit: 'm/day', expression: 'm/day', aliases: ['m/d', 'metres per day', 'meters per day'] },
  { unit: 'cm/s', expression: 'cm/s', aliases: ['cm/sec', 'cm/second'] },
  {
    unit: 'mm/1000',
    expression: 'mmPerThousand',
    aliases: ['mm/10^3', 'mm/103', 'mm/1000 cycles', 'mm/10^3 cycles'],
  },
  { unit: 'mPa·s', expression: 'mPa s', aliases: ['mPa.s', 'mPa s', 'mPas', 'mPa-s'] },
  { unit: 'P', expression: 'poise', aliases: ['poise', 'poises'] },
  { unit: 'cP', expression: 'centipoise', aliases: ['centipoise', 'cps'] },
  { unit: 's', expression: 's', aliases: ['sec', 'secs', 'second', 'seconds'] },
  { unit: 'min', expression: 'minute', aliases: ['minute', 'minutes', 'mins'] },
  { unit: 'h', expression: 'hour', aliases: ['hr', 'hrs', 'hour', 'hours'] },
  { unit: 'Hz', expression: 'Hz', aliases: ['hertz', 'cycles/s'] },
  { unit: 'gyrations', expression: 'gyration', aliases: ['gyration', 'gyr', 'gyr.', 'revolutions'] },
  { unit: 'passes', expression: 'pass', aliases: ['pass', 'wheel passes'] },
  { unit: 'cycles', expression: 'cycleCount', aliases: ['cycle', 'load cycles'] },
  { unit: 'blows', expression: 'blow', aliases: ['blow'] },
  {
    unit: 'million',
    expression: 'million',
    aliases: [
      'millions',
      '10^6',
      'x10^6',
      '10^6 esals',
      '10^6 esal',
      'million esal',
      'million esals',
      'mesal',
      'mesals',
      'msa',
      'x 10^6',
    ],
  },
  { unit: 'thousand', expression: 'thousand', aliases: ['thousands', '10^3', 'x10^3'] },
  { unit: 'count', expression: 'count', aliases: ['esal', 'esals', 'number', 'no. of axles'] },
];

/**
 * What the library lacks. Percent, ratio and the counts are base quantities of their own, so that a
 * percentage never turns into a fraction, nor passes into cycles, by a conversion.
 * Poise: 0.1 Pa·s; ksi and microinch from the inch and pound; kilogram-force with standard gravity
 * 9.80665 m/s² (NIST SP 811, 2008, appendix B.8).
 */
export const unitDefinitions = {
  baseQuantities: [
    'PERCENT_OF',
    'RATIO_OF',
    'STRAIN_OF',
    'NUMBER_OF',
    'GYRATIONS',
    'PASSES',
    'CYCLES',
    'BLOWS',
  ],
  units: {
    percent: { quantity: 'PERCENT_OF', value: 1 },
    ratio: { quantity: 'RATIO_OF', value: 1 },
    strain: { quantity: 'STRAIN_OF', value: 1 },
    microstrain: '1e-6 strain',
    percentStrain: '0.01 strain',
    count: { quantity: 'NUMBER_OF', value: 1 },
    thousand: '1e3 count',
    million: '1e6 count',
    gyration: { quantity: 'GYRATIONS', value: 1 },
    pass: { quantity: 'PASSES', value: 1 },
    cycleCount: { quantity: 'CYCLES', value: 1 },
    blow: { quantity: 'BLOWS', value: 1 },
    ksi: '1000 psi',
    microinch: '1e-6 in',
    hundredthInch: '0.01 in',
    quarterMillimetre: '0.25 mm',
    penetrationUnit: '0.1 mm',
    kilogramForce: '9.80665 N',
    permeabilityUnit: '1e-5 cm/s',
    mmPerThousand: '0.001 mm',
    poise: '0.1 Pa s',
    centipoise: '0.001 Pa s',
  },
};
