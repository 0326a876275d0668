import { parseArgs } from 'node:util';
import { evaluate } from '#rules/engine/evaluate';
import { readWorkbook } from '#rules/reading/interpret';
import { templateMapping } from '#rules/reading/template-mapping';
import '#server/lend-digest';
import { decodeWorkbook } from '#server/workbook/decode';
import { demoEdition, demoWorkbooks } from '#tests/workbooks/demo/write-demo-workbooks';
import { benchCreepFit } from './creep-fit';
import { benchFirstScreen } from './first-screen';
import { benchFullCheck, benchGrowth } from './full-check';
import { benchLighthouse } from './lighthouse';
import { benchLists } from './lists';
import { benchUploadToFindings } from './upload-to-findings';
import { benchStart } from './warm-start';

const edition = demoEdition();
const [workbook] = await demoWorkbooks();
if (workbook === undefined) throw new Error('The demo has no workbook.');
const bytes = Buffer.from(workbook.bytes);
const decoded = await decodeWorkbook(bytes, workbook.name);
if (!decoded.ok) throw new Error(decoded.problem.detail);
const { record } = readWorkbook({
  grid: decoded.grid,
  mapping: templateMapping(edition),
  edition,
  answers: [],
});

const context = { submittedOn: '2026-03-09', lettingOn: '2026-01-14', facts: {} };

/** Every row of the bench by its name; the longest is run only where it is asked for. */
const rows: Record<string, () => string | Promise<string>> = {
  check: () => benchFullCheck(record, edition),
  growth: () => benchGrowth(record, edition),
  creep: () => benchCreepFit(),
  upload: () => benchUploadToFindings(bytes, edition),
  screen: () => benchFirstScreen(),
  start: () => benchStart(),
  lighthouse: () => benchLighthouse(),
  lists: () => benchLists(Number(values.submittals), evaluate(record, edition, context)),
};

const { values } = parseArgs({
  options: { only: { type: 'string' }, submittals: { type: 'string', default: '100000' } },
});
const { only } = values;
if (only !== undefined && !(only in rows)) throw new Error(`--only takes ${Object.keys(rows).join(', ')}.`);
for (const [name, row] of Object.entries(rows)) {
  if (only === undefined ? name !== 'lists' : name === only) console.log(await row());
}
