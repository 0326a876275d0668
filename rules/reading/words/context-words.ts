/** What a title, a sheet's name or a neighbouring heading says about the kind of test that stands there. */
export type Domain =
  | 'aggregate'
  | 'mix'
  | 'binder'
  | 'moisture'
  | 'recycled'
  | 'gradation'
  | 'hamburg'
  | 'loaded-wheel'
  | 'disk'
  | 'cracking'
  | 'modulus'
  | 'creep'
  | 'marshall'
  | 'maximum-gravity'
  | 'aggregate-gravity'
  | 'field';

export const domainWords: Record<Domain, string> = {
  aggregate: `aggregate | aggregates | stockpile | stockpiles | consensus | consensus properties | source properties | aggregate properties | coarse aggregate | fine aggregate | Gesteinskornung | Gesteinskornungen | granulat | granulats | agregado | agregados | arido | aridos | aggregate quality | cold feed`,
  mix: `mix | mixture | volumetrics | volumetric | trial mixes | trial mix | trials | mix design | compacted | bulk specific gravity of compacted | SGC | gyratory | Marshall | HMA | mix properties | mixture properties | Asphaltmischgut | Mischgut | enrobe | mezcla | mezcla asfaltica | Probekorper | specimens | volumetrie | volumetria | Volumetrie |
    compacted specimens | trial blends | volumetric properties | melange | optimum | design mix | voids analysis`,
  binder: `binder | asphalt binder | binder properties | binder tests | binder test | Bindemittel | bitume | liant | ligante | betun | bitumen | DSR | BBR | RTFO | PAV | performance grade | MSCR`,
  moisture: `TSR | moisture | moisture susceptibility | moisture damage | moisture sensitivity | T 283 | tensile strength ratio | ITSR | Wasserempfindlichkeit | sensibilite a l'eau | sensibilidad al agua | tenue a l'eau | susceptibilidad a la humedad | stripping`,
  recycled: `RAP | RAS | recycled | reclaimed | recycled materials | reclaimed material | shingles | Asphaltgranulat | agregats d'enrobes | material reciclado`,
  gradation: `gradation | gradations | sieve analysis | sieve | grading | particle size | Sieblinie | Siebanalyse | Kornverteilung | Korngrossenverteilung | granulometrie | analyse granulometrique | courbe granulometrique | granulometria | analisis granulometrico | curva granulometrica | combined gradation | washed gradation`,
  hamburg: `Hamburg | HWT | HWTT | HWTD | wheel tracking | wheel track | Spurbildung | ornierage | ahuellamiento | rutting`,
  'loaded-wheel': `APA | asphalt pavement analyzer | loaded wheel tester | loaded wheel`,
  disk: `DCT | DC(T) | disk-shaped compact tension | disk shaped`,
  cracking: `cracking | IDEAL-CT | IDEAL CT | I-FIT | IFIT | SCB | semi-circular bend | fissuration | agrietamiento | Rissbildung`,
  modulus: `dynamic modulus | E* | |E*| | AMPT | modulus | complex modulus | module complexe | modulo dinamico`,
  creep: `creep | creep compliance | Kriechen | Kriechversuch | fluage | fluencia lenta | creep test | IDT creep | Kriechnachgiebigkeit`,
  marshall: `Marshall | stability and flow | Marshall test`,
  'maximum-gravity': `pycnometer | flask | vacuum | rice test | Gmm worksheet | Gmm determination | Rice | theoretical maximum | maximum specific gravity | T 209 | D2041 | Pyknometer | pycnometre | picnometro | Rohdichte des Asphaltmischguts | MVR | maximum theoretical specific gravity | gravedad especifica maxima | Gmm`,
  'aggregate-gravity': `aggregate gravity | aggregate specific gravity | T 84 | T 85 | C127 | C128 | specific gravity and absorption | specific gravity of aggregate | specific gravity of coarse aggregate | specific gravity of fine aggregate | coarse aggregate specific gravity | fine aggregate specific gravity | gravity and absorption |
    peso especifico y absorcion | gravedad especifica y absorcion | Rohdichte der Gesteinskornung`,
  field: `field | cores | core | roadway | in-place | in place | pavement cores | Bohrkerne | carottes | testigos | density cores`,
};

/** Where one heading may mean several quantities, the kinds of test that speak for each. */
export const domainsOfQuantity: Record<string, Domain[]> = {
  'bulk-specific-gravity-aggregate': ['aggregate', 'aggregate-gravity'],
  'bulk-specific-gravity-mix': ['mix', 'marshall', 'moisture'],
  'apparent-specific-gravity-aggregate': ['aggregate', 'aggregate-gravity'],
  'water-absorption': ['aggregate', 'aggregate-gravity'],
  'specimen-absorption': ['mix', 'marshall'],
  'wheel-track-rut-depth': ['hamburg'],
  'loaded-wheel-rut-depth': ['loaded-wheel'],
  'fracture-energy': ['cracking'],
  'disk-fracture-energy': ['disk'],
  'binder-phase-angle': ['binder'],
  'mix-phase-angle': ['modulus'],
  'rap-binder-content': ['recycled'],
  'rap-moisture': ['recycled'],
  'mix-moisture': ['mix', 'field'],
  'low-temperature-tensile-strength': ['creep'],
  'maximum-density-mix': ['maximum-gravity'],
  'bulk-density-mix': ['mix', 'marshall'],
};
