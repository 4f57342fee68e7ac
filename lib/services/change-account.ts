import { eq } from 'drizzle-orm'
import { read, write } from '@/db/client'
import { userByEmail } from '@/db/queries/users'
import { users } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { hashPassword, verifyPassword } from '@/lib/auth/passwords'
import { forgetTokens, takeToken } from '@/lib/auth/rate-limit'
import { refused } from '@/lib/errors/problem'
import { audit } from './audit'
import { endSessionsBut } from './end-sessions'

export async function renamePerson(person: Person, name: string): Promise<void> {
  if (name === person.name) return
  await write(async (tx) => {
    await tx.update(users).set({ name }).where(eq(users.id, person.id))
    await audit(tx, {
      actorId: person.id,
      workshopId: null,
      operation: 'person.rename',
      subject: `person:${person.id}`,
      before: { name: person.name },
      after: { name },
    })
  })
}

/** Asks the present password, and signs out everywhere but here: how many that were is told. */
export async function changePassword(
  person: Person,
  { present, password }: { present: string; password: string },
  sessionToken: string | null,
): Promise<number> {
  await takeToken('sign-in-account', person.email)
  const user = await read((tx) => userByEmail(tx, person.email))
  if (!(await verifyPassword(user?.passwordHash, present))) {
    const message = 'This is not your present password.'
    throw refused([
      { path: 'present', code: 'wrong', message, fix: 'Type it again, or have a new one mailed.' },
    ])
  }
  await forgetTokens('sign-in-account', person.email)
  const passwordHash = await hashPassword(password)
  return write(async (tx) => {
    await tx.update(users).set({ passwordHash }).where(eq(users.id, person.id))
    const ended = await endSessionsBut(tx, person.id, sessionToken)
    await audit(tx, {
      actorId: person.id,
      workshopId: null,
      operation: 'password.change',
      subject: `person:${person.id}`,
      after: { sessionsEnded: ended },
    })
    return ended
  })
}
