import 'server-only'
import { AsyncLocalStorage } from 'node:async_hooks'
import type { Logger } from 'drizzle-orm'
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js'
import postgres from 'postgres'
import { config } from '@/lib/config'
import * as schema from './schema'

type Database = PostgresJsDatabase<typeof schema> & { $client: postgres.Sql }
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0]

/** Longer than the server's own limits below, so that it speaks only when the server cannot. */
const deadlineMs = 15_000

/**
 * The driver may run a query that follows the death of its backend alone, on a new connection, and commit it.
 * So connections only read unless a transaction says otherwise: such a stray is then refused.
 */
function open(): Database {
  const client = postgres(config().databaseUrl, {
    max: 10,
    connect_timeout: 5,
    idle_timeout: 60,
    onnotice: () => {},
    connection: {
      application_name: 'counterthrow',
      default_transaction_read_only: true,
      statement_timeout: 8_000,
      lock_timeout: 5_000,
      idle_in_transaction_session_timeout: 10_000,
    },
  })
  return drizzle(client, { schema, logger: gate })
}

/** What is known of a transaction by the queries in it. */
interface Course {
  over: boolean
}

interface Shared {
  course: AsyncLocalStorage<Course>
  database?: Database
}

// the framework loads this module once for pages and once for routes; the pool and who uses it are one
const known = globalThis as typeof globalThis & { counterthrow?: Shared }
const shared = (known.counterthrow ??= { course: new AsyncLocalStorage() })

const database = () => (shared.database ??= open())

/** Asked before each query: none outside a transaction, and none in one that has ended under it. */
const gate: Logger = {
  logQuery() {
    if (shared.course.getStore()?.over !== false) throw new Error('No transaction is open for this query.')
  },
}

const never = new Promise<never>(() => {})

async function transaction<T>(accessMode: 'read write' | 'read only', work: (tx: Transaction) => Promise<T>) {
  const own: Course = { over: false }
  let timer: NodeJS.Timeout | undefined
  const deadline = new Promise<never>((_, reject) => {
    const error = Object.assign(new Error(`No answer for ${deadlineMs / 1000} seconds.`), {
      code: 'DEADLINE',
    })
    timer = setTimeout(() => reject(error), deadlineMs)
  })
  const isolationLevel = accessMode === 'read only' ? 'repeatable read' : 'read committed'
  const done = shared.course.run(own, () =>
    database().transaction((tx) => unlessLost(own, work(tx)), { accessMode, isolationLevel }),
  )
  done.catch(() => (own.over = true))
  try {
    return await Promise.race([done, deadline])
  } finally {
    own.over = true
    clearTimeout(timer)
  }
}

/**
 * When its backend dies, the driver gives the transaction up at once but not the callback: what that does next, and
 * the driver's own commit or rollback after it, would be written to a connection that is closed, which it does not
 * survive. So the callback of a lost transaction never ends. Past the deadline it must not commit either.
 */
async function unlessLost<T>(own: Course, working: Promise<T>): Promise<T> {
  try {
    const result = await working
    return own.over ? await never : result
  } catch (error) {
    // the driver says that a query failed before it says that its connection is closed
    await new Promise(setImmediate)
    if (own.over) return never
    throw error
  }
}

/** Reads that belong together see one state of the database. */
export const read = <T>(work: (tx: Transaction) => Promise<T>) => transaction('read only', work)

/** The only way to write. Everything in it happens or nothing does; await nothing in it but its own queries. */
export const write = <T>(work: (tx: Transaction) => Promise<T>) => transaction('read write', work)

export async function closeDatabase(): Promise<void> {
  const { database } = shared
  shared.database = undefined
  await database?.$client.end({ timeout: 5 })
}
