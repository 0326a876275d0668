import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import { z } from 'zod';
import type { CellGrid } from '#rules/reading/cell-grid';
import { type Mapping, mappingSchema } from '#rules/reading/mapping';
import { templateMapping } from '#rules/reading/template-mapping';
import { recogniseTemplate } from '#rules/reading/template-stamp';
import { attributeFromScalar } from '#rules/reading/understand-attribute';
import type { AttributeValue } from '#rules/record';
import { withStandardAttributes } from '#rules/rule-sets/attribute';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { parseRuleSet } from '#rules/rule-sets/schema';
import { decodeWorkbook } from '../workbook/decode';
import { InputFault } from './input-fault';

/** Base edition and layers, left to right, as one edition that this engine can judge by. */
export async function loadEdition(rules: string, layers: string[]): Promise<ResolvedEdition> {
  const base = await loadRuleSet(rules);
  const above = [];
  for (const layer of layers) above.push(await loadRuleSet(layer));
  const resolution = resolveEdition(base, above);
  if (!resolution.ok) {
    const files = [rules, ...layers].map((file) => basename(file)).join(', ');
    throw faultOf(files, resolution.problems);
  }
  return resolution.edition;
}

export async function loadGrid(file: string): Promise<CellGrid> {
  const result = await decodeWorkbook(await bytesOf(file), basename(file));
  if (!result.ok) throw new InputFault(result.problem.detail, result.problem.fix);
  return result.grid;
}

/** The mapping given, else the template's own where the workbook is the template, else none. */
export async function loadMapping(
  file: string | null,
  grid: CellGrid,
  edition: ResolvedEdition,
): Promise<Mapping | null> {
  if (file !== null) {
    const parsed = mappingSchema.safeParse(await jsonOf(file));
    if (parsed.success) return parsed.data;
    const faults = parsed.error.issues.map((issue) => ({
      detail: `${issue.path.join('/') || 'the document'}: ${issue.message}.`,
      fix: '',
    }));
    throw faultOf(basename(file), faults);
  }
  return recogniseTemplate(grid) === null ? null : templateMapping(edition);
}

/** Attributes given beside the workbook: they win, and their origin is typed. */
export async function loadAttributes(
  file: string | null,
  edition: ResolvedEdition,
): Promise<Record<string, AttributeValue>> {
  if (file === null) return {};
  const parsed = z
    .record(z.string(), z.union([z.string(), z.number(), z.boolean()]))
    .safeParse(await jsonOf(file));
  if (!parsed.success) {
    throw new InputFault(`${basename(file)} is not a list of attributes.`, 'Write { "name": value, … }.');
  }
  const known = withStandardAttributes(edition.attributes);
  return Object.fromEntries(
    Object.entries(parsed.data).map(([name, stated]): [string, AttributeValue] => {
      const attribute = known.find((each) => each.name === name);
      const value = attribute ? attributeFromScalar(attribute, stated, null) : stated;
      if (value === null) {
        const allowed = (attribute?.values ?? []).map((each) =>
          typeof each === 'object' ? each.value : each,
        );
        throw new InputFault(
          `${basename(file)} gives "${stated}" for ${name}, which is no value of it.`,
          allowed.length > 0 ? `Give one of ${allowed.join(', ')}.` : `Give a ${attribute?.type ?? 'value'}.`,
        );
      }
      const unit = attribute?.unit === undefined ? {} : { unit: attribute.unit };
      return [name, { value, ...unit, origin: 'typed', source: null }];
    }),
  );
}

async function loadRuleSet(file: string) {
  const parsed = parseRuleSet(await jsonOf(file));
  if (!parsed.ok) throw faultOf(basename(file), parsed.problems);
  return parsed.ruleSet;
}

function faultOf(file: string, problems: { detail: string; fix: string }[]): InputFault {
  const shown = problems.slice(0, 3).map(({ detail, fix }) => `${detail} ${fix}`.trim());
  const more = problems.length > shown.length ? ` And ${problems.length - shown.length} more.` : '';
  return new InputFault(`${file} cannot be used: ${shown.join(' ')}`, more);
}

async function jsonOf(file: string): Promise<unknown> {
  const text = (await bytesOf(file)).toString('utf8').replace(/^\ufeff/, '');
  try {
    return JSON.parse(text);
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    throw new InputFault(`${basename(file)} is not JSON (${reason}).`, 'Correct it and try again.');
  }
}

async function bytesOf(file: string): Promise<Buffer> {
  try {
    return await readFile(file);
  } catch {
    throw new InputFault(`${file} cannot be opened.`, 'Check the path and that the file may be read.');
  }
}
