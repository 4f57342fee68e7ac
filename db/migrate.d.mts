/** Brings the database up to date as its owner; several at once wait for one another. `guarded`: the program is not the owner. */
export function migrate(programUrl: string, ownerUrl?: string): Promise<{ guarded: boolean }>
