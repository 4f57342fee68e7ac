import { and, eq, ne } from 'drizzle-orm'
import { write, type Transaction } from '@/db/client'
import { sessions } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { hashToken } from '@/lib/auth/tokens'
import { notFound } from '@/lib/errors/problem'
import { audit } from './audit'

const told = (tx: Transaction, person: Person, operation: string, after: unknown) =>
  audit(tx, { actorId: person.id, workshopId: null, operation, subject: `person:${person.id}`, after })

/** Signs out one device of one's own. */
export async function endOneSession(person: Person, name: string): Promise<void> {
  await write(async (tx) => {
    const ended = await tx
      .delete(sessions)
      .where(and(eq(sessions.name, name), eq(sessions.userId, person.id)))
      .returning({ name: sessions.name })
    if (ended.length === 0) throw notFound('session')
    await told(tx, person, 'session.end', { session: name })
  })
}

export async function endSessionsBut(tx: Transaction, userId: string, token: string | null): Promise<number> {
  const others = token ? ne(sessions.id, hashToken(token)) : undefined
  const ended = await tx
    .delete(sessions)
    .where(and(eq(sessions.userId, userId), others))
    .returning({ name: sessions.name })
  return ended.length
}

/** Signs out everywhere but here. */
export async function endOtherSessions(person: Person, token: string | null): Promise<number> {
  return write(async (tx) => {
    const ended = await endSessionsBut(tx, person.id, token)
    await told(tx, person, 'session.end-others', { ended })
    return ended
  })
}
