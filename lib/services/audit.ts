import type { Transaction } from '@/db/client'
import { auditLog } from '@/db/schema'

interface AuditRow {
  actorId: string | null
  workshopId: string | null
  operation: string
  /** What it was done to, such as "scene:0190…". */
  subject: string
  before?: unknown
  after?: unknown
}

/** Written in the transaction that does what it says, so that neither is there without the other. */
export async function audit(tx: Transaction, row: AuditRow): Promise<void> {
  await tx.insert(auditLog).values(row)
}
