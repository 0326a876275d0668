import type { Settings } from '../env';
import { caughtMailRoutes } from './caught-mail/caught-mail-routes';
import { addContractorRoute } from './contractors/add-contractor';
import { listContractorsRoute } from './contractors/list-contractors';
import type { Route } from './define-route';
import { draftRoutes } from './drafts/draft-routes';
import { getHomeRoute } from './home/home';
import { acceptInvitationRoute } from './invitations/accept-invitation';
import { getInvitationRoute } from './invitations/get-invitation';
import { invitePersonRoute } from './invitations/invite-person';
import { withdrawInvitationRoute } from './invitations/withdraw-invitation';
import { addLaboratoryRoute } from './laboratories/add-laboratory';
import { listLaboratoriesRoute } from './laboratories/list-laboratories';
import { mappingRoutes } from './mappings/mappings';
import { changeOrganisationRoute } from './organisation/change-organisation';
import { getOrganisationRoute } from './organisation/get-organisation';
import { changePersonRoute } from './people/change-person';
import { listPeopleRoute } from './people/list-people';
import { removePersonRoute } from './people/remove-person';
import { addProjectRoute } from './projects/add-project';
import { changeProjectRoute } from './projects/change-project';
import { changeSectionRoute } from './projects/change-section';
import { confirmSectionRoute } from './projects/confirm-section';
import { getProjectRoute } from './projects/get-project';
import { getSectionTemplateRoute } from './projects/get-section-template';
import { listProjectsRoute } from './projects/list-projects';
import { getQueueItemRoute, getQueueRoute } from './queue/queue';
import { returnRoutes } from './returns/return-routes';
import {
  exportRuleSetRoute,
  getRuleSetDocumentRoute,
  getRuleSetExampleRoute,
  getRuleSetRoute,
  getRuleSetTemplateRoute,
  listRuleSetsRoute,
} from './rule-sets/rule-sets';
import { searchRoute } from './search/search';
import { chooseOrganisationRoute } from './session/choose-organisation';
import { getSessionRoute } from './session/get-session';
import { getSignInOptionsRoute } from './session/get-sign-in-options';
import { requestPasswordResetRoute } from './session/request-password-reset';
import { resetPasswordRoute } from './session/reset-password';
import { signInRoute } from './session/sign-in';
import { signOutRoute } from './session/sign-out';
import { getSetUpRoute } from './set-up/get-set-up';
import { setUpRoute } from './set-up/set-up';
import { submittalRoutes } from './submittals/submittal-routes';

/** Everything that the API answers, by resource. A new route is added here and nowhere else. */
export function allRoutes(settings: Settings): Route[] {
  return [
    ...[getSessionRoute, signInRoute, signOutRoute, chooseOrganisationRoute, getSignInOptionsRoute],
    ...[requestPasswordResetRoute, resetPasswordRoute, getSetUpRoute, setUpRoute],
    ...[listPeopleRoute, changePersonRoute, removePersonRoute],
    ...[invitePersonRoute, withdrawInvitationRoute, getInvitationRoute, acceptInvitationRoute],
    ...[getOrganisationRoute, changeOrganisationRoute, listContractorsRoute, addContractorRoute],
    ...[listLaboratoriesRoute, addLaboratoryRoute],
    ...[listProjectsRoute, getProjectRoute, addProjectRoute, changeProjectRoute],
    ...[confirmSectionRoute, changeSectionRoute, getSectionTemplateRoute],
    ...[listRuleSetsRoute, getRuleSetTemplateRoute, getRuleSetExampleRoute, getRuleSetRoute],
    ...[getRuleSetDocumentRoute, exportRuleSetRoute],
    ...draftRoutes,
    ...[getHomeRoute, getQueueRoute, getQueueItemRoute, searchRoute],
    ...submittalRoutes,
    ...mappingRoutes,
    ...returnRoutes,
    ...(settings.smtpUrl === null ? caughtMailRoutes : []),
  ];
}
