import { type Role, roleSchema } from '#shared/contracts/roles';

/** The sign-in library keeps several roles as one text, joined by commas. */
export function rolesFromColumn(column: string): Role[] {
  return column
    .split(',')
    .map((part) => part.trim())
    .filter((part) => part !== '')
    .map((part) => roleSchema.parse(part));
}

export function rolesToColumn(roles: readonly Role[]): string {
  return roleSchema.options.filter((role) => roles.includes(role)).join(',');
}
