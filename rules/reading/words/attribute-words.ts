/** How laboratories head the standard attributes, the submittal's own facts and the usual documents. Common practice, no source. */
export const attributeWords: Record<string, string> = {
  mixType: `mix type | type of mix | mixture type | mix class | type of mixture | Mischgutart | Mischgutsorte | Asphaltmischgutart | type d'enrobe | type de melange | tipo de mezcla | mix category`,
  nominalMaximumSize: `NMAS | nominal max agg size | nominal maximum agg size | nom max size | nom max agg size | nominal max aggregate size | NMS | nominal max | nominal maximum size | nominal maximum aggregate size | nominal size | NMAS mm | nominal max size | nominal max aggregate size | nominal maximum aggregate | max nominal size | Grosstkorn | Nenngrosstkorn | D nominal | dimension maximale nominale | taille maximale nominale |
    diametre nominal maximal | tamano maximo nominal | tamano nominal maximo | TMN`,
  designTraffic: `design traffic | design ESALs | ESALs | ESAL | traffic | traffic level | 20-year ESALs | 20 year design ESALs | design ESAL | traffic ESALs | Verkehrsbelastung | trafic | trafic de dimensionnement | trafico | trafico de diseno | transito de diseno | ejes equivalentes`,
  course: `course | layer | pavement course | pavement layer | Schicht | Asphaltschicht | couche | capa | lift`,
  binderGrade: `binder grade | PG grade | asphalt grade | grade | binder | asphalt binder | binder type | asphalt binder grade | performance grade | binder PG | PG binder | Bindemittelsorte | Bindemittelart | Bitumensorte | Bindemittel | grade du bitume | classe de bitume | classe du liant | nature du liant | liant | bitume |
    grado de asfalto | grado PG | tipo de asfalto | tipo de ligante | grado del ligante | ligante | asfalto | AC grade | asphalt`,
  compactionMethod: `compaction method | method of compaction | compactor | compaction | compactor type | Verdichtungsverfahren | Verdichtungsart | mode de compactage | methode de compactage | metodo de compactacion | compactacion`,
  compactionBlows: `blows | blows per side | blows per face | compaction blows | number of blows | Schlagzahl | Schlage je Seite | coups par face | nombre de coups | golpes por cara | numero de golpes`,
  mixDesignation: `mix designation | mix number | mix id | JMF number | mix no | JMF no | JMF id | mix design no | mix design number | mix name | design no | mix design id | Rezeptnummer | Mischgutbezeichnung | numero de formule | designation du melange | designacion de la mezcla | mix code`,
  laboratory: `laboratory | testing laboratory | laboratory name | lab | testing lab | lab name | design laboratory | Labor | Prufstelle | Pruflabor | laboratoire | laboratoire d'essais | laboratorio | laboratorio de ensayos`,
};

export const documentWords: Record<string, string> = {
  'binder-certificate': `binder certificate | binder certificate of analysis | asphalt binder certificate | binder COA | asphalt binder certification | binder certification | binder test certificate | certificate of analysis | binder report | Bindemittelzertifikat | Bindemittel-Zertifikat | Bitumenzertifikat | certificat du liant | certificat du bitume | certificat de liant | certificado de ligante | certificado del ligante | certificado de asfalto`,
  'mix-design-report': `mix design report | design report | job mix formula report | JMF report | Eignungsnachweis | Erstprufung | Erstprufungsbericht | rapport de formulation | etude de formulation | informe de diseno | informe de diseno de mezcla | informe de formulacion`,
  'aggregate-source-approval': `aggregate source approval | source approval | aggregate approval | quarry approval | aggregate certification | Gesteinszulassung | agrement de carriere | agrement des granulats | aprobacion de cantera | aprobacion de la fuente | aprobacion de aridos`,
  'laboratory-accreditation': `laboratory accreditation | lab accreditation | accreditation certificate | accreditation | laboratory certification | Akkreditierung | Laborakkreditierung | accreditation du laboratoire | accreditation laboratoire | acreditacion del laboratorio | acreditacion de laboratorio`,
  'technician-certificate': `technician certificate | technician certification | designer certification | Pruferzertifikat | Prufer-Zertifikat | certificat du technicien | certificat de technicien | certificado del tecnico | certificado de tecnico`,
  'recycled-material-report': `recycled material report | RAP report | RAP test report | recycled materials report | Ausbauasphaltbericht | Bericht Asphaltgranulat | rapport agregats d'enrobes | informe de RAP | informe de material reciclado`,
  'additive-certificate': `additive certificate | anti-strip certificate | additive certification | Zusatzzertifikat | certificat d'additif | certificado de aditivo`,
  'safety-data-sheet': `safety data sheet | SDS | MSDS | material safety data sheet | Sicherheitsdatenblatt | fiche de donnees de securite | FDS | hoja de seguridad | ficha de datos de seguridad | hoja de datos de seguridad | safety data sheet of the binder`,
  'equipment-calibration': `equipment calibration | calibration record | calibration certificate | equipment calibration record | Kalibrierschein | certificat d'etalonnage | certificado de calibracion`,
  'mixing-temperature-chart': `temperature chart | viscosity chart | mixing and compaction temperature chart | temperature-viscosity chart`,
  'performance-test-report': `performance test report | performance report`,
  'certificate-of-compliance': `certificate of compliance | compliance certificate | Konformitatserklarung | certificat de conformite | certificado de conformidad`,
};
