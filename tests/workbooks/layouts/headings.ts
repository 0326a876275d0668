/** Headings as laboratories of four countries write them. */
export interface Headings {
  nominal: string;
  traffic: string;
  course: string;
  grade: string;
  courses: Record<'surface' | 'intermediate' | 'base', string>;
  gb: string;
  nIni: string;
  nDes: string;
  nMax: string;
  mixing: string;
  compaction: string;
  pb: string;
  optimum: string;
  gmm: string;
  gmb: string;
  va: string;
  vma: string;
  vfa: string;
  dust: string;
  pbe: string;
  gse: string;
  gsb: string;
  gsa: string;
  absorption: string;
  share: string;
  sieve: string;
  passing: string;
  retained: string;
  cumulative: string;
  blend: string;
  jmf: string;
  trial: string;
  specimen: string;
  stockpile: string;
  air: string;
  ssd: string;
  water: string;
  height: string;
  average: string;
  deviation: string;
  minimum: string;
  maximum: string;
  limits: string;
  property: string;
  result: string;
  unit: string;
  remarks: string;
  total: string;
  faces1: string;
  faces2: string;
  faa: string;
  flat: string;
  sand: string;
  abrasion: string;
  soundness: string;
  thickness: string;
  diameter: string;
  load: string;
  saturation: string;
  strength: string;
  dry: string;
  wet: string;
  tsr: string;
  rut: string;
  sip: string;
  temperature: string;
  passes: string;
  ct: string;
  fi: string;
  flowNumber: string;
  compliance: string;
  time: string;
}

export const english: Headings = {
  nominal: 'Nominal maximum aggregate size',
  traffic: 'Design traffic',
  course: 'Course',
  grade: 'Binder grade',
  courses: { surface: 'Surface', intermediate: 'Intermediate', base: 'Base' },
  gb: 'Specific gravity of binder, Gb',
  nIni: 'Ninitial',
  nDes: 'Ndesign',
  nMax: 'Nmaximum',
  mixing: 'Mixing temperature',
  compaction: 'Compaction temperature',
  pb: 'Asphalt content',
  optimum: 'Optimum asphalt content',
  gmm: 'Gmm',
  gmb: 'Gmb',
  va: 'Air voids',
  vma: 'VMA',
  vfa: 'VFA',
  dust: 'Dust to binder ratio',
  pbe: 'Effective binder content',
  gse: 'Gse',
  gsb: 'Gsb',
  gsa: 'Gsa',
  absorption: 'Water absorption',
  share: 'Percent used',
  sieve: 'Sieve size',
  passing: '% Passing',
  retained: '% Retained',
  cumulative: 'Cumulative % retained',
  blend: 'Combined',
  jmf: 'JMF',
  trial: 'Trial',
  specimen: 'Specimen',
  stockpile: 'Stockpile',
  air: 'Mass in air',
  ssd: 'SSD mass',
  water: 'Mass in water',
  height: 'Height',
  average: 'Average',
  deviation: 'Std. dev.',
  minimum: 'Min',
  maximum: 'Max',
  limits: 'Specification',
  property: 'Property',
  result: 'Result',
  unit: 'Unit',
  remarks: 'Remarks',
  total: 'Total',
  faces1: 'Fractured faces, one or more',
  faces2: 'Fractured faces, two or more',
  faa: 'Fine aggregate angularity',
  flat: 'Flat and elongated 5:1',
  sand: 'Sand equivalent',
  abrasion: 'Los Angeles abrasion',
  soundness: 'Sodium sulfate soundness',
  thickness: 'Thickness',
  diameter: 'Diameter',
  load: 'Maximum load',
  saturation: 'Degree of saturation',
  strength: 'Tensile strength',
  dry: 'Dry subset',
  wet: 'Conditioned subset',
  tsr: 'TSR',
  rut: 'Rut depth',
  sip: 'Stripping inflection point',
  temperature: 'Test temperature',
  passes: 'Number of passes',
  ct: 'CT index',
  fi: 'Flexibility index',
  flowNumber: 'Flow number',
  compliance: 'Creep compliance',
  time: 'Loading time',
};

export const englishAbbreviated: Headings = {
  ...english,
  nominal: 'NMAS',
  traffic: 'ESALs',
  course: 'Layer',
  grade: 'PG grade',
  gb: 'Gb',
  nIni: 'Nini',
  nDes: 'Ndes',
  nMax: 'Nmax',
  mixing: 'Mixing temp.',
  compaction: 'Compaction temp.',
  pb: 'Pb',
  optimum: 'Design AC',
  gmm: 'Max. Sp. Gr. (Rice)',
  gmb: 'Bulk Sp. Gr.',
  va: 'VTM',
  vfa: 'VFB',
  dust: 'D/B',
  pbe: 'Pbe',
  gse: 'Eff. SG',
  gsb: 'Bulk SG (dry)',
  gsa: 'Apparent SG',
  absorption: 'Absorption',
  share: 'Blend %',
  sieve: 'Sieve',
  passing: 'Passing',
  retained: 'Retained',
  cumulative: 'Cum. retained',
  blend: 'Blend',
  jmf: 'Job mix formula',
  specimen: 'Sample',
  stockpile: 'Aggregate',
  air: 'Dry wt.',
  ssd: 'SSD wt.',
  water: 'Submerged wt.',
  average: 'Avg.',
  deviation: 'StDev',
  limits: 'Spec',
  property: 'Test',
  total: 'Sum',
  faces1: 'CAA 1+ faces',
  faces2: 'CAA 2+ faces',
  faa: 'FAA',
  flat: 'F&E 5:1',
  sand: 'SE',
  abrasion: 'LA abrasion',
  soundness: 'Soundness (sodium)',
  thickness: 'Sample thickness',
  diameter: 'Dia.',
  load: 'Peak load',
  saturation: '% Saturation',
  strength: 'ITS',
  dry: 'Unconditioned',
  wet: 'Conditioned',
  tsr: 'Tensile strength ratio',
  rut: 'HWTT rut depth',
  sip: 'SIP',
  temperature: 'Temp.',
  passes: 'Passes',
  ct: 'CTindex',
  fi: 'I-FIT FI',
  flowNumber: 'FN',
  compliance: 'D(t) compliance',
  time: 'Time',
};

export const german: Headings = {
  nominal: 'Größtkorn',
  traffic: 'Verkehrsbelastung',
  course: 'Schicht',
  grade: 'Bindemittelsorte',
  courses: { surface: 'surface', intermediate: 'intermediate', base: 'base' },
  gb: 'Rohdichte des Bindemittels',
  nIni: 'Nini',
  nDes: 'Ndes',
  nMax: 'Nmax',
  mixing: 'Mischtemperatur',
  compaction: 'Verdichtungstemperatur',
  pb: 'Bindemittelgehalt',
  optimum: 'Optimaler Bindemittelgehalt',
  gmm: 'Gmm',
  gmb: 'Gmb',
  va: 'Hohlraumgehalt',
  vma: 'Fiktiver Hohlraumgehalt',
  vfa: 'Hohlraumausfüllungsgrad',
  dust: 'Füller/Bindemittel',
  pbe: 'Effektiver Bindemittelgehalt',
  gse: 'Gse',
  gsb: 'Gsb',
  gsa: 'Gsa',
  absorption: 'Wasseraufnahme',
  share: 'Anteil',
  sieve: 'Siebweite',
  passing: 'Siebdurchgang',
  retained: 'Siebrückstand',
  cumulative: 'Rückstand kumuliert',
  blend: 'Gemisch',
  jmf: 'Sollrezeptur',
  trial: 'Versuch',
  specimen: 'Probekörper',
  stockpile: 'Gesteinskörnung',
  air: 'Masse an Luft',
  ssd: 'Masse wassergesättigt',
  water: 'Masse unter Wasser',
  height: 'Höhe',
  average: 'Mittelwert',
  deviation: 'Standardabweichung',
  minimum: 'Mindestwert',
  maximum: 'Höchstwert',
  limits: 'Anforderung',
  property: 'Eigenschaft',
  result: 'Ergebnis',
  unit: 'Einheit',
  remarks: 'Bemerkungen',
  total: 'Summe',
  faces1: 'Bruchflächigkeit eine Fläche',
  faces2: 'Bruchflächigkeit zwei Flächen',
  faa: 'Kantigkeit feiner Gesteinskörnungen',
  flat: 'Plattige und längliche Körner 5:1',
  sand: 'Sandäquivalent',
  abrasion: 'Los-Angeles-Koeffizient',
  soundness: 'Sulfatbeständigkeit (Natrium)',
  thickness: 'Dicke',
  diameter: 'Durchmesser',
  load: 'Bruchlast',
  saturation: 'Sättigungsgrad',
  strength: 'Spaltzugfestigkeit',
  dry: 'trocken',
  wet: 'wassergelagert',
  tsr: 'ITSR',
  rut: 'Spurrinnentiefe',
  sip: 'Stripping inflection point',
  temperature: 'Prüftemperatur',
  passes: 'Überrollungen',
  ct: 'CT-Index',
  fi: 'Flexibilitätsindex',
  flowNumber: 'Flow Number',
  compliance: 'Kriechnachgiebigkeit',
  time: 'Belastungszeit',
};

export const french: Headings = {
  nominal: 'Dimension maximale nominale',
  traffic: 'Trafic',
  course: 'Couche',
  grade: 'Classe du liant',
  courses: { surface: 'surface', intermediate: 'intermediate', base: 'base' },
  gb: 'Densité du liant',
  nIni: 'Nini',
  nDes: 'Ndes',
  nMax: 'Nmax',
  mixing: 'Température de malaxage',
  compaction: 'Température de compactage',
  pb: 'Teneur en liant',
  optimum: 'Teneur en liant optimale',
  gmm: 'Gmm',
  gmb: 'Gmb',
  va: 'Teneur en vides',
  vma: "Vides dans l'agrégat minéral",
  vfa: 'Vides comblés par le bitume',
  dust: 'Rapport filler/liant',
  pbe: 'Teneur en liant effectif',
  gse: 'Gse',
  gsb: 'Gsb',
  gsa: 'Gsa',
  absorption: "Absorption d'eau",
  share: 'Dosage',
  sieve: 'Tamis',
  passing: 'Passant',
  retained: 'Refus',
  cumulative: 'Refus cumulé',
  blend: 'Mélange',
  jmf: 'Formule de travail',
  trial: 'Essai',
  specimen: 'Éprouvette',
  stockpile: 'Granulat',
  air: "Masse dans l'air",
  ssd: 'Masse saturée surface sèche',
  water: "Masse dans l'eau",
  height: 'Hauteur',
  average: 'Moyenne',
  deviation: 'Écart-type',
  minimum: 'Mini',
  maximum: 'Maxi',
  limits: 'Exigences',
  property: 'Caractéristique',
  result: 'Résultat',
  unit: 'Unité',
  remarks: 'Observations',
  total: 'Somme',
  faces1: 'Faces cassées 1',
  faces2: 'Faces cassées 2',
  faa: 'Angularité du sable',
  flat: 'Particules plates et allongées 5:1',
  sand: 'Équivalent de sable',
  abrasion: 'Coefficient Los Angeles',
  soundness: 'Résistance au sulfate (sodium)',
  thickness: 'Épaisseur',
  diameter: 'Diamètre',
  load: 'Charge maximale',
  saturation: 'Degré de saturation',
  strength: 'Résistance en traction indirecte',
  dry: 'À sec',
  wet: 'Après immersion',
  tsr: 'ITSR',
  rut: "Profondeur d'ornière",
  sip: "Point d'inflexion",
  temperature: "Température d'essai",
  passes: 'Nombre de passages',
  ct: 'CT index',
  fi: 'Indice de flexibilité',
  flowNumber: 'Flow number',
  compliance: 'Complaisance de fluage',
  time: 'Temps de charge',
};

export const spanish: Headings = {
  nominal: 'Tamaño máximo nominal',
  traffic: 'Tránsito de diseño',
  course: 'Capa',
  grade: 'Grado PG',
  courses: { surface: 'surface', intermediate: 'intermediate', base: 'base' },
  gb: 'Gravedad específica del asfalto',
  nIni: 'N inicial',
  nDes: 'N diseño',
  nMax: 'N máximo',
  mixing: 'Temperatura de mezclado',
  compaction: 'Temperatura de compactación',
  pb: 'Contenido de asfalto',
  optimum: 'Contenido óptimo de asfalto',
  gmm: 'Gravedad específica máxima teórica',
  gmb: 'Gravedad específica bulk de la mezcla',
  va: 'Vacíos de aire',
  vma: 'Vacíos en el agregado mineral',
  vfa: 'Vacíos llenos con asfalto',
  dust: 'Relación polvo/asfalto',
  pbe: 'Contenido de asfalto efectivo',
  gse: 'Gravedad específica efectiva',
  gsb: 'Gsb',
  gsa: 'Gsa',
  absorption: 'Absorción',
  share: 'Proporción',
  sieve: 'Tamiz',
  passing: '% que pasa',
  retained: '% retenido',
  cumulative: '% retenido acumulado',
  blend: 'Mezcla combinada',
  jmf: 'Fórmula de trabajo',
  trial: 'Ensayo',
  specimen: 'Probeta',
  stockpile: 'Agregado',
  air: 'Peso seco en aire',
  ssd: 'Peso saturado superficie seca',
  water: 'Peso sumergido',
  height: 'Altura',
  average: 'Promedio',
  deviation: 'Desviación estándar',
  minimum: 'Mínimo',
  maximum: 'Máximo',
  limits: 'Especificación',
  property: 'Propiedad',
  result: 'Resultado',
  unit: 'Unidad',
  remarks: 'Observaciones',
  total: 'Suma',
  faces1: 'Caras fracturadas, una o más',
  faces2: 'Caras fracturadas, dos o más',
  faa: 'Angularidad del agregado fino',
  flat: 'Partículas planas y alargadas 5:1',
  sand: 'Equivalente de arena',
  abrasion: 'Desgaste Los Ángeles',
  soundness: 'Pérdida en sulfato de sodio',
  thickness: 'Espesor',
  diameter: 'Diámetro',
  load: 'Carga máxima',
  saturation: 'Grado de saturación',
  strength: 'Resistencia a la tracción indirecta',
  dry: 'En seco',
  wet: 'Acondicionadas',
  tsr: 'Resistencia conservada',
  rut: 'Profundidad de ahuellamiento',
  sip: 'Punto de inflexión',
  temperature: 'Temperatura de ensayo',
  passes: 'Número de pasadas',
  ct: 'Índice CT',
  fi: 'Índice de flexibilidad',
  flowNumber: 'Número de flujo',
  compliance: 'Compliancia de fluencia',
  time: 'Tiempo de carga',
};
