import { write } from '@/db/client'
import { endSession, userOfSession } from '@/lib/auth/sessions'
import { audit } from './audit'

/** Ends this session; a token that opens none is no error. */
export async function signOut(token: string): Promise<void> {
  const user = await userOfSession(token)
  if (!user) return
  await endSession(token)
  await write((tx) =>
    audit(tx, {
      actorId: user.id,
      workshopId: null,
      operation: 'person.sign-out',
      subject: `person:${user.id}`,
    }),
  )
}
