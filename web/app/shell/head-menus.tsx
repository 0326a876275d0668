import type { Session } from '#shared/contracts/session';
import { DeferredMenu } from './deferred-menu';

/** The organisation, the person, and on narrow pages everything in one. */
export function HeadMenus({ session }: { session: Session }) {
  const props = { session };
  return (
    <>
      <span className="head-organisation">
        {session.memberships.length < 2 ? (
          session.active?.organisationName
        ) : (
          <DeferredMenu
            text={session.active?.organisationName ?? 'Choose'}
            className="head-menu"
            load={loadOrganisationMenu}
            props={props}
          />
        )}
      </span>
      <span className="head-person">
        <DeferredMenu
          text={session.person.name}
          className="head-menu head-menu-person"
          load={loadPersonMenu}
          props={props}
        />
      </span>
      <span className="head-narrow">
        <DeferredMenu
          text="Menu"
          className="head-menu head-menu-person"
          load={loadNarrowMenu}
          props={props}
        />
      </span>
    </>
  );
}

const loadOrganisationMenu = () =>
  import('./organisation-menu').then((module) => ({ default: module.OrganisationMenu }));
const loadPersonMenu = () => import('./person-menu').then((module) => ({ default: module.PersonMenu }));
const loadNarrowMenu = () => import('./narrow-menu').then((module) => ({ default: module.NarrowMenu }));
