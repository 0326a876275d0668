import { resolvedEditionHash } from '#rules/engine/seal';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { parseRuleSet } from '#rules/rule-sets/schema';
import edition2026 from '#rules/sets/cvra-412-2026.json';
import { buildTemplate, finishTemplate } from '#server/workbook/write-template';
import { fillTemplate, type TemplateContent } from '#tests/workbooks/fill-template';
import { brightwaterSurface, brightwaterSurfaceMended } from './bw-125-s4';
import { brightwaterInDoubt } from './bw-125-s6';
import { contentOf, type DemoDates } from './demo-mix';
import { kestrelSurface } from './kd-095-l1';
import { tollhouseBinder, tollhouseBinderMended } from './ta-190-b2';

export interface DemoWorkbook {
  name: string;
  bytes: Buffer;
  /** What a reader will see when it is uploaded. */
  purpose: string;
}

export const demoDates: DemoDates = { submittedOn: '2026-03-09', lettingOn: '2026-01-14' };

/** The demo's workbooks, all invented: the template of edition 2026, filled in by code. */
export async function demoWorkbooks(dates: DemoDates = demoDates): Promise<DemoWorkbook[]> {
  const edition = demoEdition();
  const write = async (name: string, purpose: string, content: TemplateContent): Promise<DemoWorkbook> => {
    const editionHash = resolvedEditionHash(edition);
    const workbook = buildTemplate(edition, { editionHash });
    fillTemplate(workbook, content);
    return { name, purpose, bytes: await finishTemplate(workbook, editionHash) };
  };
  return [
    await write('KD-095-L1 r0.xlsx', 'Every required rule passes.', contentOf(kestrelSurface(dates))),
    await write(
      'TA-190-B2 r0.xlsx',
      'Fails in volumetrics, dust, aggregate and moisture; certificates and a cracking test are not shown.',
      contentOf(tollhouseBinder(dates)),
    ),
    await write(
      'TA-190-B2 r1.xlsx',
      'Revision 1 of TA-190-B2: what failed is put right.',
      contentOf(tollhouseBinderMended(dates)),
    ),
    await write(
      'BW-125-S4 r0.xlsx',
      'The reported dust proportion does not follow: it divides by total, not effective, binder.',
      contentOf(brightwaterSurface(dates)),
    ),
    await write(
      'BW-125-S4 r1.xlsx',
      'Revision 1 of BW-125-S4: less dust, and the ratio taken over effective binder.',
      contentOf(brightwaterSurfaceMended(dates)),
    ),
    await write(
      'BW-125-S6 r0.xlsx',
      'Four cells are in doubt: a date, a marked gravity, a decimal comma and a percentage.',
      brightwaterInDoubt(dates),
    ),
  ];
}

export function demoEdition(): ResolvedEdition {
  const parsed = parseRuleSet(edition2026);
  if (!parsed.ok) throw new Error(parsed.problems.map(({ detail }) => detail).join(' '));
  const resolution = resolveEdition(parsed.ruleSet);
  if (!resolution.ok) throw new Error(resolution.problems.map(({ detail }) => detail).join(' '));
  return resolution.edition;
}
