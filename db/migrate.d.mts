/** Brings the database up to date; several at once wait for one another. */
export function migrate(databaseUrl: string): Promise<void>
