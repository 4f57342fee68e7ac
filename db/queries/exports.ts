import { and, eq, getTableColumns, gt, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { exportFiles } from '../schema'

const { file, ...all } = getTableColumns(exportFiles)

const live = (id: string) => and(eq(exportFiles.id, id), gt(exportFiles.endsAt, sql`now()`))

/** All of an export but its file. */
export async function exportById(tx: Transaction, id: string) {
  const [row] = await tx.select(all).from(exportFiles).where(live(id))
  return row
}

export async function fileOfExport(tx: Transaction, id: string) {
  const [row] = await tx.select({ file }).from(exportFiles).where(live(id))
  return row.file
}
