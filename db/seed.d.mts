/** Puts the demonstration into the database, once, and gives its sign-ins. */
export function seed(databaseUrl: string): Promise<{ role: string; email: string; password: string }[]>
