/**
 * Headings as laboratories write them on worksheets, written down before the reader was tried on them. Common practice, no
 * source; written with ` · ` between them, since a bar is a part of some.
 */
export const headingCases: Record<string, string> = {
  'binder-content': `Pb, % · Pb (%) · AC % · AC (%) · A.C. % · A.C., % · % A.C. · Asph. content, % · Asphalt Cont. (%) · Asph. Cont. · Bit. content · Bit. cont. % m/m · Binder cont. (%) ·
    Binder Cont., % by mass of mix · Total binder, % · Asphalt Binder, % · Asphalt Binder (% of mix) · Asphalt binder content (Pb), % · Total AC (%) · %AC · % Pb · Pb% · Pb tot · Total Pb ·
    Percent asphalt · Percent binder · Percent AC · asphalt content by ignition · AC by ignition · Ignition AC · AC content (ignition oven), % · soluble binder content ·
    Extracted binder content · Asphalt Content (AASHTO T 308) · AC content, % by wt. of mix · Bindemittelgehalt [M.-%] · Bindemittelgehalt B [M.-%] · Bindem.-Gehalt · Bindemittelgeh. ·
    BM-Gehalt · B-Gehalt M.-% · Bitumengeh. (M.-%) · BG [M.-%] · löslicher Bindemittelgehalt · Gesamtbindemittelgehalt · Bindemittelgehalt gesamt · Bindemittelmenge · Teneur en liant (%) ·
    teneur liant % · Teneur en liant intérieure (%) · TL int. (%) · TLint · % liant · % bitume · % de liant · Liant total (%) · Teneur en bitume, % · Dosage bitume ·
    Contenido de ligante (% s/m) · % betún · % de betún · Cont. de asfalto · Cont. ligante (%) · Porcentaje de betún · % C.A. · C.A. (%) · Contenido de C.A. ·
    Contenido de cemento asfáltico · cemento asfáltico (%) · % de asfalto · Ligante (% s/mezcla)`,
  'maximum-specific-gravity': `Gmm · Gmm (Rice) · Rice Gmm · Max. Specific Gravity (Gmm) · Max SG Gmm · Max. Theor. S.G. · Theor. Max. Sp. Gr. · Theoretical Max. Specific Gravity, Gmm · Maximum Theoretical Sp. Gr. ·
    TMD SG · Rice S.G. · Rice sp. gr. · Rice value · Maximum Sp.Gr. · Max. Sp. Gr. (Rice) · Maximum SG · Max Theoretical Density (Gmm) · Mix Gmm · Theo. Max SG ·
    Theoretical maximum specific gravity of mix · Densidad máxima teórica Gmm · Peso específico máximo teórico · Gmm (Rice) · Gravedad esp. máx. · Grav. esp. teórica máxima (Gmm) ·
    Densité max théorique Gmm`,
  'maximum-density-mix': `Rohdichte [g/cm³] · Rohdichte ρm · ρm [Mg/m³] · Rohdichte Asphalt [g/cm³] · Rohdichte ρmv · Max. density ρm (Mg/m3) · Maximum density, ρmv · Rohdichte des Asphaltmischgutes [g/cm³] ·
    Rohdichte am Mischgut · Mischgutrohdichte · MVR (Mg/m³) · MVR ρmv · Masse vol. réelle · Masse volumique maximale (MVR) · Masse volumique réelle MVRe · Densidad máxima (kg/m³) ·
    Dens. máx. teórica (kg/m3) · Densidad máxima de la mezcla · Max. theoretical density (kg/m³) · Theor. max. density, lb/ft³ · Rice density (pcf) · TMD (pcf)`,
  'bulk-specific-gravity-mix': `Gmb · Gmb, measured · Bulk SG Gmb · Bulk Sp. Gr. (Gmb) · Bulk Spec. Grav. · Bulk specific gravity Gmb · Bulk S.G. of mix · B.S.G. · BSG · Bulk Sp Gr @ Ndes · Gmb @ Ndes ·
    Gmb at Ndesign · Specimen Gmb · Lab Gmb · Gmb lab · Compacted Gmb · Gmb (SSD) · Sp. Gr. bulk of compacted mix · Bulk Specific Gravity (AASHTO T 166) · Peso específico aparente Gmb ·
    Gravedad específica bulk (Gmb) · Grav. esp. bulk Gmb · Densidad relativa aparente Gmb`,
  'bulk-density-mix': `Bulk density ρb [Mg/m3] · Bulk density SSD · ρbssd [Mg/m³] · Raumdichte ρb [g/cm³] · Raumdichte SSD g/cm³ · RD Probekörper [g/cm³] · Raumdichte MPK · Raumdichte am MPK [g/cm³] ·
    MVA (Mg/m³) · MVa · Masse volumique app. · Masse vol. apparente (kg/m³) · Densidad aparente (g/cm³) · Densidad (kg/m³) · Dens. aparente probeta · Unit wt. (pcf) · Unit Weight, lb/ft3 ·
    Density, pcf · Bulk dens. (kg/m3) · Unit weight of mix · Densidad de la probeta`,
  'air-voids': `Va · Va (%) · Pa · Va, % · Air Voids (Va), % · Voids, % · AV (%) · A.V. % · % AV · % Voids · % Air Voids · % Air · Air Void · Air voids @ Ndes · Air Voids at Ndesign (%) · VTM ·
    V.T.M. · VIM (%) · Vm (%) · Vm [Vol.-%] · Voids in total mix (VTM), % · Pct Air Voids · Lab air voids · Lab Voids · Percent voids · Air V. · Air voids, Pa · air void content Vm [%] ·
    Voids content · Hohlraumgehalt V [Vol.-%] · Hohlraumgeh. · HR-Gehalt · Hohlraumgehalt MPK · Hohlraumgehalt am MPK [Vol.-%] · Hohlraumgehalt Vm · HRG · Hohlraum in Vol.-% ·
    Luftporengehalt · % de vides · Teneur en vides Vm (%) · Pourcentage de vides (%) · Vides (%) · % vides hydrostatique · Teneur en vides (géométrique) · Vides d'air · % huecos mezcla ·
    Huecos en mezcla Vm (%) · % de huecos · Vacíos totales (%) · Vacíos (Va) % · % Vacíos de aire · Vacíos de aire Va (%) · Huecos m. · Huecos en la mezcla · Vacíos en mezcla ·
    Va (vacíos)`,
  'voids-in-mineral-aggregate': `VMA · VMA, % · V.M.A. · % VMA · Voids in Min. Agg. · Voids in mineral aggregate VMA (%) · VMA @ Ndes · VMA (total) · Voids Min. Agg. · fiktiver Hohlraumgehalt [Vol.-%] ·
    fikt. Hohlraumgehalt · VMA [Vol.-%] · HMbit · VAM (%) · Huecos en áridos (%) · % Huecos áridos · Huecos en árido · Vacíos agregado mineral VAM · % VAM · V.A.M. ·
    Vides dans le squelette · Vides granulaires (VMA) · VIM granulats · Porosité intergranulaire · % huecos en áridos`,
  'voids-filled-with-asphalt': `VFA · VFA, % · V.F.A. · VFB (%) · % VFA · Voids filled (%) · Voids Filled w/ AC · Voids filled with AC · Voids filled with asph. · Voids Filled with Bitumen VFB · VFA @ Ndes ·
    Hohlraumausf.-grad · Hohlraumausfüllung · Hohlraumfüllungsgrad HFB [%] · Ausfüllungsgrad HFB · HFB [%] · Degré de remplissage % · % vides comblés · Vides comblés (VFB) ·
    Vides comblés par bitume · % huecos llenos · % de huecos rellenos · VFA (vacíos llenos) · Vacíos llenos de C.A. · V.F.A. (%) · Vacíos llenos con ligante · Huecos rellenos de betún ·
    % huecos rellenos de betún · Relleno de huecos · VFB`,
  'absorbed-binder': `Pba · Pba, % · Absorbed asphalt (Pba) · % AC absorbed · Asph. absorption · Abs. AC · Absorbed AC (%) · Asfalto absorbido Pba · ligante absorbido % · Bitume absorbé ·
    aufgesaugtes Bindemittel`,
  'effective-binder-content': `Pbe · Pbe (%) · Eff. AC · Eff. asphalt (Pbe), % · Effective AC, % · Effective Asphalt Content Pbe · Eff. binder content · Effective binder Pbe · Wirksames Bindemittel · Liant efficace ·
    Asfalto efectivo Pbe · Betún efectivo · C.A. efectivo`,
  'effective-binder-volume': `Vbe · Vbe, % · Effective binder volume, Vbe · Vol. eff. binder · Volume of effective binder (%)`,
  'dust-proportion': `D/P · Dust/Pbe · Dust Ratio · D/B ratio · Dust Prop. · Dust-to-binder ratio · Dust to Eff. AC · Dust / Asphalt · F/A ratio · Dust Proportion (P200/Pbe) · P200/Pbe · DP ratio ·
    P0.075/Pbe · Dust:Binder · Fines to asphalt ratio · F/B · Filler-Bitumen-Verhältnis · Füller/Bitumen · Füller-Bindemittel-Verhältnis · Rapport filler-bitume · Relación filler-betún ·
    Relación filler/betún · Relación polvo-asfalto · filler/betún · Polvo/Pbe · Rel. filler/betún · Dust/binder ratio (DP)`,
  'film-thickness': `AFT (µm) · Film Thick. · Film thickness, microns · AFT, microns · Bindemittelfilmdicke [µm] · Épaisseur de film (µm) · Espesor de película (µm) · Asphalt film thickness (µm)`,
  'effective-specific-gravity-aggregate': `Gse · Gse (eff.) · Eff. Sp. Gr. · Eff. S.G. agg. · Effective SG of aggregate Gse · Eff. specific gravity · Gravedad específica efectiva Gse · Gse agregado`,
  'bulk-specific-gravity-aggregate': `Gsb · Gsb (dry) · Bulk Dry S.G. · Bulk SpG · Agg. bulk SG · Bulk (dry) sp. gr. · Aggregate Gsb · Gsb, combined · Comb. Gsb · Bulk S.G. (OD) · Bulk SG (oven-dry) · Blended Gsb ·
    Gsb of blend · OD sp. gr. · Dry bulk SG · Gravedad esp. bulk seca · Peso específico bulk (seco) Gsb`,
  'apparent-specific-gravity-aggregate': `Gsa · Apparent S.G. · App. SG · App. Sp. Gr. · Apparent SpG · Gravedad esp. aparente (Gsa) · apparent specific gravity (Gsa)`,
  'water-absorption': `Absorption, % · Water Abs. · Water abs. (%) · Abs., % · Absorption (%) · Wasseraufnahme WA24 [M.-%] · WA₂₄ (%) · Absorption d'eau (%) · Coef. d'absorption d'eau WA24 · Absorción (%) ·
    Absorción de agua % · WA24 · Water absorption WA24`,
  'percent-passing': `% Pass. · % Pass · Pass. % · Passing (%) · % Passing (total) · Tot. % pass · Cum. % passing · Percent finer by weight · Perc. passing · Durchgang [M.-%] · Siebdurchgang in % ·
    D [M.-%] · % passants · Passant (%) · Passants cumulés (%) · Tamisats (%) · Tamisât cumulé (%) · % pasa · Pasa (%) · % que pasa · Pasa acumulado (%) · % pasante acumulado ·
    % Acum. pasa · Passing %`,
  'percent-retained': `% Ret. · % Retained (ind.) · Ind. % ret. · Individual % ret. · Retained on sieve % · % Retained on each · Rückstand [M.-%] · Einzelrückstand % · Refus partiel (%) · Refus partiels % ·
    % Retenido parcial · % ret. parcial · Retenido (%) · % retenido individual`,
  'cumulative-percent-retained': `Cum. % Ret. · Cum % retained · Cum. Ret. (%) · % Cum. Retained · Cumul. % ret · Rückstand kumul. [M.-%] · Summe Rückstand % · Refus cumulés (%) · Refus cumulé % · % Ret. acum. ·
    % Retenido acum. · Retenido acumulado (%) · Ret. acum. %`,
  'stockpile-share': `% used · Blend % · Blend Pct · Blend, % · Percent in Blend · Cold feed % · Mix % · % of total agg. · Bin % · Proportion (%) · Anteil [M.-%] · Anteil in M.-% · Zusammensetzung [M.-%] ·
    Dosage (%) · % dans le mélange · Proportion % · Dosificación (%) · Proporción (%) · % en mezcla · % mezcla de áridos · Composición (%) · Pct used · Usage % · Prop. (%)`,
  'coarse-aggregate-angularity-one-face': `CAA 1+ · CAA (1+ face) · Fractured Faces, 1+ (%) · Fract. faces ≥1 · 1-face crushed · Crushed, 1 face · One Fractured Face, % · ≥ 1 fractured face · % 1 or more fractured faces ·
    Fractured faces (one or more) · Crush count 1 face · % with one fractured face · FF1+ · Caras fracturadas (1 o más) · Caras fracturadas ≥1 (%) · 1 cara o más · CAA1 (%) ·
    Fractured 1 face`,
  'coarse-aggregate-angularity-two-faces': `CAA 2+ · CAA (2+ faces) · Fractured Faces, 2+ (%) · Fract. faces ≥2 · Crushed, 2 faces · Two Fractured Faces, % · ≥ 2 fractured faces · % 2 or more fractured faces ·
    Fractured faces (two or more) · Crush count 2 faces · Caras fracturadas (2 o más) · 2 caras o más · Fractured 2 faces`,
  'fine-aggregate-angularity': `FAA · FAA (%) · Uncompacted Voids (FAA) · Fine Agg. Angularity · Fine aggr. angularity, % · Uncompacted void content (Method A) · Angularidad fino · FAA Method A ·
    Vacíos sin compactar`,
  'flat-and-elongated': `F&E · F & E (%) · Flat & Elong. · Flat/Elongated 5:1 · F&E 5:1 · Flat and Elongated (5:1), % · F/E 5:1 · Flat, Elongated · Thin & elongated · Flat & elongated > 5:1 ·
    Partículas planas y alargadas (5:1)`,
  'sand-equivalent': `SE · Sand Equiv. · Sand Equivalent, % · S.E. · SE value · Sand Eq. (SE) · Sandäquivalent SE · Équivalent de sable (SE) · ESP · Equivalente de arena (%) · Eq. de arena · E.A.`,
  'abrasion-loss': `LA Abrasion · L.A. Abrasion, % · L.A. Loss · LA % loss · Los Angeles (%) · LA Wear (%) · LA abrasion, % loss · L.A. Rattler · Los-Angeles-Wert · LA-Koeffizient · LA [M.-%] ·
    Coefficient LA · Coef. Los Angeles · Desgaste L.A. · Desgaste Los Ángeles (%) · Coef. de Los Ángeles · Los Angeles LA`,
  'micro-deval-loss': `Micro-Deval (%) · MDE · M_DE · Micro Deval loss · MD · Micro-Deval coefficient · Coef. MDE`,
  'soundness-loss': `Soundness (MgSO4) · Soundness, MgSO4 (%) · Mag. Soundness · Sodium Sulfate Soundness (5 cycles), % · Na2SO4 soundness · Sulphate soundness (MS) · Soundness loss (5 cyc), % ·
    Soundness, 5 cycles · Magnesium sulphate value MS · Sanidad (sulfato de magnesio) · Durabilidad sulfato de sodio`,
  'deleterious-materials': `Deleterious (%) · Clay lumps & friable particles (%) · Clay Lumps · Deleterious Mat'l · Clay lumps, % · Terrones de arcilla (%) · Friable particles`,
  'plasticity-index': `PI · Plasticity Index (PI) · P.I. · Ip · IP`,
  'natural-sand-content': `Natural Sand (%) · Nat. sand, %`,
  'rap-content': `RAP % · % RAP · RAP, % · RAP Content (% of mix) · Reclaimed asphalt, % · RAP (% by mass of mix) · RAP %, by wt. of total mix · Asphaltgranulat [M.-%] · Agrégats d'enrobés (%) · AE (%) ·
    RAP (% s/mezcla) · Fresado (%)`,
  'rap-binder-content': `RAP AC % · RAP binder, % · AC of RAP · % AC in RAP · Pb (RAP) · Binder content RAP · Bindemittelgehalt im Asphaltgranulat`,
  'recycled-binder-ratio': `RBR · ABR · Binder replacement · Recycled Binder Ratio (RBR) · RAP binder ratio · Binder Repl. Ratio · RBR, %`,
  'binder-specific-gravity': `Gb · Gb @ 25C · Binder S.G. (Gb) · Sp. Gr. of binder · Sp. Gr. of asphalt · Specific Gravity Binder · Binder spec. grav. · AC sp. gr. · Bindemitteldichte [g/cm³] · Gb (25 °C) ·
    Densidad del ligante · Peso específico del C.A. · Asphalt binder specific gravity @ 77F · Densité bitume · Peso específico del asfalto (Gb) · Dichte Bitumen`,
  'tensile-strength-dry': `Dry Strength, psi · Dry ITS (kPa) · ITS dry [kPa] · ITSd (kPa) · ITSd · Dry Tensile Str. · Unconditioned strength (psi) · Uncond. ITS · St (dry) · Std, kPa · S1 (psi) ·
    Avg. dry strength · Dry TS · Dry subset strength · ITS trocken · Spaltzugfestigkeit ITSd · ITS seco · Resistencia en seco ITSd (kPa) · Résistance à sec (kPa) · RTI secas`,
  'tensile-strength-conditioned': `Wet Strength, psi · Wet ITS (kPa) · ITSw · Cond. ITS · Conditioned strength (psi) · Moisture cond. strength · S2 (psi) · Cond. tensile strength · ITS nass · ITS wet [kPa] ·
    Resistencia en húmedo ITSw (kPa) · RTI húmedas · ITS húmedo · Spaltzugfestigkeit ITSw`,
  'tensile-strength-ratio': `TSR · TSR, % · T.S.R. · ITSR (%) · TSR (%) · Tensile Str. Ratio · Tensile-strength ratio · TSR % · Wet/Dry ratio · ITS-Verhältnis · i/C · ITSR [%] · Resistencia conservada (%) ·
    Relación de resistencias · TSR (AASHTO T 283) · Ratio ITSR`,
  'failure-load': `Max Load (N) · Peak load, lbf · Load, lb · Failure Load (kN) · Max. load P · Pmax (kN) · Peak Load P · Bruchlast [kN] · Max. Kraft · Höchstkraft F [N] · Force max. (kN) ·
    Charge de rupture · Carga máx. (kN) · Carga de rotura (N) · Maximum load, N · Load at failure (lbs) · P (N) · Ult. load`,
  'degree-of-saturation': `Saturation, % · % Sat. · Sat. (%) · Deg. of saturation · Degree of Sat. · Sättigungsgrad [%] · Degré de saturation · Grado sat. · Saturación (%) · % Saturation`,
  'specimen-height': `Height (mm) · Ht. (mm) · Ht, mm · h (mm) · Höhe [mm] · Hauteur (mm) · Altura (mm) · Specimen ht. · H [mm] · Height, mm · Spec. height`,
  'specimen-thickness': `Thickness (mm) · Thick. (mm) · t (mm) · Dicke [mm] · Épaisseur (mm) · Espesor (mm) · Specimen thickness, in.`,
  'specimen-diameter': `Diameter (mm) · Dia. (mm) · Diam. (mm) · D (mm) · Durchm. [mm] · Diamètre · Diámetro (mm) · Ø (mm)`,
  'mass-in-air': `Dry mass (g) · Wt. in air · Wt. in air, g · Weight in Air (A) · A - dry · Mass, dry (A) · Dry wt. (A) · Mass in air A, g · Masse trocken m1 · Masse sèche (g) · Peso seco (g) ·
    Peso aire · Peso en aire (A) · Wt dry in air (g)`,
  'mass-saturated-surface-dry': `SSD mass (g) · SSD Wt. · SSD (B) · B, SSD (g) · Wt. SSD, g · Masse SSD · Peso SSS (g) · Peso sat. sup. seco · Masse humide essuyée · SSD weight, g · Sat. surf. dry mass ·
    Surface-dry (g) · Sat. Surface Dry (g)`,
  'mass-in-water': `Mass in water (g) · Wt. in water · Submerged mass (C) · C - in water · Sub. wt. · Submerged Wt., g · Masse unter Wasser m2 · Masse immergée (g) · Peso sumergido (g) · Peso agua ·
    Immersed weight · Weight in H2O · Wt in water (g)`,
  'wheel-track-rut-depth': `Rut Depth (mm) · Max Rut Depth · HWT Rut, mm · Rut @ 20,000 · Rut depth at 20,000 passes · Hamburg rut (mm) · Rut (mm) · HWTT rut depth @ 20k passes · Rut depth @10000 passes, mm ·
    Spurrinnentiefe [mm] · Profondeur ornière (mm) · Profundidad de rodera · Rut depth RD · RD air · RDair (mm) · Ahuellamiento (mm) · Prof. huella · Deformación rodera`,
  'stripping-inflection-point': `SIP · SIP (passes) · Strip. Inflection Pt. · Stripping Inflection Point, passes`,
  'cracking-tolerance-index': `CTIndex · CT-Index · CT_index · CT Index (IDEAL) · IDEAL CT · CTindex (25 °C) · CT`,
  'flexibility-index': `FI · Flex. Index · Flexibility Index (FI) · I-FIT FI`,
  'fracture-energy': `Gf (J/m2) · Gf, J/m² · Fracture energy Gf · Fracture En. · Energía de fractura · Failure energy Gf (J/m²)`,
  'dynamic-modulus': `E* MPa · E*, ksi · Dyn. modulus · E-Modul [MPa] · Module complexe (MPa)`,
  'flow-number': `FN · Flow No. · Flow Number, cycles · Flow Number (FN)`,
  'marshall-stability': `Stability, kN · Stability (lb) · Stab. · Marshall Stab. (kN) · Marshall stability, lbf · Stabilität [kN] · Stabilité (kN) · Estabilidad (kN) · Estab. Marshall · Stabilité Marshall ·
    Corr. stability · Corrected Stability (N) · S [kN]`,
  'marshall-flow': `Flow, 0.01 in · Flow (mm) · Flow (0.25 mm) · Marshall flow · Fließwert [mm] · Fluage (mm) · Fluencia (mm) · Flujo (mm) · Flow value (mm) · F [mm]`,
  draindown: `Draindown (%) · Drain-down · Draindown, % · Escurrimiento`,
  'mixing-temperature': `Mixing Temp (°C) · Mixing Temp. · Mix Temp., °F · Mixing temperature, °C · Mischtemp. · Temp. de mezclado · Temp. de malaxage · T° mezcla`,
  'compaction-temperature': `Compaction Temp. (°C) · Comp. temp. · Compaction temp., °F · Verdichtungstemp. [°C] · T° compactación · Temp. de compactación · Température de compactage`,
  'gyrations-design': `Ndes · N-design · Ndesign · Design gyrations (Ndes) · Nd`,
  'gyrations-initial': `Nini · N-ini · Ninitial · Ni`,
  'gyrations-maximum': `Nmax · N-max · Nmaximum`,
  'relative-density': `%Gmm · % Gmm · %Gmm @ Ndes · % Gmm at Nini · %Gmm @ Nini · %Gmm@Nmax · % Gmm, Ndes · Density @ Nini (% Gmm) · Density at Nmax, % Gmm · %Gmm (Nini)`,
  'field-density': `Compaction (%) · % Comp. · Density, % of Gmm · % Gmm (core) · Degree of compaction k (%) · Verdichtungsgrad [%] · Compactage (%) · % compacité · Compactación (%) · % compactación ·
    Field density %`,
  'creep-compliance': `D(t) · D(t) [1/GPa] · D(t), 1/psi · Creep compliance D(t) (1/GPa) · Compliance 1/GPa · Kriechnachgiebigkeit D(t) [1/GPa] · Complaisance de fluage (1/GPa) · Creep Comp. ·
    Compliancia D(t) · J(t)`,
  'creep-strain': `Creep Strain (µε) · Strain (microstrain) · ε (µε) · Axial strain (µε) · Dehnung [µm/m] · Déformation (µm/m) · Deformación (µε) · Strain, 10^-6`,
  'horizontal-deformation': `Horiz. Def. (µm) · Horizontal displ. (µm) · ΔH (µm) · Hor. deformation (µm) · U_h (µm) · Horizontal deformation, mm`,
  'vertical-deformation': `Vert. Def. (µm) · Vertical displ. · ΔV (µm)`,
  'mass-loss-abrasion-mix': `Cantabro loss (%) · Cantabro · Particle loss PL · Pérdida por abrasión Cántabro · Mass loss (Cantabro)`,
  'voids-in-coarse-aggregate-mix': `VCAmix · VCA mix`,
  'rotational-viscosity': `Viscosity @ 135C · Rotational Visc. 135 °C, Pa·s · Brookfield visc. · RV @135 (Pa.s)`,
  penetration: `Penetration @ 25C · Pen 25 °C (0.1 mm) · Penetration (dmm) · Nadelpenetration [0,1 mm] · Pénétrabilité (1/10 mm) · Penetración (0,1 mm)`,
  'softening-point': `Softening Point (°C) · R&B (°C) · EP RuK [°C] · Erweichungspunkt RuK · TBA (°C) · Punto de reblandecimiento A&B · Softening pt.`,
  'flash-point': `Flash Point, COC (°C) · Flash Pt. · Flammpunkt`,
};
