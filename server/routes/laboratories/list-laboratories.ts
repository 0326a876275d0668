import { listLaboratories } from '#shared/contracts/people';
import { listLaboratoriesOf } from '../../db/queries/laboratories';
import { keepsLaboratories } from '../../policies/session-abilities';
import { presentLaboratory } from '../../presenters/present-laboratory';
import { route } from '../define-route';

export const listLaboratoriesRoute = route(listLaboratories, async ({ deps, actor }) => {
  const rows = await listLaboratoriesOf(deps.db, actor.organisationId);
  return {
    laboratories: rows.map((row) => presentLaboratory(row, actor.organisation)),
    abilities: { add: keepsLaboratories(actor) },
  };
});
