/** How laboratories name composition, voids and masses, beside the registry's own aliases. Common practice, no source. */
export const volumetricWords: Record<string, string> = {
  'binder-content': `Pb | AC | asphalt content | asphalt cement content | asphalt cement | binder content | binder | asphalt binder content |
    total asphalt content | total binder content | total AC | AC content | % binder | % asphalt | % AC | binder % | asphalt % |
    bitumen content | bitumen | optimum asphalt content | optimum AC | optimum AC content | optimum binder | optimum bitumen content |
    optimum Pb | design AC | design AC content | design asphalt content | design Pb | JMF AC | JMF asphalt content | OAC | AC by mass of mix |
    binder content by mass of mix | asphalt content by weight of mix | asphalt content by total weight of mix | binder by mass |
    Bindemittelgehalt | Bitumengehalt | Bindemittel | Bitumenanteil | optimaler Bindemittelgehalt | Bindemittelgehalt optimal |
    teneur en liant | teneur en bitume | dosage en liant | dosage en bitume | teneur en liant optimale | liant | bitume | teneur en liant interieure |
    contenido de asfalto | contenido de ligante | contenido de betun | contenido optimo de asfalto | contenido optimo de ligante |
    optimo de asfalto | asfalto | ligante | % asfalto | % ligante | porcentaje de asfalto | porcentaje de ligante | ligante sobre mezcla`,
  'maximum-specific-gravity': `Gmm | Rice | Rice SG | Rice specific gravity | Rice gravity | max specific gravity | max SG | max sp gr |
    maximum sp gr | theoretical max specific gravity | theoretical maximum SG | theoretical max SG | max theoretical specific gravity |
    maximum theoretical specific gravity | maximum specific gravity of mix | max theo SG | MTSG | TMSG | theoretical max gravity |
    maximum specific gravity Rice | maximale Rohdichte relativ | gravedad especifica maxima | gravedad maxima teorica | peso especifico maximo |
    gravedad especifica teorica maxima | gravedad especifica maxima teorica | densite maximale relative | densite relative maximale`,
  'bulk-specific-gravity-mix': `Gmb | bulk | bulk specific gravity | bulk SG | bulk sp gr | bulk specific gravity of mix |
    bulk specific gravity compacted mix | bulk specific gravity of compacted mixture | bulk specific gravity of specimen | compacted bulk SG |
    specimen bulk specific gravity | mix bulk specific gravity | specimen SG | Gmb measured | Gmb corrected |
    gravedad especifica bulk | gravedad especifica bruta | gravedad bulk | gravedad especifica aparente de la mezcla |
    gravedad especifica bulk de la mezcla | densite relative apparente | Raumdichte relativ`,
  'air-voids': `Va | Pa | AV | VTM | air voids | voids | air void | voids in total mix | voids total mix | total voids | air void content |
    percent air voids | voids in mix | air voids content | Vm | VIM | voids in mixture | mix voids | air voids in compacted mix |
    Hohlraumgehalt | Hohlraum | Hohlraumgehalt des Probekorpers | Hohlraumgehalt am Marshall Probekorper |
    teneur en vides | vides | pourcentage de vides | vides d'air | vides residuels | porosite | % vides |
    vacios | vacios de aire | huecos | huecos en mezcla | huecos de aire | contenido de vacios | vacios con aire | vacios en la mezcla |
    contenido de huecos | porcentaje de vacios | % vacios | % huecos`,
  'voids-in-mineral-aggregate': `VMA | voids in mineral aggregate | voids mineral aggregate | voids in the mineral aggregate |
    fiktiver Hohlraumgehalt | fiktiver Hohlraumgehalt im Gesteinskornungsgemisch | Hohlraumgehalt im Mineralstoffgerust |
    vides intergranulaires | vides dans l'agregat mineral | vides du squelette mineral | vides dans le granulat mineral | VAM |
    vacios en el agregado mineral | huecos en aridos | huecos en el arido | vacios agregado mineral | huecos en aridos HA`,
  'voids-filled-with-asphalt': `VFA | VFB | voids filled | voids filled with asphalt | voids filled with binder | voids filled with bitumen |
    voids filled asphalt | voids filled w/ asphalt | filled voids | Hohlraumausfullungsgrad | Ausfullungsgrad | HFB |
    vides combles par le bitume | vides remplis de bitume | vides combles par le liant | vides remplis par le liant | degre de remplissage |
    vacios llenos de asfalto | vacios llenados con asfalto | huecos rellenos | huecos rellenos de ligante | huecos rellenos con ligante |
    vacios rellenos de asfalto | vacios llenos con asfalto`,
  'absorbed-binder': `Pba | absorbed asphalt | absorbed binder | absorbed AC | asphalt absorption | binder absorption | absorbed asphalt content |
    absorbiertes Bindemittel | liant absorbe | bitume absorbe | asfalto absorbido | ligante absorbido`,
  'effective-binder-content': `Pbe | effective asphalt | effective asphalt content | effective AC | effective binder | effective binder content |
    eff AC | effective AC content | eff binder | effektiver Bindemittelgehalt | wirksamer Bindemittelgehalt | liant effectif |
    teneur en liant effectif | teneur en liant effective | asfalto efectivo | contenido de asfalto efectivo | ligante efectivo |
    contenido de ligante efectivo`,
  'effective-binder-volume': `Vbe | volume of effective binder | effective binder volume | effective asphalt volume | volume effective asphalt |
    effective binder by volume | volume of effective asphalt | effektives Bindemittelvolumen | volume de liant effectif |
    volumen de asfalto efectivo | volumen de ligante efectivo`,
  'dust-proportion': `DP | D/B | F/A | dust proportion | dust ratio | dust to binder | dust/binder | dust to binder ratio | dust to effective binder |
    dust to effective binder ratio | dust to effective asphalt | dust to asphalt | dust to asphalt ratio | dust/asphalt | dust/AC | dust to AC ratio |
    filler to binder | filler/binder ratio | filler/bitumen ratio | filler bitumen ratio | fines to effective asphalt | fines/effective asphalt |
    P200/Pbe | dust/Pbe | dust to Pbe | fines/Pbe | P0.075/Pbe | P075/Pbe | -200/Pbe | Fuller Bindemittel Verhaltnis | Fuller/Bindemittel | rapport filler/liant | rapport fines/bitume |
    rapport filler/bitume | relacion polvo/asfalto | relacion filler/ligante | relacion polvo asfalto efectivo | relacion filler/betun | polvo/asfalto |
    proporcion de polvo`,
  'film-thickness': `AFT | film thickness | apparent film thickness | binder film thickness | asphalt film thickness | avg film thickness |
    average film thickness | Bindemittelfilmdicke | Filmdicke | epaisseur du film de liant | epaisseur de film | espesor de pelicula |
    espesor de pelicula de asfalto | espesor de pelicula de ligante`,
  'design-air-voids': `design air voids | target air voids | target voids | design voids | target Va | design Va | air voids target |
    Zielhohlraumgehalt | teneur en vides visee | vacios de diseno`,
  draindown: `draindown | drain down | binder draindown | asphalt draindown | Ablaufen des Bindemittels | Ablauftest | ecoulement du liant | egouttage |
    escurrimiento | escurrimiento de ligante`,
  'relative-density': `% Gmm | %Gmm | % of Gmm | percent Gmm | percent of Gmm | relative density | density at N | % Gmm at N | % of maximum specific gravity |
    % max density | % compaction at N | Verdichtungsgrad bei N | compacite | densite relative au maximum | compacite giratoire | % de Gmm | densidad relativa`,
  'field-density': `field density | % density | density % | density | in place density % | in-place density | in place density | core density | roadway density | mat density | pavement density |
    percent compaction | % compaction | degree of compaction | Verdichtungsgrad | taux de compactage | compacite en place |
    grado de compactacion | porcentaje de compactacion | compactacion`,
  'in-place-air-voids': `in-place air voids | in place air voids | in-place voids | field air voids | roadway air voids | core air voids |
    Hohlraumgehalt der Schicht | vides en place | vacios en sitio | huecos en obra`,
  'gyrations-initial': `Nini | Ninit | N inicial | N initial | Ninitial | N initial | N ini | initial gyrations | initial number of gyrations | giros iniciales | girations initiales | Anfangsdrehzahl`,
  'gyrations-design': `Ndes | Ndesign | N diseno | N de diseno | N projet | N design | N des | design gyrations | number of gyrations | gyrations | design number of gyrations | gyration level | design gyration level |
    gyratory level | giros de diseno | numero de giros | nombre de girations | girations | Gyrationen | Anzahl Gyrationen | Drehungen | Umdrehungen`,
  'gyrations-maximum': `Nmax | Nmaximum | N maximo | N maximal | N maximum | N max | maximum gyrations | max gyrations | maximum number of gyrations | giros maximos | girations maximales`,
  'mixing-temperature': `mixing temperature | mix temp | mixing temp | lab mix temp | lab mixing temp | mix temperature | mixing temp | lab mixing temperature | laboratory mixing temperature | plant mixing temperature |
    mixing temp range | Mischtemperatur | temperature de malaxage | temperature de fabrication | temperature d'enrobage | temperatura de mezclado | temperatura de mezcla`,
  'compaction-temperature': `compaction temperature | comp temp | lab compaction temp | compact temp | compaction temp | lab compaction temperature | laboratory compaction temperature | compacting temperature |
    Verdichtungstemperatur | temperature de compactage | temperatura de compactacion`,
  'lift-thickness': `lift thickness | layer thickness | course thickness | compacted lift thickness | compacted thickness | Schichtdicke | Einbaudicke |
    epaisseur de couche | epaisseur de la couche | espesor de capa`,
  'mass-in-air': `dry mass | wt air | W air | weight air | mass air | air wt | wt dry | weight in air dry | dry weight in air | specimen weight in air | weight of specimen in air | mass in air | dry weight | weight in air | wt in air | dry mass in air | mass dry | weight dry | dry wt | mass in air dry | air mass | air weight |
    dry in air | dry specimen mass | mass of dry specimen | mass of dry specimen in air | weight of dry specimen | dry wt in air | weight dry in air | W dry |
    mass A | A dry | Trockenmasse | Masse trocken | Masse an Luft | Masse in Luft | Trockengewicht | Gewicht an der Luft | Masse der trockenen Probe | masse seche | masse dans l'air |
    masse a l'air | poids sec | poids dans l'air | masse seche dans l'air | masa seca | masa en aire | masa en el aire | peso seco | peso en aire | peso en el aire |
    peso seco en aire | masa seca en el aire`,
  'mass-saturated-surface-dry': `SSD mass | W SSD | wt SSD | SSD wt in air | weight SSD | surface dry wt | SSD weight in air | SSD weight | SSD | mass SSD | SSD wt | wt SSD | saturated surface dry | saturated surface dry mass | saturated surface-dry mass |
    saturated surface dry weight | surface dry mass | surface dry weight | weight SSD in air | mass of SSD specimen | SSD mass in air | SSD in air | W SSD | mass B | B SSD |
    Masse wassergesattigt | Masse oberflachentrocken | wassergesattigte Masse | Masse SSD | gesattigt oberflachentrocken | masse saturee surface seche |
    masse SSS | masse saturee superficiellement seche | poids SSS | masse saturee | masa saturada superficie seca | masa sss | peso sss | peso saturado superficialmente seco |
    masa saturada superficialmente seca | peso saturado superficie seca | peso saturado | masa saturada`,
  'mass-in-water': `mass in water | wt water | W water | weight water | mass water | water wt | specimen weight in water | wt submerged | wt sub | weight sub | weight in water | wt in water | submerged mass | submerged weight | immersed mass | immersed weight | mass submerged | weight submerged |
    submerged | submerged wt | mass of specimen in water | weight of specimen in water | W water | mass C | C water |
    Masse unter Wasser | Masse in Wasser | Gewicht unter Wasser | Unterwassergewicht | Unterwassermasse | Tauchmasse | masse dans l'eau | masse immergee | poids immerge | poids dans l'eau |
    masse hydrostatique | masa sumergida | masa en agua | peso sumergido | peso en agua | peso en el agua | masa en el agua`,
  'specimen-absorption': `specimen absorption | abs | abs % | specimen water absorption | water absorbed | % water absorbed | % water absorbed by volume | absorption | water absorption | absorption by volume |
    Wasseraufnahme | absorption d'eau | absorcion | absorcion de agua`,
  'bulk-density-mix': `unit weight | mix density | bulk density | mix unit weight | compacted density | density of mix | specimen density | lab density | laboratory density | bulk density of mix |
    density of compacted mix | Raumdichte | Raumdichte am Probekorper | Raumdichte des Probekorpers | Marshall Raumdichte | density | masse volumique apparente | MVA | densite apparente | masse volumique |
    densidad aparente | densidad bulk | densidad | peso unitario | peso especifico aparente | densidad de la mezcla | densidad aparente de la mezcla`,
  'maximum-density-mix': `maximum density | theoretical maximum density | max density | Rice density | theoretical max density | maximum theoretical density | density |
    max theoretical density | TMD | MTD | Rohdichte | Rohdichte des Mischguts | Asphaltrohdichte | maximale Rohdichte | masse volumique reelle | MVR | masse volumique maximale | densite maximale |
    densite maximale theorique | densidad maxima | densidad maxima teorica | densidad Rice`,
  'specimen-height': `height | specimen height | sample height | height at N | gyratory height | Hohe | Probenhohe | Probekorperhohe | hauteur | hauteur eprouvette | hauteur de l'eprouvette | altura | altura de la probeta`,
  'specimen-diameter': `diameter | dia | specimen diameter | sample diameter | Durchmesser | Probendurchmesser | diametre | diametre eprouvette | diametro | diametro de la probeta`,
  'specimen-thickness': `thickness | specimen thickness | sample thickness | Dicke | Probendicke | epaisseur | epaisseur eprouvette | espesor | espesor de la probeta`,
};
