import { describe, expect, it } from 'vitest';
import { type RuleSet, ruleSetSchema } from '#rules/rule-sets/schema';
import performance2026 from '#rules/sets/cvra-431-2026.json';

const edition: RuleSet = ruleSetSchema.parse(performance2026);

function limitOf(id: string) {
  return edition.rules.find((rule) => rule.id === id)?.limit;
}

function rowsOf(id: string) {
  return edition.tables.find((table) => table.id === id)?.rows;
}

describe('published figures in Section 431', () => {
  it('keeps what open-graded mixes are asked for', () => {
    // NCAT Report 99-3 and AASHTO PP 77, from memory: voids of 18 % or more, abrasion loss of 20 % unaged and 30 % aged,
    // draindown of 0.3 %, permeability of 100 m a day, tensile strength ratio of 0.8, stone on stone.
    expect(limitOf('open-voids-min')).toEqual({ min: '18.0' });
    expect(limitOf('cantabro-unaged')).toEqual({ max: '20.0' });
    expect(limitOf('cantabro-aged')).toEqual({ max: '30.0' });
    expect(limitOf('draindown')).toEqual({ max: '0.30' });
    expect(rowsOf('permeability-open')).toEqual([{ mixType: 'open-graded', min: '100' }]);
    expect(limitOf('tensile-strength-ratio')).toEqual({ min: '80' });
    expect(limitOf('stone-on-stone')?.max).toMatchObject({ exclusive: true });
  });

  it('keeps what stone matrix mixes are asked for', () => {
    // AASHTO M 325, from memory: voids in the mineral aggregate of 17.0 %, 6.0 % binder, abrasion loss of 30 %, 5 % flat
    // and elongated at 5 to 1.
    expect(limitOf('vma-stone-matrix')).toEqual({ min: '17.0' });
    expect(rowsOf('binder-min')).toContainEqual({ mixType: 'stone-matrix', min: '6.0' });
    expect(limitOf('abrasion-loss')).toEqual({ max: '30' });
    expect(limitOf('flat-and-elongated')).toEqual({ max: '5' });
  });

  it('keeps the passes by binder grade as printed', () => {
    // TxDOT specification of 2004, Tex-242-F, as quoted on the slide read: PG 64 or lower 10,000, PG 70 15,000, PG 76 or
    // higher 20,000 passes to 12.5 mm at 50 °C.
    const rows = rowsOf('passes-min')?.map((row) => [row.binderGrade, Number(row.min)]);
    expect(rows).toEqual([
      ['PG 58-28', 10_000],
      ['PG 64-22', 10_000],
      ['PG 70-22', 15_000],
      ['PG 76-22', 20_000],
    ]);
  });

  it('keeps the thresholds of balanced mix design as printed', () => {
    // VTRC 26-R08 (2025), abstract (read): cracking tolerance index of 70 or more, Cantabro loss of 7.5 % or less.
    expect(limitOf('cracking-index')).toEqual({ min: '70' });
    expect(limitOf('cantabro-dense')).toEqual({ max: '7.5' });
  });

  it('asks no creep compliance that lies outside what mixtures have', () => {
    // Typical at 100 s in 1/GPa, from memory: 0.04 to 0.10 at −20 °C and 0.06 to 0.25 at −10 °C.
    const limits = rowsOf('creep-cold') ?? [];
    const of = (column: string) =>
      limits.flatMap((row) => (row[column] === null ? [] : [Number(row[column])]));
    expect(of('atMinus20').length + of('atMinus10').length).toBe(5);
    for (const limit of of('atMinus20')) expect(limit >= 0.04 && limit <= 0.1).toBe(true);
    for (const limit of of('atMinus10')) expect(limit >= 0.06 && limit <= 0.25).toBe(true);
  });
});
