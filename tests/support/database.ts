import { randomUUID } from 'node:crypto'
import postgres from 'postgres'
import { inject } from 'vitest'

declare module 'vitest' {
  interface ProvidedContext {
    cluster: { url: string; keeperUrl: string; template: string }
  }
}

export interface FreshDatabase {
  /** Signs in as the role that the program has: it owns the database and nothing more. */
  url: string
  drop(): Promise<void>
}

async function asKeeper(statement: string) {
  const sql = postgres(inject('cluster').keeperUrl, { max: 1, onnotice() {} })
  try {
    await sql.unsafe(statement)
  } finally {
    await sql.end()
  }
}

/** A migrated, empty database of its own on the test server; drop it after the tests that use it. */
export async function freshDatabase(): Promise<FreshDatabase> {
  const { url, template } = inject('cluster')
  const name = `t_${randomUUID().replaceAll('-', '')}`
  await asKeeper(`create database ${name} template ${template} owner app`)
  const own = new URL(url)
  own.pathname = `/${name}`
  return { url: own.href, drop: () => asKeeper(`drop database if exists ${name} with (force)`) }
}
