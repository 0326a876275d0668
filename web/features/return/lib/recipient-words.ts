import type { Recipient } from '#shared/contracts/returns';

/** "R. Sandoval, resident engineer" */
export function recipientWords({ name, function: role, email }: Recipient): string {
  return [name || email, role].filter((part) => part !== '').join(', ');
}
