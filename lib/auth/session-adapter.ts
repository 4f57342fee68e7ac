import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle'
import type { Adapter } from 'lucia'
import { read, write, type Transaction } from '@/db/client'
import { sessions, users } from '@/db/schema'
import { hashToken } from './tokens'

const within = (tx: Transaction) => new DrizzlePostgreSQLAdapter(tx, sessions, users)

/** Lucia's adapter, with two differences: it keeps hashes of the session tokens, and writes in guarded transactions. */
export const sessionAdapter: Adapter = {
  async getSessionAndUser(token) {
    const [session, user] = await read((tx) => within(tx).getSessionAndUser(hashToken(token)))
    return [session && { ...session, id: token }, user]
  },
  getUserSessions: (userId) => read((tx) => within(tx).getUserSessions(userId)),
  setSession: (session) => write((tx) => within(tx).setSession({ ...session, id: hashToken(session.id) })),
  updateSessionExpiration: (token, expiresAt) =>
    write((tx) => within(tx).updateSessionExpiration(hashToken(token), expiresAt)),
  deleteSession: (token) => write((tx) => within(tx).deleteSession(hashToken(token))),
  deleteUserSessions: (userId) => write((tx) => within(tx).deleteUserSessions(userId)),
  deleteExpiredSessions: () => write((tx) => within(tx).deleteExpiredSessions()),
}
