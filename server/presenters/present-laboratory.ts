import type { Laboratory } from '#shared/contracts/people';
import { dateOfInstant } from '#shared/format/dates';
import type { LaboratoryRow } from '../db/queries/laboratories';

export function presentLaboratory(
  { createdAt, ...row }: LaboratoryRow,
  { timeZone }: { timeZone: string },
): Laboratory {
  return { ...row, since: dateOfInstant(createdAt.toISOString(), timeZone) };
}
