import { read } from '@/db/client'
import { auditActors, auditAfter, auditBefore, type AuditRow } from '@/db/queries/audit-log'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { AuditEntry, AuditFilters } from '@/lib/contracts/audit-log'
import { refused } from '@/lib/errors/problem'
import type { Table } from '@/lib/tables/table'

const entryAnswer = ({ entry, actor }: AuditRow): AuditEntry => ({
  id: entry.id,
  at: entry.createdAt.toISOString(),
  actor: entry.actorId === null ? null : { id: entry.actorId, name: actor },
  operation: entry.operation,
  subject: entry.subject,
  before: entry.before,
  after: entry.after,
})

export function listAudit(
  person: Person | null,
  workshopId: string,
  { before, limit, ...filters }: AuditFilters & { before?: number; limit: number },
): Promise<{ entries: AuditEntry[]; next: number | null }> {
  return read(async (tx) => {
    authorise(person, 'audit.read', { workshopId }, 'workshop')
    const rows = await auditBefore(tx, workshopId, filters, before, limit + 1)
    const entries = rows.slice(0, limit).map(entryAnswer)
    return { entries, next: rows.length > limit ? entries[limit - 1].id : null }
  })
}

/** Everybody who has done something in the workshop, for a choice among them. */
export function listActors(
  person: Person | null,
  workshopId: string,
): Promise<{ id: string; name: string }[]> {
  return read(async (tx) => {
    authorise(person, 'audit.read', { workshopId }, 'workshop')
    return auditActors(tx, workshopId)
  })
}

/** What one file holds, and how much of it is read at a time. */
const mostEntries = 50_000
const chunk = 2_000

/** All that the filters leave, oldest first: an order that later entries do not change. */
export function exportAudit(
  person: Person | null,
  workshopId: string,
  filters: AuditFilters,
): Promise<AuditEntry[]> {
  return read(async (tx) => {
    authorise(person, 'audit.read', { workshopId }, 'workshop')
    const entries: AuditEntry[] = []
    for (;;) {
      const rows = await auditAfter(tx, workshopId, filters, entries.at(-1)?.id ?? 0, chunk)
      entries.push(...rows.map(entryAnswer))
      if (entries.length > mostEntries) throw tooMany()
      if (rows.length < chunk) return entries
    }
  })
}

const tooMany = () =>
  refused([
    {
      path: 'from',
      code: 'too-many',
      message: `More than ${mostEntries.toLocaleString('en')} entries: one file holds no more.`,
      fix: 'Ask for a shorter time, one person or one operation.',
    },
  ])

const json = (value: unknown) => (value === null || value === undefined ? null : JSON.stringify(value))

export const auditTable = (entries: readonly AuditEntry[]): Table => ({
  title: 'Audit log',
  columns: ['Entry', 'At', 'Person', 'Person id', 'Operation', 'Subject', 'Before', 'After'].map((name) => ({
    name,
    unit: '',
  })),
  rows: entries.map(({ id, at, actor, operation, subject, before, after }) => [
    ...[id, at, actor?.name ?? null, actor?.id ?? null],
    ...[operation, subject, json(before), json(after)],
  ]),
})
