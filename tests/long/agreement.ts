import { parseArgs } from 'node:util';
import { runAgreement } from '#tests/second-evaluator/agreement-run';

/**
 * The engine against the second evaluator over many drawn records and rule sets: `--cases 100000 --seed 1`.
 * Ends with 1 on the first disagreement, in its smallest form, or where an outcome came up too seldom.
 */
const { values } = parseArgs({
  options: { cases: { type: 'string', default: '100000' }, seed: { type: 'string', default: '1' } },
});
const cases = Number(values.cases);
const seed = Number(values.seed);

const tally = runAgreement({
  seed,
  cases,
  onProgress: (judged, { findings }) => {
    if (judged % 10_000 === 0) console.log(`${judged} records and rule sets, ${findings} findings agree`);
  },
});
console.log(`Seed ${seed}: ${cases} records and rule sets, ${tally.findings} findings, no disagreement.`);
console.log(`${tally.borderline} of them borderline.`);
for (const kind of tally.kinds) {
  const shares = Object.entries(tally.shares(kind)).map(
    ([outcome, share]) => `${outcome} ${share.toFixed(1)} %`,
  );
  console.log(`${kind}: ${shares.join(', ')}`);
}
const seldom = tally.seldom(5);
if (seldom.length > 0) {
  console.error(`Too seldom to mean something: ${seldom.join('; ')}.`);
  process.exitCode = 1;
}
