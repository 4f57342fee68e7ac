import { randomUUID } from 'node:crypto'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import postgres from 'postgres'
import { afterAll, beforeAll } from 'vitest'
import { closeDatabase } from '@/db/client'
import { freshDatabase } from '../../support/database'

interface Server {
  /** A connection of the test's own, beside the product's. */
  sql: postgres.Sql
  dataFolder: string
  url: string
  /** Signs in as the database's owner, not as the program. */
  ownerUrl: string
}

/** A database and a data folder of its own for a test file; settings as given. */
export function useServer(settings: Record<string, string> = {}): Server {
  const server = {} as Server
  let drop: () => Promise<void>
  beforeAll(async () => {
    const database = await freshDatabase()
    drop = database.drop
    server.url = database.url
    server.ownerUrl = database.ownerUrl
    server.dataFolder = mkdtempSync(join(tmpdir(), 'counterthrow-data-'))
    server.sql = postgres(database.url, { max: 2, onnotice() {} })
    Object.assign(process.env, {
      DATABASE_URL: database.url,
      COUNTERTHROW_DATA: server.dataFolder,
      RATE_LIMIT: 'off',
      ...settings,
    })
  })
  afterAll(async () => {
    await closeDatabase()
    await server.sql.end()
    await drop()
    rmSync(server.dataFolder, { recursive: true, force: true })
  })
  return server
}

export const newEmail = () => `${randomUUID()}@example.com`
