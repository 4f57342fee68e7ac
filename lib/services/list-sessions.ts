import { read } from '@/db/client'
import { sessionsOf } from '@/db/queries/sessions'
import type { Person } from '@/lib/auth/access'
import { hashToken } from '@/lib/auth/tokens'
import type { SessionAnswer } from '@/lib/contracts/account'
import { deviceWords } from './device-words'

export async function listSessions(person: Person, token: string | null): Promise<SessionAnswer[]> {
  const rows = await read((tx) => sessionsOf(tx, person.id))
  const present = token && hashToken(token)
  return rows.map((row) => ({
    id: row.name,
    device: deviceWords(row.userAgent),
    begunAt: row.createdAt.toISOString(),
    lastSeenAt: row.lastSeenAt.toISOString(),
    endsAt: row.expiresAt.toISOString(),
    present: row.id === present,
  }))
}
