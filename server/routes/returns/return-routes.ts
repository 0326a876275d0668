import { getFindingsPdfRoute } from '../checks/get-findings-pdf';
import { getFindingsWorkbookRoute } from '../checks/get-findings-workbook';
import type { Route } from '../define-route';
import { changeReturnRoute } from './change-return';
import { getLetterRoute } from './get-letter';
import { getReturnRoute } from './get-return';
import { getReturnMailRoute } from './get-return-mail';
import { getReturnWorkbookRoute } from './get-return-workbook';
import { listReturnedNotesRoute } from './list-returned-notes';
import { makeReturnReadyRoute } from './make-return-ready';
import { sendReturnRoute } from './send-return';

export const returnRoutes: Route[] = [
  getReturnRoute,
  changeReturnRoute,
  makeReturnReadyRoute,
  sendReturnRoute,
  getLetterRoute,
  getReturnWorkbookRoute,
  getReturnMailRoute,
  listReturnedNotesRoute,
  getFindingsPdfRoute,
  getFindingsWorkbookRoute,
];
