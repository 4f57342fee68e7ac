import useSWR from 'swr'
import type { listSessions } from '@/lib/contracts/account'
import { readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { listApiTokens } from '@/lib/contracts/tokens'

/** Somebody's own sessions and tokens. */
export function useOwn() {
  const sessions = useSWR<AnswerOf<typeof listSessions>, Error>('/api/v1/account/sessions', readAddress)
  const tokens = useSWR<AnswerOf<typeof listApiTokens>, Error>('/api/v1/account/tokens', readAddress)
  return {
    sessions: sessions.data?.sessions ?? null,
    tokens: tokens.data?.tokens ?? null,
    error: sessions.error ?? tokens.error,
    refresh: () => Promise.all([sessions.mutate(), tokens.mutate()]),
  }
}
