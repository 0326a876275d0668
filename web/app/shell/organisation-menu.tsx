import { useMutation, useQueryClient } from '@tanstack/react-query';
import { Button as AriaButton } from 'react-aria-components';
import { useNavigate } from 'react-router-dom';
import { chooseOrganisation, type Session } from '#shared/contracts/session';
import { Menu, MenuItem } from '../../components/ui/menu';
import { announce } from '../../lib/announce';
import { call } from '../../lib/api';
import { paths } from '../../lib/paths';
import { sessionQuery } from '../../lib/queries/session-query';

/** The active organisation; a menu only for people who belong to several. */
export function OrganisationMenu({ session }: { session: Session }) {
  const choose = useChooseOrganisation();
  if (session.memberships.length < 2) {
    return <span className="head-organisation">{session.active?.organisationName}</span>;
  }
  return (
    <span className="head-organisation">
      <Menu
        label="Organisation to act for"
        trigger={
          <AriaButton className="head-menu">{session.active?.organisationName ?? 'Choose'}</AriaButton>
        }
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
    </span>
  );
}

export function useChooseOrganisation(): (organisationId: string) => void {
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const { mutate } = useMutation({
    mutationFn: (organisationId: string) => call(chooseOrganisation, { body: { organisationId } }),
    onSuccess: (session) => {
      // Everything kept belongs to the organisation that was left.
      queryClient.clear();
      queryClient.setQueryData(sessionQuery().queryKey, session);
      announce(`You act for ${session.active?.organisationName ?? 'no organisation'} now.`);
      navigate(paths.home);
    },
  });
  return mutate;
}
