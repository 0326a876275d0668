import { Button as AriaButton, Header, MenuSection } from 'react-aria-components';
import type { Session } from '#shared/contracts/session';
import { Menu, MenuItem } from '../../components/ui/menu';
import { focusSearchAfterMenu } from '../../features/search/focus-search';
import { navigationOf } from './navigation';
import { PersonMenuItems } from './person-menu-items';
import { useChooseOrganisation } from './use-choose-organisation';

/** Below 1024 px the head keeps the wordmark and this one list, headed by the person's name; see narrow.css. */
export function NarrowMenu({ session }: { session: Session }) {
  const choose = useChooseOrganisation();
  return (
    <Menu
      defaultOpen
      label="Pages"
      trigger={<AriaButton className="head-menu head-menu-person">Menu</AriaButton>}
    >
      <MenuSection>
        <Header className="menu-head">
          {session.person.name}, {session.active?.organisationName}
        </Header>
        {navigationOf(session).map((item) => (
          <MenuItem key={item.to} id={item.to} href={item.to} textValue={item.label}>
            {item.label}
          </MenuItem>
        ))}
        <MenuItem id="find" textValue="Find" onAction={focusSearchAfterMenu}>
          Find a mix, clause or project
        </MenuItem>
      </MenuSection>
      {session.memberships.length > 1 ? (
        <MenuSection>
          <Header className="menu-head">Act for</Header>
          {session.memberships.map((membership) => (
            <MenuItem
              key={membership.organisationId}
              id={membership.organisationId}
              textValue={membership.organisationName}
              onAction={() => choose(membership.organisationId)}
            >
              {membership.organisationName}
            </MenuItem>
          ))}
        </MenuSection>
      ) : null}
      <PersonMenuItems />
    </Menu>
  );
}
