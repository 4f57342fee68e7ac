import { and, asc, desc, eq, gt, gte, like, lt, or } from 'drizzle-orm'
import type { Transaction } from '../client'
import { auditLog, users } from '../schema'

export interface AuditWanted {
  actor?: string
  /** An operation, or the area before its dot. */
  operation?: string
  subject?: string
  from?: string
  to?: string
}

const rows = (tx: Transaction) =>
  tx
    .select({ entry: auditLog, actor: users.name })
    .from(auditLog)
    .leftJoin(users, eq(users.id, auditLog.actorId))
    .$dynamic()

export type AuditRow = Awaited<ReturnType<typeof rows>>[number]

const wantedOf = (workshopId: string, { actor, operation, subject, from, to }: AuditWanted) =>
  and(
    eq(auditLog.workshopId, workshopId),
    actor === undefined ? undefined : eq(auditLog.actorId, actor),
    operation === undefined
      ? undefined
      : or(eq(auditLog.operation, operation), like(auditLog.operation, `${operation}.%`)),
    subject === undefined ? undefined : eq(auditLog.subject, subject),
    from === undefined ? undefined : gte(auditLog.createdAt, new Date(from)),
    to === undefined ? undefined : lt(auditLog.createdAt, new Date(to)),
  )

/** Newest first, from before the entry with this id. */
export const auditBefore = (
  tx: Transaction,
  workshopId: string,
  wanted: AuditWanted,
  before: number | undefined,
  limit: number,
) =>
  rows(tx)
    .where(and(wantedOf(workshopId, wanted), before === undefined ? undefined : lt(auditLog.id, before)))
    .orderBy(desc(auditLog.id))
    .limit(limit)

/** Oldest first, from after the entry with this id. */
export const auditAfter = (
  tx: Transaction,
  workshopId: string,
  wanted: AuditWanted,
  after: number,
  limit: number,
) =>
  rows(tx)
    .where(and(wantedOf(workshopId, wanted), gt(auditLog.id, after)))
    .orderBy(asc(auditLog.id))
    .limit(limit)

/** Everybody who has done something in the workshop, whether or not they still belong to it. */
export const auditActors = (tx: Transaction, workshopId: string) =>
  tx
    .selectDistinct({ id: users.id, name: users.name })
    .from(auditLog)
    .innerJoin(users, eq(users.id, auditLog.actorId))
    .where(eq(auditLog.workshopId, workshopId))
    .orderBy(asc(users.name), asc(users.id))
