import { useMutation } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { chooseOrganisation } from '#shared/contracts/session';
import { announce } from '../../lib/announce';
import { call } from '../../lib/api';
import { paths } from '../../lib/paths';
import { useBeginSession } from '../../lib/queries/use-begin-session';

export function useChooseOrganisation(): (organisationId: string) => void {
  const begin = useBeginSession();
  const navigate = useNavigate();
  const { mutate } = useMutation({
    mutationFn: (organisationId: string) => call(chooseOrganisation, { body: { organisationId } }),
    onSuccess: (session) => {
      begin(session);
      announce(`You act for ${session.active?.organisationName ?? 'no organisation'} now.`);
      navigate(paths.home);
    },
  });
  return mutate;
}
