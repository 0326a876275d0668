/** True where MariaDB refused a row because a unique index holds its like; drizzle wraps the driver's error. */
export function isDuplicateEntry(error: unknown): boolean {
  for (let cause = error; cause instanceof Error; cause = cause.cause) {
    if ('code' in cause && cause.code === 'ER_DUP_ENTRY') return true;
  }
  return false;
}
