/** How laboratories name aggregates, gradations and recycled materials. Common practice, no source. */
export const aggregateWords: Record<string, string> = {
  'percent-passing': `% passing | % pass | pass % | percent pass | Siebdurchgang M | tamisats cumules | % pasante | pasante % | passing | percent passing | total percent passing | cumulative % passing | % finer | percent finer | pct passing | passing %
    | Siebdurchgang | Durchgang | Siebdurchgang in M-% | passant | passants | tamisat | tamisats | % passant | % tamisat | cumule passant | passant cumule | pasa | pasante | que pasa | % pasa | % que pasa |
    porcentaje que pasa | porcentaje pasante | pasante acumulado`,
  'percent-retained': `% retained | % ret | ret % | % ind ret | ind ret | % retenido parcial | % retenu | retenu | retained | individual % retained | individual percent retained | ind % retained | individual retained | percent retained | fraction retained |
    Ruckstand | Siebruckstand | Einzelruckstand | refus | refus partiel | refus partiels | % refus | retenido | retenido parcial | % retenido | retenido individual | porcentaje retenido`,
  'cumulative-percent-retained': `cumulative % retained | cum % ret | % cum ret | cum ret | % ret acumulado | ret acumulado | % cumulative retained | cumulative ret | retained cum | % retained cum | cum % retained | cumulative retained | total % retained | total percent retained | cumulative percent retained | cum retained | % retained cumulative |
    retained cumulative | accumulated retained | Ruckstand kumuliert | kumulierter Ruckstand | Siebruckstand kumuliert | Ruckstandssumme | Summenruckstand | refus cumule | refus cumules | % refus cumule |
    retenido acumulado | % retenido acumulado | porcentaje retenido acumulado`,
  'stockpile-share': `blend % | % blend | stockpile % | proportion | proportions | bin percentage | bin % | blend proportion | blend proportions | share | cold feed % | % of blend | % in blend |
    percent used | % used | aggregate % | percent of total | percent of blend | blend percentage | percentage in blend | cold feed | mix % | percentage | stockpile percentage | stockpile share | aggregate proportion |
    Anteil | Zugabeanteil | Mischungsanteil | Gesteinsanteil | Dosierung | proportion du melange | pourcentage du melange | dosage | part | % melange | formule |
    proporcion | dosificacion | % en la mezcla | porcentaje en mezcla | participacion | % mezcla | porcentaje de la mezcla`,
  'bulk-specific-gravity-aggregate': `Gsb | bulk specific gravity | bulk SG | bulk sp gr | bulk specific gravity dry | bulk specific gravity OD | bulk SG dry | bulk dry SG | bulk dry specific gravity |
    bulk specific gravity of aggregate | aggregate bulk specific gravity | aggregate bulk SG | combined Gsb | blend Gsb | combined bulk specific gravity | Gsb combined | Gsb blend | bulk OD | oven dry bulk specific gravity | Gsb OD | Gsb dry |
    combined aggregate bulk specific gravity | aggregate Gsb | specific gravity bulk | bulk | OD specific gravity |
    Rohdichte der Gesteinskornung ofentrocken | densite relative des granulats | gravedad especifica bulk | gravedad especifica seca | gravedad especifica bulk seca | gravedad especifica bruta |
    gravedad especifica bulk del agregado | gravedad especifica del agregado | gravedad bulk`,
  'apparent-specific-gravity-aggregate': `Gsa | apparent specific gravity | apparent SG | apparent gravity | apparent sp gr | apparent | specific gravity apparent | apparent specific gravity of aggregate | combined Gsa |
    gravedad especifica aparente | gravedad aparente | scheinbare Dichte | densite relative apparente du granulat`,
  'saturated-surface-dry-specific-gravity-aggregate': `Gssd | bulk specific gravity SSD | SSD specific gravity | bulk SSD | bulk SG SSD | specific gravity SSD | SSD SG | gravedad especifica SSS | gravedad especifica bulk SSS`,
  'effective-specific-gravity-aggregate': `Gse | effective specific gravity | effective SG | effective gravity | eff SG | effective specific gravity of aggregate | gravedad especifica efectiva | gravedad efectiva | effektive Rohdichte |
    densite effective`,
  'water-absorption': `absorption | abs | abs % | Wasseraufn | water absorption | % absorption | aggregate absorption | aggregate water absorption | Wasseraufnahme | Wasseraufnahme WA24 | absorption d'eau | coefficient d'absorption d'eau | absorcion | absorcion de agua | WA24`,
  'coarse-aggregate-angularity-one-face': `CAA 1 face | 1 FF | 1+ FF | FF 1 | FF1 | 1 face | 1+ face | 1 or more FF | fractured faces 1 | CAA one face | CAA 1+ | CAA1 | one fractured face | 1 fractured face | fractured faces 1+ | 1+ fractured faces | one or more fractured faces | fractured faces one | CAA 1 | CAA 1+ faces | CAA 1 or more |
    fractured faces 1 face | coarse aggregate angularity 1 face | coarse aggregate angularity one face | coarse angularity 1 face | single fractured face | fractured faces one or more | fractured faces 1 or more | 1 or more fractured faces |
    coarse aggregate angularity 1+ | coarse aggregate angularity 1 or more | crushed faces 1+ | one crushed face | one face | caras fracturadas 1 | caras fracturadas una o mas | una cara fracturada | 1 cara fracturada |
    Bruchflachigkeit eine Flache | faces cassees 1 | une face cassee`,
  'coarse-aggregate-angularity-two-faces': `CAA 2 faces | 2 FF | 2+ FF | FF 2 | FF2 | 2 faces | 2+ faces | 2 or more FF | fractured faces 2 | CAA two faces | CAA 2+ | CAA2 | two fractured faces | 2 fractured faces | fractured faces 2+ | 2+ fractured faces | two or more fractured faces | fractured faces two | CAA 2 | CAA 2+ faces | CAA 2 or more |
    fractured faces 2 faces | coarse aggregate angularity 2 faces | coarse aggregate angularity two faces | coarse angularity 2 faces | fractured faces two or more | fractured faces 2 or more | 2 or more fractured faces |
    coarse aggregate angularity 2+ | coarse aggregate angularity 2 or more | crushed faces 2+ | two crushed faces | two faces | caras fracturadas 2 | caras fracturadas dos o mas | dos caras fracturadas | 2 caras fracturadas |
    Bruchflachigkeit zwei Flachen | faces cassees 2 | deux faces cassees`,
  'fine-aggregate-angularity': `FAA | fine aggregate angularity | uncompacted voids | uncompacted void content | fine angularity | uncompacted voids in fine aggregate | FAA uncompacted voids | Kantigkeit feiner Gesteinskornungen |
    Kantigkeit feine Gesteinskornung | angularite du sable | angularite des sables | angularite du granulat fin | angularidad del agregado fino | angularidad agregado fino | vacios no compactados`,
  'flat-and-elongated': `F&E | flat and elongated | flat & elongated | flat and elongated particles | flat elongated | flat elongated particles | flat or elongated | F and E | plattige und langliche Korner |
    particules plates et allongees | plates et allongees | particulas planas y alargadas | planas y alargadas | chatas y alargadas | particulas chatas y alargadas`,
  'sand-equivalent': `SE | sand equiv | sand eq | sand equivalent | sand equivalent value | clay content sand equivalent | Sandaquivalent | equivalent de sable | equivalente de arena`,
  'abrasion-loss': `LA abrasion | L.A. abrasion | Los Angeles abrasion | Los Angeles | LA | LAR | LA wear | L.A. wear | abrasion loss | abrasion | LA loss | Los Angeles wear | Los Angeles loss | LA abrasion loss | Los Angeles abrasion loss |
    Los-Angeles-Koeffizient | Los Angeles Koeffizient | coefficient Los Angeles | desgaste Los Angeles | abrasion Los Angeles | coeficiente Los Angeles | desgaste de Los Angeles`,
  'micro-deval-loss': `Micro-Deval | micro deval | micro deval loss | micro deval abrasion | microdeval | MDE | MD loss | Micro-Deval-Koeffizient | coefficient micro-Deval | coeficiente micro-Deval | desgaste micro deval`,
  'soundness-loss': `soundness | soundness loss | sulfate soundness | sulphate soundness | sulfate soundness loss | sodium sulfate soundness | magnesium sulfate soundness | sodium soundness | magnesium soundness |
    sodium sulfate loss | magnesium sulfate loss | Sulfatbestandigkeit | Magnesiumsulfatverfahren | Magnesiumsulfat-Wert | resistance au sulfate | essai au sulfate de magnesium | durabilidad | perdida en sulfato |
    perdida en sulfato de sodio | perdida en sulfato de magnesio | sanidad | desgaste al sulfato`,
  'deleterious-materials': `deleterious | deleterious materials | deleterious material | clay lumps | clay lumps and friable particles | clay lumps & friable | friable particles | Verunreinigungen | mottes d'argile |
    terrones de arcilla | terrones de arcilla y particulas friables | materiales deletereos`,
  'plasticity-index': `PI | plasticity index | plasticity | Plastizitatszahl | indice de plasticite | indice de plasticidad`,
  'natural-sand-content': `natural sand | % natural sand | natural sand content | Natursand | Natursandanteil | sable naturel | arena natural`,
  'polished-stone-value': `PSV | polished stone value | polish value | Polierwert | coefficient de polissage accelere | CPA | coeficiente de pulimento acelerado`,
  'methylene-blue-value': `methylene blue | methylene blue value | MBV | MB value | Methylenblauwert | Methylenblau-Wert | bleu de methylene | valeur au bleu | azul de metileno`,
  'insoluble-residue': `insoluble residue | acid insoluble residue | acid insoluble | residuo insoluble | residu insoluble`,
  'rigden-voids': `Rigden voids | dry compacted voids | Rigden | Hohlraumgehalt nach Rigden | vides Rigden`,
  'light-particles': `lightweight pieces | lightweight particles | light particles | light weight pieces | leichtgewichtige Verunreinigungen | particulas ligeras`,
  'mineral-filler-content': `mineral filler | mineral filler content | baghouse fines | filler content | Fulleranteil | contenido de filler`,
  'filler-specific-gravity': `filler gravity | filler specific gravity | specific gravity of filler | filler SG | mineral filler specific gravity`,
  'surface-area': `surface area | SA | aggregate surface area | specific surface | specific surface area | spezifische Oberflache | surface specifique | superficie especifica | area superficial`,
  'fineness-modulus': `FM | fineness modulus | fineness | Feinheitsmodul | module de finesse | modulo de finura`,
  'rap-content': `RAP | RAP % | % RAP | RAP content | RA content | reclaimed asphalt | reclaimed asphalt content | reclaimed asphalt pavement | RAP by mass of mix | RAP in mix | recycled asphalt pavement | RAP percentage | RAP by weight of mix |
    Asphaltgranulat | Asphaltgranulatanteil | Anteil Asphaltgranulat | Zugabe Asphaltgranulat | agregats d'enrobes | taux d'agregats d'enrobes | taux AE | contenido de RAP | RAP en la mezcla | porcentaje de RAP`,
  'rap-binder-content': `RAP binder content | RAP binder | RAP AC | RAP AC content | RAP asphalt content | binder in RAP | AC in RAP | asphalt content of RAP | binder content of RAP | RAP Pb | Pb RAP | Pb of RAP | Bindemittelgehalt Asphaltgranulat |
    teneur en liant des agregats d'enrobes | contenido de asfalto del RAP | contenido de ligante del RAP`,
  'ras-content': `RAS | RAS % | % RAS | RAS content | shingle content | shingles | RAS by mass of mix | RAS percentage`,
  'ras-binder-content': `RAS binder content | RAS binder | RAS AC | RAS asphalt content | binder in RAS | AC in RAS | binder content of RAS | Pb RAS`,
  'recycled-binder-ratio': `RBR | ABR | recycled binder ratio | RAP binder ratio | binder replacement | asphalt binder replacement | reclaimed binder ratio | recycled binder`,
  'rap-maximum-specific-gravity': `RAP Gmm | Gmm RAP | Gmm of RAP | RAP maximum specific gravity | RAP Rice`,
  'rap-moisture': `RAP moisture | moisture | moisture content | RAP moisture content | moisture of RAP`,
  'recycling-agent-content': `recycling agent | rejuvenator | rejuvenator dosage | recycling agent content | rejuvenator content`,
  'crumb-rubber-content': `crumb rubber | GTR | ground tire rubber | crumb rubber content | rubber content`,
  'fibre-content': `fiber content | fibre content | fibers | fibres | cellulose fiber | cellulose fibre | Faseranteil | Faserstoffgehalt | teneur en fibres | contenido de fibras`,
  'lime-content': `hydrated lime | lime | lime content | hydrated lime content | cal hidratada | chaux hydratee | Kalkhydrat`,
  'warm-mix-additive-content': `WMA additive | warm mix additive | WMA additive content | warm mix additive dosage | WMA dosage`,
  'foaming-water-content': `foaming water | foaming water content`,
};
