import { afterEach, describe, expect, it, vi } from 'vitest';
import { Expected } from './expected';
import { seededCases } from './seeded-cases';

/** The one fault that the engine has at the moment. */
const planted = vi.hoisted(() => ({ fault: '' }));
const has = vi.hoisted(() => (fault: string) => planted.fault === fault);

vi.mock(import('#rules/numerics/round'), async (original) => {
  const real = await original();
  return {
    ...real,
    roundTo: (options) => {
      const { value, to, method } = options;
      if (has('ties go up') && method === 'rounding') return real.roundTo({ ...options, method: 'half-up' });
      if (has('ties go to even always') && method === 'half-up') {
        return real.roundTo({ ...options, method: 'rounding' });
      }
      if (has('truncation rounds') && method === 'truncate')
        return real.roundTo({ ...options, method: 'rounding' });
      if (has('the absolute method rounds') && method === 'absolute') {
        return real.roundTo({ value, to: 0.1, method: 'rounding' });
      }
      if (has('values are rounded twice') && method !== 'absolute') {
        return real.roundTo({ ...options, value: real.roundTo({ value, to: to / 10, method: 'half-up' }) });
      }
      return real.roundTo(options);
    },
  };
});

vi.mock(import('#rules/engine/judge'), async (original) => {
  const real = await original();
  return {
    ...real,
    judge: (judgeable, limit, rounder) => {
      if (has('exclusive limits include themselves')) {
        return real.judge(judgeable, { ...limit, minExclusive: false, maxExclusive: false }, rounder);
      }
      if (has('limits exclude themselves')) {
        return real.judge(judgeable, { ...limit, minExclusive: true, maxExclusive: true }, rounder);
      }
      if (has('min and max change places')) {
        return real.judge(judgeable, { ...limit, min: limit.max, max: limit.min }, rounder);
      }
      if (has('a censored value is its number')) {
        return real.judge({ ...judgeable, allowed: null, text: null }, limit, rounder);
      }
      const judgement = real.judge(judgeable, limit, rounder);
      const { margin } = judgement;
      if (has('the margin has no sign') && margin !== null) return { ...judgement, margin: Math.abs(margin) };
      return judgement;
    },
  };
});

vi.mock(import('#rules/numerics/spread'), async (original) => {
  const real = await original();
  return {
    ...real,
    sampleStandardDeviation: (values) => {
      const result = real.sampleStandardDeviation(values);
      if (!has('deviations are divided by n') || !result.ok) return result;
      return { ...result, value: result.value * Math.sqrt((values.length - 1) / values.length) };
    },
  };
});

vi.mock(import('#rules/numerics/percent-within-limits'), async (original) => {
  const real = await original();
  return {
    ...real,
    percentWithinLimits: (options) =>
      real.percentWithinLimits(
        has('only one side is within limits') && options.upper !== null
          ? { ...options, lower: null }
          : options,
      ),
  };
});

vi.mock(import('#rules/numerics/mean'), async (original) => {
  const real = await original();
  return {
    ...real,
    trimmedMean: (values, dropped) =>
      has('nothing is trimmed') ? real.mean(values) : real.trimmedMean(values, dropped),
  };
});

vi.mock(import('#rules/engine/evaluate-value'), async (original) => {
  const real = await original();
  return {
    ...real,
    evaluateValue: (request) => {
      const { measure } = request;
      if (measure.kind !== 'reading') return real.evaluateValue(request);
      if (has('the least count is not asked')) {
        return real.evaluateValue({ ...request, measure: { ...measure, minimumCount: undefined } });
      }
      if (has('single values are not looked at')) {
        return real.evaluateValue({ ...request, measure: { ...measure, alsoEach: undefined } });
      }
      return real.evaluateValue(request);
    },
  };
});

vi.mock(import('#rules/engine/where'), async (original) => {
  const real = await original();
  return {
    ...real,
    applyWhere: (world, request, sample) => {
      if (has('every specimen counts')) return { ok: true, items: sample.items };
      const kept = real.applyWhere(world, request, sample);
      const isLenient = has('a specimen of which nothing is known counts') && !kept.ok;
      return isLenient ? { ok: true, items: sample.items } : kept;
    },
  };
});

vi.mock(import('#rules/engine/decide'), async (original) => {
  const real = await original();
  return {
    ...real,
    decide: (condition, factOf) => {
      const truth = real.decide(condition, factOf);
      if (has('what is not known does not apply') && truth === 'unknown') return 'false';
      if (has('what is not known applies') && truth === 'unknown') return 'true';
      return truth;
    },
  };
});

vi.mock(import('#rules/rule-sets/table-keys'), async (original) => {
  const real = await original();
  return {
    ...real,
    keyCovers: (cell, value) => {
      const range = typeof cell === 'object' && cell !== null && !Array.isArray(cell) ? cell : null;
      if (range !== null && has('ranges include their end') && range.below === value) return true;
      if (range !== null && has('ranges leave out their start') && range.from === value) return false;
      return real.keyCovers(cell, value);
    },
  };
});

vi.mock(import('#rules/quantities/units'), async (original) => {
  const real = await original();
  return {
    ...real,
    convert: (value, from, to) =>
      has('units are not converted') ? { ok: true, value } : real.convert(value, from, to),
  };
});

vi.mock(import('#rules/engine/select'), async (original) => {
  const real = await original();
  return {
    ...real,
    select: (selection) => {
      const { temperature: _temperature, ...others } = selection.wanted;
      if (has('any temperature will do')) return real.select({ ...selection, wanted: others });
      const chosen = real.select(selection);
      const isMixed = has('several conditions are one') && !chosen.ok && chosen.outcome === 'undecided';
      return isMixed ? { ok: true, chosen: selection.candidates } : chosen;
    },
  };
});

vi.mock(import('#rules/engine/scope'), async (original) => {
  const real = await original();
  return {
    ...real,
    inScope: (scope) => {
      const { laboratory, trial } = scope.wanted;
      if (has('the contractor speaks for the agency') && laboratory === 'agency') {
        return real.inScope({ ...scope, wanted: { ...scope.wanted, laboratory: 'contractor' } });
      }
      if (has('any trial is the design') && (trial ?? 'design') === 'design') {
        const candidates = scope.candidates.map((each) => ({ ...each, at: { ...each.at, trial: 'design' } }));
        return real.inScope({ ...scope, candidates });
      }
      return real.inScope(scope);
    },
  };
});

vi.mock(import('#rules/engine/doubts'), async (original) => {
  const real = await original();
  return {
    ...real,
    doubtAbout: (...input) => (has('doubts are not heeded') ? null : real.doubtAbout(...input)),
  };
});

vi.mock(import('#rules/engine/alternatives'), async (original) => {
  const real = await original();
  return {
    ...real,
    unsettledBy: (input) => (has('answers to doubts are not tried') ? new Map() : real.unsettledBy(input)),
  };
});

vi.mock(import('#rules/rule-sets/apply-layer'), async (original) => {
  const real = await original();
  return {
    ...real,
    applyLayer: (edition, layer) => {
      const replace = { rules: [], tables: [], attributes: [] };
      return real.applyLayer(edition, has('layers replace nothing') ? { ...layer, replace } : layer);
    },
  };
});

vi.mock(import('#rules/rule-sets/patch-row'), async (original) => {
  const real = await original();
  return {
    ...real,
    patchRow: (patching) => (has('rows are not patched') ? patching.tables : real.patchRow(patching)),
  };
});

vi.mock(import('#rules/engine/calendar'), async (original) => {
  const real = await original();
  return {
    ...real,
    addMonths: (date, months) => real.addMonths(date, has('a month is forgotten') ? months - 1 : months),
  };
});

vi.mock(import('#rules/engine/precision'), async (original) => {
  const real = await original();
  return {
    ...real,
    isBorderline: (margin, precision) => {
      if (!has('the precision itself is not borderline')) return real.isBorderline(margin, precision);
      return margin !== null && precision !== null && Math.abs(margin) < precision.value;
    },
  };
});

vi.mock(import('#rules/engine/quantity-value'), async (original) => {
  const real = await original();
  return {
    ...real,
    quantityValue: (world, quantity, at) => {
      const result = real.quantityValue(world, quantity, at);
      const isAbsent = !result.ok && result.outcome === 'not shown';
      return has('what is absent is nought') && isAbsent ? { ok: true, value: 0 } : result;
    },
  };
});

vi.mock(import('#rules/engine/compute-formula'), async (original) => {
  const real = await original();
  return {
    ...real,
    computeFormula: (expression, values) => {
      const result = real.computeFormula(expression, values);
      return has('what cannot be computed is nought') && !result.ok ? { ok: true, value: 0 } : result;
    },
  };
});

vi.mock(import('#rules/engine/creep-selection'), async (original) => {
  const real = await original();
  return {
    ...real,
    testedAt: (points, time) =>
      has('loading times match to the second')
        ? points.filter(({ at }) => at.time === time)
        : real.testedAt(points, time),
  };
});

vi.mock(import('#rules/engine/attribute-fact'), async (original) => {
  const real = await original();
  return {
    ...real,
    attributeFact: (world, name) => {
      const fact = real.attributeFact(world, name);
      const isUnlisted = has('a value that no list has is taken as it stands') && fact.kind === 'doubtful';
      const stated = world.record.attributes[name]?.value;
      return isUnlisted && stated !== undefined ? { kind: 'value', value: stated } : fact;
    },
  };
});

vi.mock(import('#rules/engine/unusable-retained'), async (original) => {
  const real = await original();
  return {
    ...real,
    unusableRetained: (...input) =>
      has('a percent retained without a number is absent') ? null : real.unusableRetained(...input),
  };
});

vi.mock(import('#rules/calculations/combined-gravity'), async (original) => {
  const real = await original();
  return {
    ...real,
    combinedGravity: (shares) =>
      has('gravities are shared by mass') ? real.combinedAbsorption(shares) : real.combinedGravity(shares),
    combinedAbsorption: (shares) =>
      real.combinedAbsorption(
        has('stockpiles weigh alike') ? shares.map((each) => ({ ...each, share: 1 })) : shares,
      ),
  };
});

vi.mock(import('#rules/calculations/gradation'), async (original) => {
  const real = await original();
  return {
    ...real,
    combinedPassing: (shares) => {
      if (!has('shares are stretched to 100')) return real.combinedPassing(shares);
      const all = shares.reduce((sum, { share }) => sum + share, 0);
      return real.combinedPassing(shares.map((each) => ({ ...each, share: (100 * each.share) / all })));
    },
  };
});

vi.mock(import('#rules/calculations/design-point'), async (original) => {
  const real = await original();
  return {
    ...real,
    propertyAt: (points, Pb, method) => {
      if (has('trials are always joined by lines')) return real.propertyAt(points, Pb, 'linear');
      const contents = points.map((point) => point.Pb);
      const inside = Math.min(Math.max(Pb, Math.min(...contents)), Math.max(...contents));
      return real.propertyAt(points, has('trials reach beyond their ends') ? inside : Pb, method);
    },
  };
});

vi.mock(import('#rules/engine/statistic'), async (original) => {
  const real = await original();
  return {
    ...real,
    statisticOf: (request) => {
      const { sample } = request;
      const isSingle = has('a value between trials is a specimen') && sample.interpolated;
      const single = { ...sample, interpolated: false, meanOnly: false };
      return real.statisticOf(isSingle ? { ...request, sample: single } : request);
    },
  };
});

vi.mock(import('#rules/engine/specimens-of-tests'), async (original) => {
  const real = await original();
  return {
    ...real,
    unsettledByTests: (input) =>
      has('specimens of other tests are the design’s') ? new Map() : real.unsettledByTests(input),
  };
});

vi.mock(import('#rules/calculations/creep-fit'), async (original) => {
  const real = await original();
  return {
    ...real,
    fitCreep: (...input) => {
      const result = real.fitCreep(...input);
      const isKept = has('no fit is rejected') && result.ok;
      return isKept ? { ok: true, fit: { ...result.fit, rejected: null } } : result;
    },
  };
});

vi.mock(import('#rules/calculations/creep-compliance'), async (original) => {
  const real = await original();
  return {
    ...real,
    decadesBeyond: (...input) =>
      has('curves hold at any loading time') ? { ok: true, value: 0 } : real.decadesBeyond(...input),
  };
});

const FAULTS = [
  'ties go up',
  'ties go to even always',
  'truncation rounds',
  'the absolute method rounds',
  'values are rounded twice',
  'exclusive limits include themselves',
  'limits exclude themselves',
  'min and max change places',
  'a censored value is its number',
  'the margin has no sign',
  'deviations are divided by n',
  'only one side is within limits',
  'nothing is trimmed',
  'the least count is not asked',
  'single values are not looked at',
  'every specimen counts',
  'a specimen of which nothing is known counts',
  'what is not known does not apply',
  'what is not known applies',
  'ranges include their end',
  'ranges leave out their start',
  'units are not converted',
  'any temperature will do',
  'several conditions are one',
  'the contractor speaks for the agency',
  'any trial is the design',
  'doubts are not heeded',
  'answers to doubts are not tried',
  'layers replace nothing',
  'rows are not patched',
  'a month is forgotten',
  'the precision itself is not borderline',
  'what is absent is nought',
  'what cannot be computed is nought',
  'loading times match to the second',
  'a value that no list has is taken as it stands',
  'a percent retained without a number is absent',
  'gravities are shared by mass',
  'stockpiles weigh alike',
  'shares are stretched to 100',
  'trials are always joined by lines',
  'trials reach beyond their ends',
  'a value between trials is a specimen',
  'specimens of other tests are the design’s',
  'no fit is rejected',
  'curves hold at any loading time',
];

describe('a fault that is planted in the engine', { timeout: 120_000 }, () => {
  const cases = seededCases(412, 1500).map((drawn) => new Expected(drawn));

  afterEach(() => {
    planted.fault = '';
  });

  it('is the only thing that the two evaluators part on', () => {
    expect(cases.slice(0, 200).flatMap(({ disagreements }) => disagreements)).toEqual([]);
  });

  it.each(FAULTS)('is found out: %s', (fault) => {
    planted.fault = fault;
    expect(cases.some(({ disagreements }) => disagreements.length > 0)).toBe(true);
  });
});
