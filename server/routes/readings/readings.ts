import { getReading, getSheet, keepAnswer, keepAttributes } from '#shared/contracts/readings';
import { keepAttributes as keepTyped } from '../../commands/readings/keep-attributes';
import { gridOf, loadSheet } from '../../db/queries/cell-grids';
import { usesOfSheet } from '../../db/queries/cell-uses';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectRevision } from '../submittals/load-revision';
import { changeAndView } from './corrections';
import { expectDraft } from './expect-draft';
import { viewReading } from './view-reading';

export const getReadingRoute = route(getReading, async ({ deps, params, actor }) =>
  viewReading(deps, actor, await expectRevision(deps, actor, params)),
);

/** Most rows in one answer; a page asks for the window that it shows. */
const mostRows = 2000;

export const getSheetRoute = route(getSheet, async ({ deps, params, query, actor }) => {
  const row = await expectRevision(deps, actor, params);
  const from = query.from ?? 1;
  const to = Math.min(query.to ?? from + mostRows - 1, from + mostRows - 1);
  const sheet = await loadSheet(deps.db, actor, { fileId: row.workbook.id, name: query.sheet, from, to });
  if (sheet === null)
    throw noSheet(query.sheet, (await gridOf(deps.db, actor, row.workbook.id))?.sheets ?? []);
  const known = await usesOfSheet(deps.db, actor, { revisionId: row.revision.id, sheet: sheet.name });
  const uses = sheet.cells.flatMap(({ address }) => known.get(address) ?? []);
  return { sheet, uses };
});

export const keepAnswerRoute = route(keepAnswer, async ({ body, ...exchange }) =>
  changeAndView(exchange, { answers: body.answers }),
);

export const keepAttributesRoute = route(keepAttributes, async ({ deps, params, body, version, actor }) => {
  const row = await expectDraft(deps, actor, params, version);
  await keepTyped(deps, { actor, row, given: body.attributes });
  return viewReading(deps, actor, await expectRevision(deps, actor, params));
});

function noSheet(name: string, sheets: readonly { name: string }[]): Problem {
  const detail = `The workbook has no sheet “${name}”.`;
  const fix =
    sheets.length === 0
      ? 'Wait until it is read.'
      : `Choose one of ${sheets.map((each) => each.name).join(', ')}.`;
  return new Problem('invalid-input', { detail, fix, errors: [{ pointer: '/query/sheet', detail, fix }] });
}
