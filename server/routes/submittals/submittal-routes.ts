import { checkAgainRoute, getCheckRoute, proveSealRoute } from '../checks/checks';
import { getCreepRoute } from '../checks/get-creep';
import { getRoomRoute } from '../checks/get-room';
import { getKeptCheckRoute, listChecksRoute } from '../checks/kept-checks';
import type { Route } from '../define-route';
import {
  addDocumentRoute,
  attachFileRoute,
  getDocumentFileRoute,
  getDocumentTypesRoute,
  removeDocumentRoute,
} from '../documents/documents';
import { cancelJobRoute } from '../jobs/cancel-job';
import { changeNoteRoute, removeNoteRoute, writeNoteRoute } from '../notes/notes';
import { correctionRoutes } from '../readings/corrections';
import { getReadingRoute, getSheetRoute, keepAnswerRoute, keepAttributesRoute } from '../readings/readings';
import { removeWaiverRoute, waiveRoute } from '../waivers/waivers';
import {
  giveBackRevisionRoute,
  submitRevisionRoute,
  takeRevisionRoute,
  withdrawRevisionRoute,
} from './change-state';
import { getReplacedWorkbookRoute } from './get-replaced-workbook';
import { getRevisionRoute, getSubmittalRoute } from './get-revision';
import { getWorkbookRoute } from './get-workbook';
import { listSubmittalsRoute } from './list-submittals';
import { replaceWorkbookRoute, startRevisionRoute, uploadSubmittalRoute } from './upload-workbook';

/** A submittal from its upload to what both sides write on it; returns have their own list. */
export const submittalRoutes: Route[] = [
  ...[listSubmittalsRoute, uploadSubmittalRoute, getSubmittalRoute, getRevisionRoute],
  ...[startRevisionRoute, replaceWorkbookRoute, getWorkbookRoute, getReplacedWorkbookRoute, cancelJobRoute],
  ...[getReadingRoute, getSheetRoute, keepAnswerRoute, keepAttributesRoute],
  ...correctionRoutes,
  ...[addDocumentRoute, attachFileRoute, removeDocumentRoute, getDocumentFileRoute, getDocumentTypesRoute],
  ...[
    getCheckRoute,
    getRoomRoute,
    getCreepRoute,
    checkAgainRoute,
    proveSealRoute,
    listChecksRoute,
    getKeptCheckRoute,
  ],
  ...[submitRevisionRoute, withdrawRevisionRoute, takeRevisionRoute, giveBackRevisionRoute],
  ...[writeNoteRoute, changeNoteRoute, removeNoteRoute, waiveRoute, removeWaiverRoute],
];
