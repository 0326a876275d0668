import type { Quantity } from '../quantities/quantity';
import { allQuantities } from '../quantities/registry';
import type { Conditions, Doubt } from '../record';
import type { Evidence } from './finding';
import { type Obstacle, undecided } from './obstacle';
import type { Sample, SampleRequest } from './sample';
import { isPerTrial } from './scope';
import { allowanceOf } from './select';
import { statedGyrations } from './stated-gyrations';
import type { World } from './world';

/**
 * Why a value is doubtful, or null: an unanswered doubt about it, or about what it is derived from, at conditions
 * for which no sure reading exists.
 */
export function doubtAbout(world: World, request: SampleRequest, sample: Sample | null): Obstacle | null {
  if (world.record.doubts.length === 0) return null;
  const concerned = concernedBy(world, request, sample);
  const trials = trialsOf(request, sample);
  for (const doubt of world.record.doubts) {
    for (const subject of subjectsOf(doubt)) {
      const isConcerned = concerned.some(
        ({ quantity, at, fromSieve = 0 }) =>
          quantity === subject.quantity &&
          (subject.at.sieve ?? fromSieve) >= fromSieve &&
          couldBe(world, subject, at, trials),
      );
      if (isConcerned && !hasSureReading(world, subject))
        return undecided(doubtWords(world, doubt, subject.quantity), answerWords(doubt));
    }
  }
  return null;
}

interface Subject {
  quantity: string;
  at: Conditions;
  /** mm; of what is retained on sieves, the finest that counts. */
  fromSieve?: number;
}

/** A value that was read stands on its own; what was, or could have been, computed stands on its inputs too. */
function concernedBy(world: World, request: SampleRequest, sample: Sample | null): Subject[] {
  const own = { quantity: request.quantity, at: request.at };
  if (sample === null) {
    const laboratory = request.at.laboratory === undefined ? {} : { laboratory: request.at.laboratory };
    const inputs = [...inputsOf(world, request.quantity)].map((quantity) => ({
      quantity,
      at: quantity === PASSING ? { ...laboratory, sieve: DUST_SIEVE_MM } : laboratory,
    }));
    return [own, ...(request.quantity === PASSING ? retainedBehind(request.at) : []), ...inputs];
  }
  if (sample.recomputed === null) return [own];
  const inputs: Subject[] = [];
  const visit = (evidence: Evidence) => {
    const { specimen: _specimen, trial: _trial, ...at } = evidence.at ?? {};
    inputs.push({ quantity: evidence.quantity, at });
    evidence.inputs?.forEach(visit);
  };
  sample.recomputed.inputs.forEach(visit);
  const isPassing = sample.recomputed.quantity === PASSING && sample.recomputed.origin === 'converted';
  return isPassing ? [...inputs, ...retainedBehind(sample.recomputed.at)] : inputs;
}

/** What percent passing follows from where a gradation is stated as retained: all that stays on it and above. */
function retainedBehind({ sieve, ...at }: Conditions): Subject[] {
  const { specimen: _specimen, trial: _trial, ...material } = at;
  return [
    { quantity: 'cumulative-percent-retained', at: sieve === undefined ? material : { ...material, sieve } },
    { quantity: 'percent-retained', at: material, ...(sieve === undefined ? {} : { fromSieve: sieve }) },
  ];
}

const PASSING = 'percent-passing';

/** The one sieve that a derived quantity rests on, in mm. */
const DUST_SIEVE_MM = 0.075;

/** "Answer the doubt at Trials E9." */
export function answerWords({ sheet, cell }: Pick<Doubt, 'sheet' | 'cell'>): string {
  return `Answer the doubt at ${sheet === '' ? '' : `${sheet} `}${cell}.`;
}

export function doubtWords(world: World, doubt: Doubt, quantity: string): string {
  const label = world.view.quantity(quantity)?.label ?? quantity;
  const sheet = doubt.sheet === '' ? '' : `${doubt.sheet} `;
  return `A cell with ${label} (${sheet}${doubt.cell}) was not read with certainty: ${doubt.reason.replace(/\.$/, '')}.`;
}

/** What the cell may be a reading of. */
export function subjectsOf(doubt: Doubt): Subject[] {
  const subjects = doubt.alternatives.flatMap(({ reading }) =>
    reading ? [{ quantity: reading.quantity, at: reading.at }] : [],
  );
  const { quantity, at } = doubt.about;
  return quantity === undefined ? subjects : [...subjects, { quantity, at: at ?? {} }];
}

/** Whether a doubtful cell could be among the values that a request selects. */
function couldBe(world: World, doubted: Subject, wanted: Conditions, trials: Set<string>): boolean {
  if ((doubted.at.laboratory ?? 'contractor') !== (wanted.laboratory ?? 'contractor')) return false;
  if (doubted.at.stockpile !== wanted.stockpile && wanted.stockpile !== 'each') return false;
  const { trial } = doubted.at;
  const belongsToTrial = isPerTrial(world, doubted.quantity)
    ? trials.has(trial ?? 'design')
    : trial === undefined || trials.has(trial);
  return (
    belongsToTrial && TEST_CONDITIONS.every((name) => agree(world, name, doubted.at[name], wanted[name]))
  );
}

function agree(
  world: World,
  name: (typeof TEST_CONDITIONS)[number],
  doubted: string | number | undefined,
  wanted: string | number | undefined,
): boolean {
  if (doubted === undefined || wanted === undefined) return true;
  if (typeof doubted !== typeof wanted) {
    const [named, number] = typeof doubted === 'string' ? [doubted, wanted] : [wanted, doubted];
    const resolved = statedGyrations(world, String(named));
    // Not knowing whether a name and a number are the same counts as a doubt.
    return resolved === null || resolved === number;
  }
  if (typeof doubted === 'number' && typeof wanted === 'number') {
    return Math.abs(doubted - wanted) <= allowanceOf(name, wanted);
  }
  return doubted === wanted;
}

function hasSureReading(world: World, { quantity, at: doubted }: Subject): boolean {
  return (world.readings.get(quantity) ?? []).some(({ at, fault }) => fault === null && covers(at, doubted));
}

/** A sure reading at the same conditions, the specimen included. */
function covers(sure: Conditions, doubted: Conditions): boolean {
  if ((sure.laboratory ?? 'contractor') !== (doubted.laboratory ?? 'contractor')) return false;
  if ((sure.trial ?? 'design') !== (doubted.trial ?? 'design')) return false;
  return (['specimen', 'stockpile', ...TEST_CONDITIONS] as const).every(
    (name) => doubted[name] === undefined || sure[name] === doubted[name],
  );
}

function trialsOf(request: SampleRequest, sample: Sample | null): Set<string> {
  const trials = new Set([request.at.trial ?? 'design']);
  const visit = (evidence: Evidence) => {
    if (evidence.at?.trial !== undefined) trials.add(evidence.at.trial);
    evidence.inputs?.forEach(visit);
  };
  sample?.recomputed?.inputs.forEach(visit);
  return trials;
}

const TEST_CONDITIONS = [
  'sieve',
  'variant',
  'gyrations',
  'temperature',
  'time',
  'stress',
  'passes',
  'frequency',
  'aging',
] as const;

/** Everything that a derived quantity is computed from, as its formula in the registry names it. */
function inputsOf(world: World, id: string): Set<string> {
  const kept = inputsByQuantity.get(id);
  if (kept) return kept;
  const inputs = new Set<string>();
  inputsByQuantity.set(id, inputs);
  const quantity = world.view.quantity(id);
  for (const input of quantity ? namedInFormula(quantity) : []) {
    if (input === id || inputs.has(input)) continue;
    inputs.add(input);
    for (const deeper of inputsOf(world, input)) if (deeper !== id) inputs.add(deeper);
  }
  return inputs;
}

const inputsByQuantity = new Map<string, Set<string>>();

/** The quantities whose symbols stand in the registry's formula of a derived one. */
export function namedInFormula(quantity: Quantity): string[] {
  const formula = quantity.derivation ?? '';
  const symbols = new Set(formula.match(/%?[A-Za-z][A-Za-z0-9,.]*/g) ?? []);
  if (symbols.has('Ps')) symbols.add('Pb');
  if ([...symbols].some((symbol) => /^P0\.075|^P200/.test(symbol)))
    return [...named(symbols), 'percent-passing'];
  return named(symbols);
}

function named(symbols: Set<string>): string[] {
  return allQuantities().flatMap(({ id, symbol }) => (symbols.has(symbol) ? [id] : []));
}
