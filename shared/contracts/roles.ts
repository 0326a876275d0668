import { z } from 'zod';

export const organisationKindSchema = z.enum(['agency', 'contractor']);

export const contractorRoles = ['quality manager', 'laboratory', 'administrator'] as const;
export const agencyRoles = [
  'reviewer',
  'signing engineer',
  'rule author',
  'laboratory',
  'administrator',
] as const;

export const roleSchema = z.enum([
  'quality manager',
  'laboratory',
  'administrator',
  'reviewer',
  'signing engineer',
  'rule author',
]);

export const waiverPolicySchema = z.enum(['nothing', 'advisory', 'all']);

export type OrganisationKind = z.infer<typeof organisationKindSchema>;
export type Role = z.infer<typeof roleSchema>;
export type WaiverPolicy = z.infer<typeof waiverPolicySchema>;

export function rolesOf(kind: OrganisationKind): readonly Role[] {
  return kind === 'agency' ? agencyRoles : contractorRoles;
}
