import type { ApiTokenRow } from '@/db/queries/api-tokens'
import { lesserRole, roleIn, type Person } from '@/lib/auth/access'
import type { ApiToken } from '@/lib/contracts/tokens'

export function apiTokenAnswer({ token, workshop }: ApiTokenRow, person: Person, now: Date): ApiToken {
  const present = roleIn(person, token.workshopId)
  return {
    id: token.id,
    name: token.name,
    workshop: { id: token.workshopId, name: workshop },
    role: token.role,
    actsAs: present ? lesserRole(token.role, present) : null,
    state: token.revokedAt ? 'revoked' : token.endsAt <= now ? 'ended' : 'live',
    endsAt: token.endsAt.toISOString(),
    lastUsedAt: token.lastUsedAt?.toISOString() ?? null,
    createdAt: token.createdAt.toISOString(),
  }
}
