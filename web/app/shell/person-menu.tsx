import { Button as AriaButton } from 'react-aria-components';
import type { Session } from '#shared/contracts/session';
import { Menu } from '../../components/ui/menu';
import { PersonMenuItems } from './person-menu-items';

export function PersonMenu({ session }: { session: Session }) {
  return (
    <Menu
      defaultOpen
      label="You and this page"
      trigger={<AriaButton className="head-menu head-menu-person">{session.person.name}</AriaButton>}
    >
      <PersonMenuItems />
    </Menu>
  );
}
