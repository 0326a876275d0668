interface PrivateDatabaseOptions {
  directory: string;
  /** One-line SQL statements, run at every start. */
  initStatements: string[];
  /** No durability. */
  throwaway?: boolean;
}

export function startPrivateDatabase(
  options: PrivateDatabaseOptions,
): Promise<{ socket: string; data: string; pidFile: string; log: string; reused: boolean }>;
export function stopPrivateDatabase(directory: string): Promise<void>;
