import type { ConditionName } from '../mapping';

/** What a column or row of keys holds. */
export type KeyName = ConditionName | 'method' | 'unit' | 'value' | 'quantity' | 'testedOn' | DocumentPart;
export type DocumentPart = 'document' | 'issuer' | 'reference' | 'date' | 'validTo';

/** Headings of keys: they say whose, where or when, and hold no result. Common practice, no source. */
export const keyWords: Partial<Record<KeyName, string>> = {
  sieve: `sieve | Prufsieb | Sieb mm | Kornklasse | Korngrosse | sieve sizes | sieve size mm | particle size | size | size mm | Siebgrosse mm | sieve size | sieve opening | sieves | opening | US sieve | sieve no | sieve designation | sieve mm | screen | screen size | nominal sieve | Sieb | Siebe | Siebweite | Maschenweite | Siebgrosse | Siebnennweite | Siebofffnung | Siebdurchmesser |
    tamis | tamis mm | ouverture | ouverture de tamis | maille | dimension du tamis | tamiz | tamices | abertura | malla | luz de malla | tamiz mm | abertura de tamiz | standard sieve | metric | US standard | sieve metric`,
  trial: `trial | trial no | trial mix | trial id | trial point | mix id | mix no | trial number | mix | design point | point | Versuch | Mischung | Mischung Nr | Variante | Rezept | essai | formule no | melange | ensayo | mezcla | mezcla no | punto | variante |
    mix trial | trial blend mix | design trial | serie | series | Serie | trial designation | batch`,
  blend: `trial blend | blend no | aggregate blend | blend id | blend number | Kornmischung | melange granulaire | mezcla de agregados`,
  specimen: `specimen | specimen no | specimen id | specimen number | sample | sample no | sample id | sample number | core | core no | core id | replicate | rep | puck | pill | plug | briquette | briquette no | test no | test specimen | lab sample | sublot | sublot no | sub lot | lot |
    Probe | Proben | Proben-Nr | Probe Nr | Probekorper | Probekorper Nr | Prufkorper | Bohrkern | Bohrkern Nr | Teilprobe | eprouvette | eprouvette no | echantillon | carotte | prelevement | probeta | probeta no | muestra | muestra no | especimen | testigo | briqueta |
    replicate no | determination | test | run | split sample | specimen name | pastilla | Nr | no | #  | id | sample name | wheel`,
  stockpile: `stockpile | aggregate | material | aggregate source | aggregate type | stockpile id | bin | bin no | component | aggregate id | source | product | aggregate name | material id | stockpile name | fraction | aggregates | aggregate stockpile | ingredient |
    Gesteinskornung | Kornung | Lieferkornung | Gestein | Korngruppe | Komponente | granulat | granulats | coupure | constituant | fraction granulaire | agregado | arido | acopio | fraccion | componente`,
  temperature: `temperature | test temperature | temp | test temp | testing temperature | temp deg C | Temperatur | Pruftemperatur | temperature d'essai | temperatura | temperatura de ensayo | conditioning water temperature | water temperature | bath temperature`,
  time: `time | loading time | load time | time of loading | creep time | test time | elapsed time | t | Zeit | Belastungszeit | Belastungsdauer | temps | temps de charge | temps de chargement | duree | tiempo | tiempo de carga | duree de chargement`,
  stress: `stress | applied stress | creep stress | stress level | axial stress | deviator stress | Spannung | Prufspannung | contrainte | contrainte appliquee | esfuerzo | tension aplicada | esfuerzo aplicado | deviatoric stress | Oberspannung`,
  passes: `passes | number of passes | wheel passes | no of passes | pass | Uberrollungen | Uberrollung | Anzahl Uberrollungen | Uberfahrten | passages | nombre de passages | pasadas | numero de pasadas | ciclos de rueda | load passes | wheel cycles`,
  frequency: `frequency | freq | loading frequency | test frequency | Frequenz | frequence | frecuencia`,
  gyrations: `compacted to | gyration | N | N level | no of gyrations`,
  variant: `subset | form of test | form of the test | conditioning | condition | test type | group | ratio | set | Lagerung | Konditionierung | Zustand | conditionnement | etat | acondicionamiento | condicion | grupo`,
  aging: `aging | ageing | aging condition | Alterung | vieillissement | envejecimiento | aging level`,
  laboratory: `laboratory | lab | tested by laboratory | Labor | laboratoire | laboratorio | tester`,
  method: `method | test method | standard | test standard | specification method | procedure | Prufverfahren | Verfahren | Norm | methode | methode d'essai | norme | metodo | metodo de ensayo | norma | AASHTO | ASTM | reference method | test procedure`,
  unit: `unit | units | Einheit | Einheiten | unite | unites | unidad | unidades | uom`,
  value: `value | result | results | test result | measured | measured value | reported | reported value | as tested | test value | actual | Wert | Ergebnis | Ergebnisse | Messwert | Ist | Istwert | valeur | resultat | resultats | valor | resultado | resultados | obtenido |
    lab result | laboratory result | data | as reported`,
  quantity: `property | quantity | parameter | test | characteristic | item | description | properties | mix property | volumetric property | attribute | Eigenschaft | Kenngrosse | Merkmal | Parameter | Kennwert | propriete | caracteristique | parametre | propiedad | caracteristica | parametro |
    ensayo | prueba | test property | mixture property | measure | Prufung | Bezeichnung | essai | designation`,
  testedOn: `date tested | test date | tested on | tested | date of test | testing date | Prufdatum | gepruft am | date d'essai | date de l'essai | fecha de ensayo`,
  document: `document | documents | certificate | enclosure | enclosures | attachment | document type | Dokument | Unterlage | Unterlagen | Nachweis | documento | documentos | anexo | piece jointe | attestation | enclosed document | report type`,
  issuer: `issuer | issued by | issuing body | authority | Aussteller | ausgestellt von | emetteur | delivre par | emitido por | emisor | issuing laboratory | organisation | organization | company`,
  reference: `reference | reference no | ref | ref no | certificate no | certificate number | document no | report no | number | doc no | Referenz | Zertifikat-Nr | Aktenzeichen | Dokument-Nr | numero | referencia | no de certificado | no certificat | reference number`,
  date: `date | issue date | date issued | issued | dated | date of issue | Datum | Ausstellungsdatum | ausgestellt am | date d'emission | delivre le | fecha | fecha de emision | emitido`,
  validTo: `valid to | valid until | expires | expiry | expiry date | expiration | expiration date | valid through | gultig bis | Ablaufdatum | valable jusqu'au | valide jusqu'au | date d'expiration | valido hasta | vence | vigencia | fecha de vencimiento`,
};

/** What is no result although it is a number. */
export type Role = 'average' | 'spread' | 'limit' | 'total' | 'difference' | 'remark' | 'serial';

export const roleWords: Record<Role, string> = {
  average: `average | avg | mean | average value | mean value | Mittel | Mittelwert | MW | moyenne | moy | promedio | media | prom | x-bar | xbar | Durchschnitt | ave | average of specimens | valor medio | valeur moyenne`,
  spread: `std dev | standard deviation | stdev | st dev | std | s.d. | sd | cov | c.v. | cv | coefficient of variation | variance | range | spread | minimum value | maximum value | count | sample size | Standardabweichung | Stabw | Spannweite |
    Variationskoeffizient | ecart type | ecart-type | etendue | coefficient de variation | desviacion estandar | desviacion tipica | desv est | desv | rango | coeficiente de variacion | std deviation`,
  limit: `min | max | minimum | maximum | spec | specs | specification | specification limits | spec limits | spec limit | limit | limits | lower limit | upper limit | lower | upper | requirement | requirements | required | criteria | criterion | control points | control point |
    tolerance | allowable | acceptance | lower control | upper control | spec min | spec max | min spec | max spec | LSL | USL | restricted zone | target | target value | target range | contract requirement | agency limit | lo | hi | low | high | band | spec range |
    Anforderung | Anforderungen | Grenzwert | Grenzwerte | Sollwert | Soll | Mindestwert | Hochstwert | untere Grenze | obere Grenze | Toleranz | Grenze | unterer Grenzwert | oberer Grenzwert | Sollbereich | mindestens | hochstens |
    exigence | exigences | limite | limites | seuil | tolerances | specification minimale | specification maximale | borne inferieure | borne superieure | mini | maxi | fuseau | fuseau min | fuseau max |
    especificacion | especificaciones | requisito | requisitos | minimo | maximo | limite inferior | limite superior | tolerancia | exigido | huso | huso min | huso max | limits min | limits max | action limit | typical | allowed | pass criteria`,
  total: `total | sum | subtotal | Summe | Gesamt | Insgesamt | somme | totaux | suma | grand total | check sum | check total`,
  difference: `difference | diff | deviation | delta | dev | deviation from target | deviation from JMF | variance from target | Abweichung | Differenz | ecart | difference to JMF | diferencia | desviacion | margin | error | % difference | lab difference | residual`,
  remark: `remarks | remark | note | notes | comment | comments | status | pass/fail | pass fail | P/F | ok | compliance check | Bemerkung | Bemerkungen | Anmerkung | Anmerkungen | Kommentar | remarque | remarques | observation | observations | commentaire | conforme | observacion | observaciones | notas | nota | cumple | verdict |
    meets spec | meets | in spec | complies | erfullt | conformite | result ok | check | cumplimiento`,
  serial: `item no | row | line | seq | lfd nr | line no | page | position | pos nr`,
};

/** A design column or row is the proposed job mix; an agency's stands beside the contractor's. */
export const designWords = `design | JMF | job mix | job mix formula | job-mix | job-mix formula | selected | optimum | proposed | proposed JMF | final design | final mix | design mix | mix design | at optimum | design value | design values | JMF target | recommended | at design |
  final JMF | final | at OAC | at OBC | at optimum AC | selected design | proposed design | JMF value | optimum mix | design optimum | job mix target | target JMF | proposed mix | design asphalt content | selected mix |
  Entwurf | Eignungsprufung | gewahlt | Optimum | Zielrezeptur | Sollrezeptur | formule retenue | retenu | formule optimale | optimum retenu | formule de travail | formula de trabajo | formula de obra | optimo | diseno | seleccionado | adoptado | diseno final | FMT | formula de diseno`;

export const laboratoryWords = {
  contractor: `contractor | contractor QC | QC | producer | contractor result | contractor lab | contractor laboratory | producer QC | mix designer | Auftragnehmer | Eigenuberwachung | Hersteller | AN | entrepreneur | entreprise | contratista | contractor's | contractor test | quality control | autocontrole`,
  agency: `agency | agency QA | QA | owner | verification | agency verification | DOT | state | agency result | agency lab | agency laboratory | district lab | acceptance lab | central lab | independent assurance | IA | Auftraggeber | AG | Fremduberwachung | Kontrollprufung | maitre d'ouvrage | maitre d'oeuvre | controle exterieur |
    administracion | agencia | supervision | verification sample | agency test | agency verification result | quality assurance | state lab | referee`,
};

/** Labels of a cover sheet whose values are no readings and no attributes. */
export const furnitureWords = `project | project no | project name | project number | project title | contract | contract no | contract number | contractor name | prime contractor | supplier | binder supplier | asphalt supplier | terminal | refinery | plant | plant no | plant location | location | county | district | route | highway |
  submitted by | submitted to | prepared by | prepared for | designed by | tested by | checked by | reviewed by | approved by | technician | technician no | technician certificate no | signature | engineer | phone | telephone | fax | email | e-mail | address | client | customer | job | job no | job number | report | report number |
  report title | report date | revision | revision no | version | rev | sheet | page | design no | design number | sampled by | sampled on | date sampled | sample date | date received | date of design | design date | date submitted | submittal date | letting | letting date | date prepared | quantity tons | tonnage | quarry | source location | pit |
  serial no | equipment no | oven no | machine | machine no | device | compactor serial no | gauge no | scale no | balance | thermometer | certification no | certification | lab no | lab number | laboratory no | laboratory number | accreditation no | order no | Los | purchase order | year | station | offset | lane | lot size | wheel load |
  Projekt | Projekt-Nr | Projektnummer | Bauvorhaben | Baumassnahme | Auftraggeber Name | Auftragsnummer | Auftrag | Bericht | Berichtsnummer | Berichts-Nr | Bearbeiter | Prufer | erstellt von | gepruft von | Mischwerk | Lieferant | Ort | Anschrift | Telefon | Probenahme | Entnahmestelle | Unterschrift | Seite | Hersteller Bindemittel |
  projet | chantier | marche | no de marche | fournisseur | centrale | operateur | lieu | adresse | rapport | rapport no | etabli par | verifie par | page no | provenance | carriere | date de prelevement | client no |
  proyecto | obra | contrato | no de contrato | proveedor | planta | ubicacion | elaborado por | revisado por | tecnico | informe | informe no | direccion | cantera | fecha de muestreo | pagina | expediente | cliente | solicitante`;

/** Things that are weighed, counted or set for a test and that no quantity of the registry holds. */
export const rawWords = `mass of pycnometer | pycnometer | pycnometer and water | pycnometer water | pycnometer + water | pycnometer + water + sample | mass of flask | flask | flask + water | flask and water | flask water sample | container | mass of container | container + water | container + sample | bowl | tare | tare mass |
  mass of bowl | bowl in water | wt of bowl | calibration | calibration mass | mass retained | wt ret | weight ret | mass ret | wt ret g | ret wt | ret mass | mass ret g | weight retained | wt retained | mass passing | cumulative mass retained | cumulative weight retained | sample mass before | mass before | mass after | initial mass | final mass | original mass | mass before washing | mass after washing | washed mass |
  dry mass before | dry mass after | mass of sample | sample mass | sample weight | total mass | total weight | weight of sample | batch weight | batch mass | water displaced | displaced volume | volume | volume of specimen | specimen volume | vacuum | residual pressure | vacuum time | shaking time | water temperature correction | temperature correction |
  volume of air voids | volume of absorbed water | vol absorbed water | absorbed water volume | thickness at saturation | partial vacuum | number of revolutions | spheres | charge | revolutions | cylinder volume | clay reading | sand reading | readings | dial reading | flow reading dial | proving ring | area | load rate | displacement rate |
  saturated mass | mass of saturated specimen | mass after saturation | SSD mass after saturation | vacuum saturated mass | cylinder mass | cylinder and sample | particles counted | mass of particles | fractured mass | mass fractured | questionable | non fractured | oven temperature | cure time | crumb size | correlation factor | water density |
  density of water | water bath | bath correction | pulse time | rest period | confining pressure | stress rate | contact stress | wheel speed | wheel diameter | cycles per minute | angle | internal angle | ram pressure | consolidation pressure | ram pressure kPa | rate of gyration | batch size | cooling time | short term aging hours |
  Masse Pyknometer | Pyknometer | Pyknometer + Wasser | Behalter | Einwaage | Ruckwaage | Volumen | Masse Ruckstand | Masse vor Waschen | Masse nach Waschen | Wasserdichte | Dichte Wasser | masse pycnometre | pycnometre | pycnometre + eau | masse refus | masse avant lavage | masse apres lavage | volume eprouvette | prise d'essai |
  masa picnometro | picnometro | picnometro + agua | masa retenida | peso retenido | masa antes de lavado | masa despues de lavado | volumen | recipiente | frasco | frasco + agua | masa de la muestra | peso de la muestra`;

/** Words beside a name that change nothing about what it is. */
export const harmlessWords = `lab laboratory measured calculated calc calculated reported test tests result results value values determined specimen specimens sample samples mix mixture mixtures asphalt hma compacted final summary table superpave marshall gyratory
  computed actual individual single each pct bituminous total overall submitted stated observed obs corr combined aggregate aggregates binder blend design laborwert gemessen berechnet ermittelt mischgut asphaltmischgut probekorper gesteinskornung mesure calcule melange enrobe eprouvette granulat liant
  medido calculado mezcla asfaltica agregado agregados arido aridos probeta ligante asfalto betun percent no nr num number mean average avg by mass weight volume wt vol si us basis procedure sgc property properties coarse fine combined bulk core cores field jmf m v masse volumen masa peso
  dry ssd water air index ct hwtt hwt hamburg hveem ring ball brookfield original rtfo pav aged unaged method type standard gradation analysis sieve data worksheet sheet determination determinations section part step according per unit units trial trials point points optimum job formula proposed selected
  compression axial diametral indirect tension idt scb strength stress target prufkorper sieblinie granulometrie granulometria ensayo ensayos essai essais prufung massenprozent volumenprozent rice theoretical maximum max theo superpave oven vacuum sealed parafin paraffin`;
