import { write } from '@/db/client'
import { memberships, users, workshops } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { hashPassword } from '@/lib/auth/passwords'
import { beginSession, type NewSession } from '@/lib/auth/sessions'
import { errorCode } from '@/lib/errors/as-problem'
import { Problem } from '@/lib/errors/problem'
import { audit } from './audit'

interface SignUp {
  name: string
  email: string
  password: string
  workshopName?: string
}

const uniqueViolation = '23505'

/** A new person with a workshop of their own, signed in. */
export async function signUp(wanted: SignUp): Promise<{ person: Person; session: NewSession }> {
  const passwordHash = await hashPassword(wanted.password)
  const { name, email } = wanted
  const person = await write(async (tx) => {
    const [user] = await tx.insert(users).values({ name, email, passwordHash }).returning()
    const [workshop] = await tx
      .insert(workshops)
      .values({ name: wanted.workshopName ?? `${name}’s workshop` })
      .returning()
    await tx.insert(memberships).values({ workshopId: workshop.id, userId: user.id, role: 'owner' })
    await audit(tx, {
      actorId: user.id,
      workshopId: workshop.id,
      operation: 'person.sign-up',
      subject: `person:${user.id}`,
      after: { name, workshop: workshop.name },
    })
    const membership = { workshopId: workshop.id, workshopName: workshop.name, role: 'owner' as const }
    return { id: user.id, name, email, memberships: [membership] }
  }).catch((error: unknown) => {
    if (errorCode(error) !== uniqueViolation) throw error
    throw new Problem('taken', 'This address has an account already.', 'Sign in, or ask for a new password.')
  })
  return { person, session: await beginSession(person.id) }
}
