import { read } from '@/db/client'
import { apiTokensOf } from '@/db/queries/api-tokens'
import type { Person } from '@/lib/auth/access'
import type { ApiToken } from '@/lib/contracts/tokens'
import { apiTokenAnswer } from './api-token-answer'

export async function listApiTokens(person: Person): Promise<ApiToken[]> {
  const rows = await read((tx) => apiTokensOf(tx, person.id))
  const now = new Date()
  return rows.map((row) => apiTokenAnswer(row, person, now))
}
