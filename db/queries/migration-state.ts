import { sql } from 'drizzle-orm'
import journal from '@/drizzle/meta/_journal.json'
import { read } from '../client'

/** The migration the database has come to, and the one this program was made with. */
export async function migrationState(): Promise<{ applied: string; wanted: string }> {
  const rows = await read((tx) =>
    tx.execute<{ created_at: string }>(
      sql`select created_at from drizzle.__drizzle_migrations order by created_at desc limit 1`,
    ),
  )
  const entry = journal.entries.find(({ when }) => when === Number(rows[0]?.created_at))
  return { applied: entry?.tag ?? 'something else', wanted: journal.entries[journal.entries.length - 1].tag }
}
