import { normaliseUnit } from '../../quantities/units';

export interface LabelUnit {
  unit: string | null;
  /** Stands where a unit would and is not known. */
  unknownUnit: string | null;
  method: string | null;
  rest: string;
}

/** Takes unit and test method out of a label: "VMA (%)", "Dry mass, g", "Gmb [AASHTO T 166]", "Rut depth mm". */
export function labelUnit(text: string): LabelUnit {
  const found: LabelUnit = {
    unit: null,
    unknownUnit: null,
    method: null,
    rest: text.replace(/\s*:\s*$/, ''),
  };
  takeMethod(found);
  found.rest = found.rest.replace(
    /[([]\s*([^()[\]]*(?:\([^()]*\)[^()[\]]*)?)\s*[)\]]/g,
    (whole, inner: string) => {
      const unit = unitOf(inner);
      if (unit !== null) {
        found.unit ??= unit;
        return ' ';
      }
      if (looksLikeUnit(inner)) {
        found.unknownUnit ??= inner.trim();
        return ' ';
      }
      return whole;
    },
  );
  if (found.unit === null) takeTail(found);
  return found;
}

function takeMethod(found: LabelUnit): void {
  const match =
    /\b(?:AASHTO|ASTM|(?:DIN |NF |UNE[- ]|BS )?EN(?: ISO)?|ISO|Tex|NLT|INV E|TP Asphalt-StB(?: Teil)?)[ -]?(?:[A-Z]{1,2}[ -]?)?\d[\w.:/-]*(?:\s*(?:Method|Procedure) [A-Z]\b)?|\b[TDRC]\s?-?\d{2,4}(?:-\d{2})?(?=\)|\]|$)/.exec(
      found.rest,
    );
  if (!match || match.index === 0) return;
  found.method = match[0].trim();
  found.rest = found.rest.replace(match[0], ' ').replace(/[([]\s*[)\]]/g, ' ');
}

/** "Dynamic modulus, MPa (mean of 3 specimens)": a remark in brackets stands behind the unit. */
function takeTail(found: LabelUnit): void {
  const remark = /\s*\([^()]*\)\s*$/.exec(found.rest);
  if (remark && remark.index > 0) {
    const before: LabelUnit = { ...found, rest: found.rest.slice(0, remark.index) };
    takeTailOf(before);
    if (before.unit !== null) {
      found.unit = before.unit;
      found.rest = `${before.rest} ${remark[0]}`;
      return;
    }
  }
  takeTailOf(found);
}

function takeTailOf(found: LabelUnit): void {
  const comma = /[,;]\s*([^,;]+)$/.exec(found.rest.trim());
  const behindComma = comma?.[1] === undefined ? null : unitOf(comma[1]);
  if (comma && behindComma !== null) {
    found.unit = behindComma;
    found.rest = found.rest.trim().slice(0, comma.index);
    return;
  }
  const words = found.rest.trim().split(/\s+/);
  for (const count of [2, 1]) {
    if (words.length <= count) continue;
    const tail = words.slice(-count).join(' ');
    const unit = safeTail.test(tail) ? unitOf(tail) : null;
    if (unit === null) continue;
    found.unit = unit;
    found.rest = words.slice(0, -count).join(' ');
    return;
  }
}

/** Bare words that are units and nothing else when they end a label. */
const safeTail =
  /^(?:mm|cm|µm|μm|um|kg|g|kN|N|lbf|kPa|MPa|GPa|psi|ksi|°\s?[CF]|deg\.? [CF]|1\/GPa|1\/psi|1\/MPa|1\/kPa|kPa-1|GPa-1|GPa\^-1|pcf|kg\/m[³3]|g\/cm[³3]|Mg\/m[³3]|t\/m[³3]|lb\/ft[³3]|µε|με|microstrain|Hz|J\/m[²2]|kJ\/m[²2]|N\/mm[²2]|Pa[·.]s|cP|mg\/g|m[²2]\/kg|0[.,]1 mm|1\/10 mm|dmm|cycles)$/;

export function unitOf(text: string): string | null {
  const plain = text.trim().replace(/(?<=\bin)\.$/, '');
  // `min` beside a name is a limit, and `h`, `t`, `m` repeat the symbol of the name itself.
  if (/^(?:|[-–]|min|h|t|m|j|p|k|d|number|ratio|none)$/i.test(plain)) return null;
  const known =
    foreignUnits.get(plain.toLowerCase().replace(/\s+/g, ' ')) ??
    normaliseUnit(plain) ??
    normaliseUnit(plain.replace(/^(\d),(\d)/, '$1.$2'));
  // Single capitals name trials and specimens more often than coulombs and kelvins.
  if (known !== null && /^[A-Z]$/.test(plain) && plain !== 'N')
    return plain === 'C' ? '°C' : plain === 'F' ? '°F' : null;
  return known;
}

const foreignUnits = new Map([
  ['m.-%', '%'],
  ['m-%', '%'],
  ['masse-%', '%'],
  ['gew.-%', '%'],
  ['gew.%', '%'],
  ['vol.-%', '%'],
  ['vol-%', '%'],
  ['vol.%', '%'],
  ['vol. %', '%'],
  ['% m/m', '%'],
  ['% v/v', '%'],
  ['% masse', '%'],
  ['% volume', '%'],
  ['% vol', '%'],
  ['% vol.', '%'],
  ['% en masse', '%'],
  ['% en volume', '%'],
  ['% en masa', '%'],
  ['% en volumen', '%'],
  ['% s/m', '%'],
  ['% s/mezcla', '%'],
  ['% s/a', '%'],
  ['% of mix', '%'],
  ['% of total mix', '%'],
  ['% by total mix', '%'],
  ['% total mix', '%'],
  ['% by mass of total mix', '%'],
  ['% by weight of total mix', '%'],
  ['% by total weight of mix', '%'],
  ['% by mass of mix', '%'],
  ['% by wt of mix', '%'],
  ['% by weight of mix', '%'],
  ['% by total mass', '%'],
  ['% mass', '%'],
  ['% by vol', '%'],
  ['% by volume', '%'],
  ['% of agg', '%'],
  ['% of aggregate', '%'],
  ['mass %', '%'],
  ['wt. %', '%'],
  ['wt %', '%'],
  ['lb', 'lb'],
  ['lbs', 'lb'],
  ['gramos', 'g'],
  ['grammes', 'g'],
  ['gramm', 'g'],
  ['segundos', 's'],
  ['secondes', 's'],
  ['sekunden', 's'],
  ['sek', 's'],
  ['pulgadas', 'in'],
  ['pulg', 'in'],
  ['pouces', 'in'],
  ['microdef', 'µε'],
  ['microdeformacion', 'µε'],
  ['µdef', 'µε'],
  ['10-6', 'µε'],
  ['10⁻⁶', 'µε'],
  ['10^-6', 'µε'],
  ['µm/m', 'µε'],
  ['mpa-1', '1/MPa'],
  ['gpa-1', '1/GPa'],
  ['kpa-1', '1/kPa'],
  ['1/gpa', '1/GPa'],
  ['pasadas', 'passes'],
  ['passages', 'passes'],
  ['überrollungen', 'passes'],
  ['ciclos', 'cycles'],
  ['zyklen', 'cycles'],
  ['giros', 'gyrations'],
  ['girations', 'gyrations'],
  ['coups', 'blows'],
  ['golpes', 'blows'],
  ['schläge', 'blows'],
  ['gyrations', 'gyrations'],
]);

/** "kip/ft", "gal/yd³": writing that only units have. */
function looksLikeUnit(text: string): boolean {
  const plain = text.trim();
  return (
    plain.length <= 10 &&
    /^[a-zµ°"']+\s?[/·*]\s?[a-zµ]+[²³23]?$/i.test(plain) &&
    !/^(?:pass\/fail|p\/f|n\/a|and\/or|d\/b|f\/a)$/i.test(plain)
  );
}
