import type { z } from 'zod';

/** One fault of a document: where it is, what is wrong, and what to do. */
export interface DocumentProblem {
  /** JSON pointer, `/rules/3/limit/min`. */
  pointer: string;
  detail: string;
  fix: string;
}

export function pointerOf(path: readonly PropertyKey[]): string {
  return path.map((step) => `/${String(step).replace(/~/g, '~0').replace(/\//g, '~1')}`).join('');
}

/** "Rule vma", "Table vma-min", or the pointer where nothing with a name is near. */
export function placeOf(json: unknown, path: readonly PropertyKey[]): string {
  let place = '';
  let here: unknown = json;
  let list = '';
  for (const step of path) {
    here = isObject(here) ? here[step as string] : undefined;
    const name = isObject(here) ? (here.id ?? here.name ?? here.type) : undefined;
    if (typeof step === 'number' && NAMED_LISTS[list] && typeof name === 'string') {
      place = `${NAMED_LISTS[list]} ${name}`;
    }
    list = String(step);
  }
  return place;
}

/** All faults that a schema found, in words, each at its place. */
export function problemsOfIssues(json: unknown, issues: readonly z.core.$ZodIssue[]): DocumentProblem[] {
  return issues.flatMap((issue) => problemsOfIssue(json, issue, []));
}

function problemsOfIssue(
  json: unknown,
  issue: z.core.$ZodIssue,
  parent: readonly PropertyKey[],
): DocumentProblem[] {
  const path = [...parent, ...issue.path];
  if (issue.code === 'invalid_union' && issue.errors.length > 0) {
    const branch = likeliestBranch(issue.errors);
    if (branch) return branch.flatMap((inner) => problemsOfIssue(json, inner, path));
    return [located(json, path, 'has a form that is not known here', remedyFor(path))];
  }
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) =>
      located(json, [...path, key], 'is not a known field', 'Remove it, or correct its name.'),
    );
  }
  const { detail, fix } = inWords(json, issue, path);
  return [located(json, path, detail, fix)];
}

function located(json: unknown, path: readonly PropertyKey[], detail: string, fix: string): DocumentProblem {
  const place = placeOf(json, path);
  const last = path.length === 0 ? 'the document' : fieldName(path);
  return { pointer: pointerOf(path), detail: `${place ? `${place}: ` : ''}${last} ${detail}.`, fix };
}

function inWords(
  json: unknown,
  issue: z.core.$ZodIssue,
  path: readonly PropertyKey[],
): { detail: string; fix: string } {
  switch (issue.code) {
    case 'invalid_type':
      return valueAt(json, path) === undefined
        ? { detail: 'is missing', fix: `Give ${TYPE_WORDS[issue.expected] ?? issue.expected}.` }
        : {
            detail: `is not ${TYPE_WORDS[issue.expected] ?? issue.expected}`,
            fix: `Give ${TYPE_WORDS[issue.expected] ?? issue.expected}.`,
          };
    case 'invalid_value': {
      const allowed = issue.values.map((value) => (value === null ? 'null' : String(value))).join(', ');
      const isMissing = valueAt(json, path) === undefined;
      return {
        detail: isMissing ? 'is missing' : `has the value ${shown(valueAt(json, path))}, which is not known`,
        fix: issue.values.length === 1 ? `Write ${allowed}.` : `Choose one of ${allowed}.`,
      };
    }
    case 'invalid_union':
      return {
        detail: 'has a value that is not known',
        fix: path.at(-1) === 'kind' ? `Choose one of ${MEASURE_KINDS}.` : remedyFor(path),
      };
    case 'too_small':
      return { detail: 'is empty or too small', fix: smallRemedy(issue) };
    case 'invalid_format':
      return issue.format === 'date'
        ? { detail: 'is not a date', fix: 'Write year, month and day as 2026-03-09.' }
        : { detail: issue.message, fix: remedyFor(path) };
    case 'custom': {
      const fix = issue.params?.fix;
      return { detail: issue.message, fix: typeof fix === 'string' ? fix : 'Correct it.' };
    }
    default:
      return { detail: `is not usable: ${issue.message}`, fix: remedyFor(path) };
  }
}

/** The branch of a union that the author most likely meant: fewest faults, found deepest. */
function likeliestBranch(branches: z.core.$ZodIssue[][]): z.core.$ZodIssue[] | undefined {
  const score = (branch: z.core.$ZodIssue[]) =>
    branch.reduce((sum, issue) => {
      const atTop = issue.path.length === 0;
      if (issue.code === 'unrecognized_keys') return sum + issue.keys.length * (atTop ? 10 : 1);
      return sum + (atTop && issue.code === 'invalid_type' ? 100 : issue.path.length <= 1 ? 5 : 1);
    }, 0);
  const sorted = branches
    .filter((branch) => !branch.every((issue) => issue.path.length === 0 && issue.code === 'invalid_type'))
    .toSorted((a, b) => score(a) - score(b));
  return sorted[0];
}

function smallRemedy(issue: z.core.$ZodIssueTooSmall): string {
  if (issue.origin === 'array') return 'Give at least one entry.';
  if (issue.origin === 'string') return 'Write a text.';
  return `Give a number ${issue.inclusive ? 'of at least' : 'greater than'} ${issue.minimum}.`;
}

function remedyFor(path: readonly PropertyKey[]): string {
  const field = path.findLast((step) => typeof step === 'string');
  return (field !== undefined && REMEDIES[String(field)]) || 'Correct the value.';
}

function fieldName(path: readonly PropertyKey[]): string {
  const last = path.at(-1);
  if (typeof last !== 'number') return String(last);
  return `entry ${last + 1} of ${String(path.at(-2) ?? 'the list')}`;
}

function valueAt(json: unknown, path: readonly PropertyKey[]): unknown {
  let here: unknown = json;
  for (const step of path) here = isObject(here) ? here[step as string] : undefined;
  return here;
}

function shown(value: unknown): string {
  return typeof value === 'string' ? `"${value}"` : (JSON.stringify(value) ?? 'nothing');
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

const NAMED_LISTS: Record<string, string> = {
  rules: 'Rule',
  tables: 'Table',
  attributes: 'Attribute',
  quantities: 'Quantity',
  documents: 'Document type',
  cases: 'Case',
};

const TYPE_WORDS: Record<string, string> = {
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  array: 'a list',
  tuple: 'a list',
  object: 'an object',
  record: 'an object',
  null: 'null',
};

const MEASURE_KINDS = 'reading, gradation, creep-compliance, formula, difference, attribute, document';

const BOUND_REMEDY =
  'Give a number, a decimal in quotes such as "14.0", a table with its column, or a quantity with plus.';
const REMEDIES: Record<string, string> = {
  min: BOUND_REMEDY,
  max: BOUND_REMEDY,
  target: BOUND_REMEDY,
  tolerance: BOUND_REMEDY,
  oneOf: 'Give a list of allowed values, or a table with its column.',
  to: 'Give a step such as 0.1, the word limit, or a table with its column.',
  when: 'Give all, any or not, or a comparison with fact, operator and value.',
  on: 'Give submitted, letting, or a date such as 2026-03-09.',
  between: 'Give ["contractor", "agency"] or ["reported", "recomputed"].',
  value: 'Give a number or a decimal in quotes.',
};
