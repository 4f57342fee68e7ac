import type { Person } from '@/lib/auth/access'
import { personOfApiToken } from '@/lib/auth/api-tokens'
import { personOfToken } from '@/lib/auth/person'
import { sessionTokenFrom } from '@/lib/auth/sessions'

/** What stands behind `Authorization: Bearer` (RFC 6750). Beside it no cookie counts. */
export const apiTokenOf = (request: Request) =>
  /^bearer\s+(\S+)$/i.exec(request.headers.get('authorization')?.trim() ?? '')?.[1] ?? null

export const sessionTokenOf = (request: Request) =>
  apiTokenOf(request) === null ? sessionTokenFrom(request.headers.get('cookie') ?? '') : null

/** Who asks: by an API token or else by a session; null for a stranger. */
export async function personOf(request: Request): Promise<Person | null> {
  const apiToken = apiTokenOf(request)
  return apiToken === null ? personOfToken(sessionTokenOf(request)) : personOfApiToken(apiToken)
}

export const userAgentOf = (request: Request) => request.headers.get('user-agent') ?? ''
