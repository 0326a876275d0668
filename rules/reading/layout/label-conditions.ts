import { sieveFromName } from '../../quantities/sieves';
import { convert } from '../../quantities/units';
import type { Conditions } from '../../record';
import { plainText } from '../plain-text';

export interface StatedConditions {
  at: Conditions;
  /** Binder content in percent, as written, where a trial is named by it. */
  binder: string | null;
  /** What is left of the text. */
  rest: string;
}

type Take = (match: RegExpExecArray, found: StatedConditions) => boolean;

/** Takes the conditions out of a label: "Gmb @ Ndes", "Rut depth at 20,000 passes", "Trial A (4.5 %)", "-10 °C". */
export function statedConditions(text: string): StatedConditions {
  const found: StatedConditions = { at: {}, binder: null, rest: plainText(text) };
  // Without a digit or one of these words there is nothing to take, and most labels have neither.
  if (
    !/\d|@|\b(?:at|bei|trial|mix|blend|n|sodium|magnesium|dry|left|right|wet|cond|uncond|mag|soak|[a-z]*sulf)/i.test(
      found.rest,
    ) &&
    !namedIds.test(found.rest)
  )
    return found;
  for (const [pattern, take] of patterns) {
    const match = pattern.exec(found.rest);
    if (match && take(match, found))
      found.rest = `${found.rest.slice(0, match.index)} ${found.rest.slice(match.index + match[0].length)}`;
  }
  return found;
}

const number = String.raw`-?\d+(?:[.,]\d+)?`;
const id = String.raw`([A-Za-z]{0,3}-?\d+[A-Za-z]?|[A-Z]|[IVX]{1,4})(?![\p{L}\d.,]*\d|[\p{L}\d]|\s*(?:%|mm\b|in\b|°|gyr|blows|passes))`;
const mark = String.raw`\s*(?:mix|blend|point|no\.?|nr\.?|#|n°|nº|:|-)?\s*(?:no\.?|nr\.?|#|:|-)?\s*`;
const namedIds =
  /\b(?:versuch|variante|essai|ensayo|mezcla|mischung|formule|rezept|m[eé]lange|core|specimen|sample|replicate|rep|puck|pill|plug|sublot|lot|probe|prüfkörper|probekörper|bohrkern|éprouvette|eprouvette|carotte|échantillon|probeta|testigo|muestra|run|briquette|spec|[ée]p|pk|ep|essai)\b/i;

const patterns: [RegExp, Take][] = [
  [
    /^\s*(?:@|at|bei|à|al?|en el)\s*(?:the\s+)?(?:opt(?:im(?:um|al|o|ale?))?\.?|design|selected|job[ -]mix)\s*(?:ac|a\.c\.|pb|asph(?:alt)?\.?|binder|bitumen|liant|ligante|bet[uú]n|asfalto)?\s*(?:content|cont\.?|%)?\s*$/i,
    (_match, found) => {
      found.at.trial = 'design';
      return true;
    },
  ],
  [
    /\b(left|right)(?:[ -](?:wheel|track|side))?\b/i,
    (match, found) => {
      found.at.specimen = match[1] ?? '';
      // "Left" alone is a name like any other; beside a quantity it says which wheel.
      return /\p{L}{3}/u.test(found.rest.replace(match[0], ''));
    },
  ],
  [
    new RegExp(
      String.raw`(?:\(|@|\bat\b|\bà\b|\ba\b|\bbei\b|,|=|:|^|\s)\s*(${number})\s*(°\s*[CF]|deg\.?\s*[CF]|º\s*[CF]|℃|℉)\b\.?|(?:@|\bat\b|\bbei\b|^)\s*(${number})\s*([CF])\s*\)?$`,
      'i',
    ),
    (match, found) => {
      const unit = /f|℉/i.test(match[2] ?? match[4] ?? '') ? '°F' : '°C';
      return setNumber(found, 'temperature', match[1] ?? match[3] ?? '', unit, '°C');
    },
  ],
  [
    /(\d[\d,. ]*\d|\d)\s*(k)?\s*(?:wheel )?(?:passes|pasadas|passages|überrollungen|uberrollungen|pass\b)/i,
    (match, found) => {
      const count = Number((match[1] ?? '').replace(/[,. ]/g, '')) * (match[2] ? 1000 : 1);
      found.at.passes = count;
      return Number.isFinite(count);
    },
  ],
  [
    /(?:@|\bat\b|\bafter\b|\bbei\b|\bnach\b|\bà\b|\baprès\b|\ba\b)\s*(\d{1,3}[,. ]?000)\s*(?=$|\)|,|\()/i,
    (match, found) => {
      if (!/\brut|hwt|hamburg|spur|orni[eè]r|rodera|ahuella|huella/i.test(found.rest)) return false;
      found.at.passes = Number((match[1] ?? '').replace(/[,. ]/g, ''));
      return true;
    },
  ],
  [
    new RegExp(String.raw`(${number})\s*hz\b`, 'i'),
    (match, found) => setNumber(found, 'frequency', match[1] ?? '', 'Hz', 'Hz'),
  ],
  [
    new RegExp(
      String.raw`(?:@|\bat\b|stress|spannung|contrainte|esfuerzo|σ0?|=|^|jnr)\s*[,:=]?\s*(${number})\s*(kPa|MPa|psi)\b(?!\s*(?:\^|-1|⁻))`,
      'i',
    ),
    (match, found) => {
      const written = (match[2] ?? '').toLowerCase();
      const unit = written === 'mpa' ? 'MPa' : written === 'psi' ? 'psi' : 'kPa';
      const keepsName = /^jnr/i.test(match[0]);
      const taken = setNumber(found, 'stress', match[1] ?? '', unit, 'kPa');
      if (keepsName) found.rest = `${found.rest} Jnr`;
      return taken;
    },
  ],
  [
    new RegExp(
      String.raw`(?:^|[\s(@=,])t?\s*=?\s*(${number})\s*(s|sec|secs|seconds|sek|segundos|secondes)\b\.?`,
      'i',
    ),
    (match, found) => setNumber(found, 'time', match[1] ?? '', 's', 's'),
  ],
  [
    /\bN\s*[-_, (]?\s*(ini|des|max)[a-zé]*\b\)?(?:\s*[=(:]?\s*(\d{1,3})\s*(?:gyrations|gyr\.?)?\)?)?/i,
    (match, found) => {
      const level = ({ ini: 'initial', des: 'design', max: 'maximum' } as const)[
        (match[1] ?? '').toLowerCase() as 'ini'
      ];
      // "Ndes" alone is the number itself; with another name beside it, it is where that was measured.
      const others = found.rest.replace(match[0], '').replace(/[^\p{L}%]/gu, '');
      if (others === '' || /^(?:gyrations?|numberof|of|gyr)*$/i.test(others)) return false;
      found.at.gyrations = level;
      return true;
    },
  ],
  [
    /(?:@|\bat\b|\bbei\b|\bà\b)\s*(initial|design|maximum|max\.?)\s*(?:gyrations?|number of gyrations|compaction)|(?:^|\s)(initial|design|maximum)\s+gyrations?(?=.*\b(?:height|gmm|density|voids))/i,
    (match, found) => {
      const word = (match[1] ?? match[2] ?? '').toLowerCase();
      found.at.gyrations = word.startsWith('max') ? 'maximum' : (word as 'initial' | 'design');
      return true;
    },
  ],
  [
    /(?:@|\bat\b|\bbei\b|\bà\b|\ba\b|N\s*=)\s*N?\s*=?\s*(\d{1,3})\s*(?:gyrations?|gyr\.?|giros|girations|drehungen)|\bN\s*=\s*(\d{1,3})\b|\((\d{1,3})\s*(?:gyrations?|gyr\.?)\)/i,
    (match, found) => {
      found.at.gyrations = Number(match[1] ?? match[2] ?? match[3]);
      return true;
    },
  ],
  [
    /\b([235])\s*[:/]\s*1\b/,
    (match, found) => {
      found.at.variant = `${match[1]}:1`;
      return true;
    },
  ],
  [
    /\b(sodium|magnesium|natrium|sodio|magnesio|magnésium|Na2SO4|MgSO4)(?=\b|sulf)/i,
    (match, found) => {
      found.at.variant = /^(?:sod|nat|na2)/i.test(match[1] ?? '') ? 'sodium' : 'magnesium';
      return true;
    },
  ],
  [
    /(?:^|[\s(,:=-])(?:Pb|AC|OBC|OAC)?\s*[=:]?\s*(\d{1,2}(?:[.,]\d{1,2})?)\s*%(?:\s*(?:AC|Pb|binder|asphalt|bitumen|bitume|liant|Bindemittel|Bitumen|ligante|asfalto)\b)?\)?/i,
    (match, found) => {
      const around = found.rest.replace(match[0], ' ').replace(/[^\p{L}]/gu, '');
      const names =
        /trial|pb|\bac\b|binder|asphalt|bitumen|bitume|liant|bindemittel|ligante|asfalto|mix\b|versuch|essai|ensayo|mezcla|mischung/i;
      if (around !== '' && !names.test(found.rest)) return false;
      const value = Number((match[1] ?? '').replace(',', '.'));
      if (value < 2 || value > 12) return false;
      found.binder = (match[1] ?? '').replace(',', '.');
      return true;
    },
  ],
  [
    new RegExp(String.raw`(?<![\p{L}\d])(?:trial\s+)?(?:blend|kornmischung)${mark}${id}`, 'iu'),
    (match, found) => named(match, found, 'blend'),
  ],
  [
    new RegExp(
      String.raw`(?<![\p{L}\d])(?:trial|mix|versuch|variante|essai|ensayo|mezcla|mischung|formule|rezept|m[ée]lange|design)${mark}${id}`,
      'iu',
    ),
    (match, found) => named(match, found, 'trial'),
  ],
  [
    new RegExp(
      String.raw`(?<![\p{L}\d])(?:specimen|sample|core|replicate|rep|puck|pill|plug|sub[ -]?lot|lot|pr[üu]fk[öo]rper|probek[öo]rper|probe|bohrkern|[ée]prouvette|carotte|[ée]chantillon|probeta|testigo|muestra|run|briquette|spec\.?|[ée]pr?\.?|pk\.?|determination|test)${mark}${id}`,
      'iu',
    ),
    (match, found) => named(match, found, 'specimen'),
  ],
];

function named(
  match: RegExpExecArray,
  found: StatedConditions,
  name: 'trial' | 'blend' | 'specimen',
): boolean {
  const stated = match[1] ?? '';
  // "mix design" and "test a" are words; a name of letters stands in capitals.
  if (!/\d/.test(stated) && stated !== stated.toUpperCase()) return false;
  found.at[name] = stated;
  return true;
}

function setNumber(
  found: StatedConditions,
  name: 'temperature' | 'frequency' | 'stress' | 'time',
  written: string,
  unit: string,
  canonical: string,
): boolean {
  const result = convert(Number(written.replace(',', '.')), unit, canonical);
  if (!result.ok) return false;
  found.at[name] = result.value;
  return true;
}

/** The sieve that a label names beside "passing" or the like: P200, minus No. 200, 0.075 mm. */
export function sieveInLabel(text: string): { sieve: number; rest: string } | null {
  const plain = plainText(text);
  const match =
    /(?:\bP|(?:^|\s)-|\bminus |<)\s*(?:No\.?\s*|#\s*)?(200|100|50|30|16|8|4)\b|\bP[ _]?(0?[.,]0?\d+)\b|((?:No\.?|#|Nr\.?)\s*\d+)|(\d+(?:[.,]\d+)?\s*mm)|((?:\d+[ -])?\d+\/\d+\s*(?:in\.?|")|\d+(?:\.\d+)?\s*(?:in\.|"))/i.exec(
      plain,
    );
  if (!match) return null;
  const name = match[1]
    ? `No. ${match[1]}`
    : match[2]
      ? `${match[2]} mm`
      : (match[3] ?? match[4] ?? match[5] ?? '');
  const sieve = sieveFromName(name.replace(/^(?:#|Nr\.?|No\.?)\s*/i, 'No. '));
  return sieve === null ? null : { sieve, rest: plain.replace(match[0], ' ') };
}
