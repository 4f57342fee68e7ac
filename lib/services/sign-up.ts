import { write, type Transaction } from '@/db/client'
import { users } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { hashPassword } from '@/lib/auth/passwords'
import { personOfUser } from '@/lib/auth/person'
import { beginSession, type NewSession } from '@/lib/auth/sessions'
import { errorCode } from '@/lib/errors/as-problem'
import { Problem } from '@/lib/errors/problem'
import { audit } from './audit'
import { insertWorkshop } from './create-workshop'

interface Account {
  name: string
  email: string
  password: string
}

const uniqueViolation = '23505'

/** A new account and whatever `settle` gives it in the same transaction, signed in. */
export async function openAccount(
  { name, email, password }: Account,
  userAgent: string,
  settle: (tx: Transaction, userId: string) => Promise<string>,
): Promise<{ person: Person; session: NewSession }> {
  const passwordHash = await hashPassword(password)
  const person = await write(async (tx) => {
    const [user] = await tx
      .insert(users)
      .values({ name, email, passwordHash })
      .returning()
      .catch((error: unknown) => {
        if (errorCode(error) !== uniqueViolation) throw error
        throw new Problem(
          'taken',
          'This address has an account already.',
          'Sign in, or ask for a new password.',
        )
      })
    const workshopId = await settle(tx, user.id)
    await audit(tx, {
      actorId: user.id,
      workshopId,
      operation: 'person.sign-up',
      subject: `person:${user.id}`,
      after: { name },
    })
    return personOfUser(tx, { ...user, workshopId })
  })
  return { person, session: await beginSession(person.id, userAgent) }
}

/** A new person with a workshop of their own, signed in. */
export const signUp = (
  { workshopName, ...account }: Account & { workshopName?: string },
  userAgent: string,
) =>
  openAccount(account, userAgent, (tx, userId) =>
    insertWorkshop(tx, userId, workshopName ?? `${account.name}’s workshop`),
  )
