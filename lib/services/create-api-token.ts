import { write } from '@/db/client'
import { countLiveTokens } from '@/db/queries/api-tokens'
import { workshopById } from '@/db/queries/people'
import { apiTokens } from '@/db/schema'
import { isWithin, roleIn, type Person, type Role } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { hashToken, newToken } from '@/lib/auth/tokens'
import type { ApiToken } from '@/lib/contracts/tokens'
import { notFound, Problem, refused } from '@/lib/errors/problem'
import { apiTokenAnswer } from './api-token-answer'
import { audit } from './audit'

const mostLive = 50

interface NewApiToken {
  name: string
  /** Without one, the maker's own. */
  role?: Role
  days: number
}

/** The token is told this once: only its hash is kept. It begins with a word, so that one found lying about is known. */
export async function createApiToken(
  person: Person | null,
  workshopId: string,
  { name, role, days }: NewApiToken,
): Promise<{ token: ApiToken; secret: string }> {
  authorise(person, 'token.keep', { workshopId }, 'workshop')
  const own = roleIn(person, workshopId)
  if (!own) throw notFound('workshop')
  const wanted = role ?? own
  if (!isWithin(wanted, own)) {
    const message = `A token as ${wanted} could do what you, as ${own}, cannot.`
    throw refused([{ path: 'role', code: 'beyond', message, fix: `Choose ${own}, or a role within it.` }])
  }
  const secret = `counterthrow_${newToken()}`
  const now = new Date()
  const token = await write(async (tx) => {
    if ((await countLiveTokens(tx, person.id)) >= mostLive) {
      const detail = `You have ${mostLive} tokens that work, as many as there may be.`
      throw new Problem('held', detail, 'Revoke some first.')
    }
    const endsAt = new Date(now.getTime() + days * 86_400_000)
    const [row] = await tx
      .insert(apiTokens)
      .values({ userId: person.id, workshopId, name, role: wanted, tokenHash: hashToken(secret), endsAt })
      .returning()
    await audit(tx, {
      actorId: person.id,
      workshopId,
      operation: 'token.create',
      subject: `token:${row.id}`,
      after: { name, role: wanted, endsAt },
    })
    const workshop = await workshopById(tx, workshopId)
    return apiTokenAnswer({ token: row, workshop: workshop?.name ?? '' }, person, now)
  })
  return { token, secret }
}
