import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { resolvedLimitSchema } from '#rules/engine/finding';
import { letterDefinition } from '#server/documents/letter-definition';
import { renderPdf } from '#server/documents/render-pdf';
import { aDocumentInput } from '#tests/builders/a-document-input';
import { aFinding } from '#tests/builders/a-finding';

const limitOf = (limit: object) => resolvedLimitSchema.parse({ min: null, max: null, unit: '%', ...limit });

function textOf(pdf: Buffer): string {
  const folder = mkdtempSync(join(tmpdir(), 'letter-'));
  try {
    const file = join(folder, 'letter.pdf');
    writeFileSync(file, pdf);
    return execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const findings = [
  aFinding({ outcome: 'fail', borderline: true, precision: { value: 0.4, origin: 'agency' } }),
  aFinding({
    rule: 'tsr',
    clause: '412.05(a)',
    outcome: 'not shown',
    observed: null,
    margin: null,
    sentence: 'Tensile strength ratio is not shown, at least 80 %.',
    reason: 'No reading of the tensile strength ratio was found.',
    evidence: [],
  }),
  aFinding({
    rule: 'air',
    clause: '412.03(a)',
    outcome: 'undecided',
    margin: null,
    sentence: 'Air voids are 4.6 %, 3.5 to 4.5.',
    reason: 'One specimen; two decide it.',
    limit: limitOf({ min: 3.5, max: 4.5, target: 4, tolerance: 0.5, decimals: 1, unit: '%' }),
    observed: { value: 4.61, rounded: 4.6, text: '4.6', unit: '%', statistic: 'mean', count: 1 },
  }),
];

describe('the letter of a return', () => {
  it('carries agency, reference, disposition and every finding in the order put right, send, settle', async () => {
    const text = textOf(await renderPdf(letterDefinition(aDocumentInput({ findings }))));
    expect(text).toContain('Carrow Valley Roads Authority');
    expect(text).toContain('CV-2031 / BW-125-S4 / r1');
    expect(text).toContain('BW-125-S4 revision 1: revise and resubmit');
    const places = ['Put right', '412.03(b)', 'Send', '412.05(a)', 'Settle', '412.03(a)'].map((part) =>
      text.indexOf(part),
    );
    expect(places.every((place) => place > 0)).toBe(true);
    expect([...places].sort((a, b) => a - b)).toEqual(places);
  });

  it('sets signs that the text face lacks so that they can be read back', async () => {
    const input = aDocumentInput({ findings, reason: 'VMA ≥ 14.0 and √2 ≈ 1.41, −0.1 µm at 25 °C → pass' });
    const text = textOf(await renderPdf(letterDefinition(input)));
    expect(text.replace(/\s+/g, ' ')).toContain('VMA ≥ 14.0 and √2 ≈ 1.41, −0.1 µm at 25 °C → pass');
  });

  it('repeats the group heading and numbers its pages when it runs over', async () => {
    const many = Array.from({ length: 60 }, (_, index) =>
      aFinding({ outcome: 'fail', rule: `rule-${index}`, clause: `412.03(${index})` }),
    );
    const text = textOf(await renderPdf(letterDefinition(aDocumentInput({ findings: many }))));
    const pages = text.split('\f').filter((page) => page.trim() !== '');
    expect(pages.length).toBeGreaterThan(2);
    expect(pages[1]).toContain('Put right');
    expect(pages[1]).toContain(`2 of ${pages.length}`);
  });

  it('ends with the room to move, after what is for information', async () => {
    const room = {
      answer: 'A binder content of 5.10 to 5.51 % meets the one rule that can be followed.',
      lines: [{ clause: '412.03(b)', title: 'VMA', limit: 'at least 14.0 %', holds: '5.10 to 5.51 %' }],
      notes: ['Read between four trials.'],
    };
    const text = textOf(await renderPdf(letterDefinition(aDocumentInput({ findings, room })))).replace(
      /\s+/g,
      ' ',
    );
    expect(text).toMatch(/Put right.*Room to move.*412\.03\(b\) VMA at least 14\.0 % 5\.10 to 5\.51 %/);
    expect(text).toContain(room.answer);
    const without = textOf(await renderPdf(letterDefinition(aDocumentInput({ findings }))));
    expect(without).not.toContain('Room to move');
  });

  it('says what would pass and what would decide beside the finding', async () => {
    const input = aDocumentInput({
      findings: [
        aFinding({ outcome: 'fail' }),
        aFinding({ rule: 'b', outcome: 'undecided', wouldDecide: 'Answer the doubt at Trials E9.' }),
      ],
    });
    const items = input.items.map((item, place) =>
      place === 0 ? { ...item, toPass: 'Gmb of 2.431 or less instead of 2.442.' } : item,
    );
    const text = textOf(await renderPdf(letterDefinition({ ...input, items }))).replace(/\s+/g, ' ');
    expect(text).toContain('To pass: Gmb of 2.431 or less instead of 2.442.');
    expect(text).toContain('What would decide it: Answer the doubt at Trials E9.');
  });

  it('says the cautions and that the rule set is a starting point', async () => {
    const text = textOf(await renderPdf(letterDefinition(aDocumentInput({ findings })))).replace(/\s+/g, ' ');
    expect(text).toContain('Findings assist a qualified person and decide nothing by themselves.');
    expect(text).toContain('The contract documents and local codes govern;');
    expect(text).toContain('Starting point: check every limit');
  });
});
