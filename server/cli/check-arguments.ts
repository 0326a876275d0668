import { parseArgs } from 'node:util';
import { z } from 'zod';
import { InputFault } from './input-fault';

export interface CheckArguments {
  rules: string;
  layers: string[];
  attributes: string | null;
  mapping: string | null;
  submittedOn: string | null;
  lettingOn: string | null;
  json: boolean;
  workbook: string;
}

export const usage =
  'Use: npm run check -- --rules FILE.json [--layer FILE.json …] [--attributes FILE.json] [--mapping FILE.json] [--submitted DATE] [--letting DATE] [--json] WORKBOOK';

export function parseCheckArguments(argv: string[]): CheckArguments {
  const { values, positionals } = parsed(argv);
  const [workbook, ...more] = positionals;
  if (values.rules === undefined) throw new InputFault('No rule set is given.', usage);
  if (workbook === undefined) throw new InputFault('No workbook is given.', usage);
  if (more.length > 0)
    throw new InputFault(`More than one workbook is given: ${positionals.join(', ')}.`, usage);
  return {
    rules: values.rules,
    layers: values.layer ?? [],
    attributes: values.attributes ?? null,
    mapping: values.mapping ?? null,
    submittedOn: dateOf(values.submitted, '--submitted'),
    lettingOn: dateOf(values.letting, '--letting'),
    json: values.json ?? false,
    workbook,
  };
}

function parsed(argv: string[]) {
  try {
    return parseArgs({
      args: argv,
      allowPositionals: true,
      options: {
        rules: { type: 'string' },
        layer: { type: 'string', multiple: true },
        attributes: { type: 'string' },
        mapping: { type: 'string' },
        submitted: { type: 'string' },
        letting: { type: 'string' },
        json: { type: 'boolean' },
      },
    });
  } catch (error) {
    throw new InputFault(
      error instanceof Error ? `${error.message}.` : 'The arguments cannot be read.',
      usage,
    );
  }
}

function dateOf(text: string | undefined, option: string): string | null {
  if (text === undefined) return null;
  if (z.iso.date().safeParse(text).success) return text;
  throw new InputFault(`${option} ${text} is not a date.`, 'Write year, month and day as 2026-03-09.');
}
