import { english, englishAbbreviated, french, german, spanish } from './headings';
import * as h from './held-out-sections';
import { type Layout, layout } from './layout';
import * as s from './sections';

/** Laid out after the reader was written, and looked at only once it was. */
export const heldOutLayouts: Layout[] = [
  layout(101, 'certificate and a sheet a trial', english, false, [
    h.certificate,
    h.sheetPerTrial,
    h.trialBlends,
    h.moistureAcross,
    h.rutsByPasses,
  ]),
  layout(
    102,
    'US certificate, blends and Marshall',
    englishAbbreviated,
    true,
    [h.certificate, h.trialBlends, h.marshall, h.rutsByPasses, h.modulus],
    { trialNames: ['1', '2', '3'] },
  ),
  layout(103, 'German, design against limits', german, false, [
    h.certificate,
    h.designAgainstLimits,
    h.sheetPerTrial,
    h.creepSheets,
    h.qualityByStockpile,
  ]),
  layout(104, 'French, design against limits', french, false, [
    s.coverBeside,
    h.designAgainstLimits,
    h.stockpilesSideBySide,
    h.moistureAcross,
    h.rutsByPasses,
  ]),
  layout(
    105,
    'Spanish, a sheet a trial',
    spanish,
    false,
    [h.certificate, h.sheetPerTrial, h.stockpilesSideBySide, h.moistureAcross, h.modulus],
    { trialNames: ['1', '2', '3'] },
  ),
  layout(106, 'quality control with agency beside', english, false, [
    s.coverBelow,
    h.comparison,
    h.cores,
    h.enclosures,
  ]),
  layout(107, 'sublots', english, false, [s.coverBeside, h.sublots, s.gradationSi, h.enclosures]),
  layout(108, 'one reading a row', english, false, [
    s.coverTwoColumns,
    h.longList,
    s.gradationUs,
    h.hiddenParts,
  ]),
  layout(109, 'German text file', german, false, [h.decimalCommas]),
  layout(110, 'French text file', french, false, [h.decimalCommas], { trialNames: ['1', '2', '3', '4'] }),
  layout(111, 'Spanish text file', spanish, false, [h.decimalCommas]),
  layout(112, 'spaced groups', english, false, [
    h.certificate,
    h.spacedGroups,
    h.designAgainstLimits,
    h.modulus,
    h.hiddenParts,
  ]),
  layout(113, 'abbreviated, by stockpile', englishAbbreviated, false, [
    s.coverBelow,
    h.qualityByStockpile,
    h.trialBlends,
    h.spacedGroups,
    h.creepSheets,
  ]),
  layout(114, 'German blends', german, false, [s.coverBeside, h.trialBlends, h.moistureAcross, h.comparison]),
  layout(115, 'Spanish blends', spanish, false, [
    s.coverBelow,
    h.trialBlends,
    h.designAgainstLimits,
    h.rutsByPasses,
    h.creepSheets,
  ]),
  layout(116, 'French in groups with gaps', french, false, [
    h.certificate,
    h.spacedGroups,
    h.qualityByStockpile,
    h.creepSheets,
  ]),
];
