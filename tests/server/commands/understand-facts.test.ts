import { describe, expect, it } from 'vitest';
import type { AttributeDefinition } from '#rules/rule-sets/attribute';
import { understandFacts } from '#server/commands/projects/understand-facts';
import { Problem } from '#server/problem';

const course: AttributeDefinition = {
  name: 'course',
  label: 'Course',
  type: 'text',
  values: [{ value: 'surface', aliases: ['wearing'] }, 'base'],
};
const area: AttributeDefinition = { name: 'area', label: 'Area', type: 'text', values: ['runway', 'apron'] };
const pressure: AttributeDefinition = { name: 'pressure', label: 'Pressure', type: 'number', unit: 'psi' };
const road = { attributes: [course] };
const airfield = {
  attributes: [{ ...course, values: [{ value: 'surface', aliases: ['wearing'] }] }, area, pressure],
};

const faults = (facts: Parameters<typeof understandFacts>[0], editions = [road]) => {
  try {
    return understandFacts(facts, { editions, by: 'every' });
  } catch (error) {
    if (error instanceof Problem) return error.details.errors;
    throw error;
  }
};

describe('what a project states', () => {
  it.each([
    [{ course: 'wearing' }, { course: 'surface' }],
    [{ course: 'Surface course' }, { course: 'surface' }],
    [{ designTraffic: '12' }, { designTraffic: 12 }],
    [{ designTraffic: '3.5' }, { designTraffic: 3.5 }],
    // So many axle loads counted singly; the attribute's unit is the million.
    [{ designTraffic: '12,000,000' }, { designTraffic: 12 }],
    [{ pressure: '1 ksi' }, { pressure: 1000 }],
    [{}, {}],
  ])('%j is kept in the words and units of the section: %j', (stated, kept) => {
    expect(faults(stated, [airfield])).toEqual(kept);
  });

  it.each([
    ['3,5', 'Design traffic cannot be “3,5”.', 'Enter a number.'],
    ['heavy', 'Design traffic cannot be “heavy”.', 'Enter a number.'],
    ['3.5 mm', 'Design traffic cannot be “3.5 mm”.', 'Enter a number.'],
    [Number.NaN, 'Design traffic cannot be “NaN”.', 'Enter a number.'],
  ])('design traffic of %s is refused at its field', (designTraffic, detail, fix) => {
    expect(faults({ designTraffic })).toEqual([{ pointer: '/facts/designTraffic', detail, fix }]);
  });

  it('is refused with all faults at once, each with what can be chosen', () => {
    expect(faults({ course: 'roof', area: 'runway', designTraffic: '?' }, [road])).toEqual([
      { pointer: '/facts/course', detail: 'Course cannot be “roof”.', fix: 'Choose one of surface, base.' },
      {
        pointer: '/facts/area',
        detail: 'No edition that judges this project knows the attribute area.',
        fix: 'Leave it empty.',
      },
      {
        pointer: '/facts/designTraffic',
        detail: 'Design traffic cannot be “?”.',
        fix: 'Enter a number.',
      },
    ]);
  });

  it('has to be understood by every section that knows the attribute', () => {
    expect(faults({ course: 'surface', area: 'apron' }, [road, airfield])).toEqual({
      course: 'surface',
      area: 'apron',
    });
    expect(faults({ course: 'base' }, [road, airfield])).toEqual([
      { pointer: '/facts/course', detail: 'Course cannot be “base”.', fix: 'Choose one of surface.' },
    ]);
  });

  it('has to be understood by some edition while the project has no section', () => {
    const editions = [road, airfield];
    expect(understandFacts({ course: 'base', area: 'apron' }, { editions, by: 'some' })).toEqual({
      course: 'base',
      area: 'apron',
    });
    expect(() => understandFacts({ course: 'roof' }, { editions, by: 'some' })).toThrow(Problem);
  });
});
