import { readWorkbook } from '#rules/reading/interpret';
import { templateMapping } from '#rules/reading/template-mapping';
import { decodeWorkbook } from '#server/workbook/decode';
import { demoEdition, demoWorkbooks } from '#tests/workbooks/demo/write-demo-workbooks';
import { benchCreepFit } from './creep-fit';
import { benchFirstScreen } from './first-screen';
import { benchFullCheck, benchGrowth } from './full-check';
import { benchLighthouse } from './lighthouse';
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

console.log(await benchFullCheck(record, edition));
console.log(await benchGrowth(record, edition));
console.log(benchCreepFit());
console.log(await benchUploadToFindings(bytes, edition));
console.log(benchFirstScreen());
console.log(await benchStart());
console.log(await benchLighthouse());
