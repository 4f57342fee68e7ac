import { randomUUID } from 'node:crypto'
import postgres from 'postgres'
import { inject } from 'vitest'

declare module 'vitest' {
  interface ProvidedContext {
    cluster: { url: string; keeperUrl: string; template: string }
  }
}

export interface FreshDatabase {
  /** Signs in as the role that the program has: it reads and writes rows and owns nothing. */
  url: string
  /** Signs in as the role that owns everything and alone migrates. */
  ownerUrl: string
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
  await asKeeper(`create database ${name} template ${template}`)
  const at = (address: string) => Object.assign(new URL(address), { pathname: `/${name}` }).href
  return {
    url: at(url),
    ownerUrl: at(inject('cluster').keeperUrl),
    drop: () => asKeeper(`drop database if exists ${name} with (force)`),
  }
}
