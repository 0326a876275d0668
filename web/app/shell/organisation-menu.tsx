import { Button as AriaButton } from 'react-aria-components';
import type { Session } from '#shared/contracts/session';
import { Menu, MenuItem } from '../../components/ui/menu';
import { useChooseOrganisation } from './use-choose-organisation';

/** For people who belong to several organisations: the one to act for. */
export function OrganisationMenu({ session }: { session: Session }) {
  const choose = useChooseOrganisation();
  return (
    <Menu
      defaultOpen
      label="Organisation to act for"
      trigger={<AriaButton className="head-menu">{session.active?.organisationName ?? 'Choose'}</AriaButton>}
    >
      {session.memberships.map((membership) => (
        <MenuItem
          key={membership.organisationId}
          id={membership.organisationId}
          textValue={membership.organisationName}
          onAction={() => choose(membership.organisationId)}
        >
          {membership.organisationName}
          <small>
            {membership.organisationId === session.active?.organisationId
              ? 'now'
              : membership.roles.join(', ')}
          </small>
        </MenuItem>
      ))}
    </Menu>
  );
}
