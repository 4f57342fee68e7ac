import { Lucia, TimeSpan, type Cookie } from 'lucia'
import { config } from '@/lib/config'
import { sessionAdapter } from './session-adapter'
import { sessionCookieName } from './session-cookie-name'
import { newToken } from './tokens'

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof create>
    UserId: string
    DatabaseUserAttributes: { email: string; name: string }
  }
}

const create = () =>
  new Lucia(sessionAdapter, {
    sessionExpiresIn: new TimeSpan(30, 'd'),
    sessionCookie: {
      name: sessionCookieName,
      // the database decides when a session ends: a cookie cannot be renewed while a page is drawn
      expires: false,
      attributes: { secure: config().secure, sameSite: 'lax', path: '/' },
    },
    getUserAttributes: ({ email, name }) => ({ email, name }),
  })

let made: ReturnType<typeof create> | undefined
const lucia = () => (made ??= create())

export interface NewSession {
  token: string
  expiresAt: Date
}

export async function beginSession(userId: string): Promise<NewSession> {
  const session = await lucia().createSession(userId, {}, { sessionId: newToken() })
  return { token: session.id, expiresAt: session.expiresAt }
}

export const endSession = (token: string) => lucia().invalidateSession(token)

/** Whose session this is, while it lasts. Half-way through it is extended. */
export async function userOfSession(
  token: string,
): Promise<{ id: string; email: string; name: string } | null> {
  const { user } = await lucia().validateSession(token)
  return user && { id: user.id, email: user.email, name: user.name }
}

export const sessionTokenFrom = (cookieHeader: string) => lucia().readSessionCookie(cookieHeader)
export const sessionCookie = (token: string): Cookie => lucia().createSessionCookie(token)
export const blankSessionCookie = (): Cookie => lucia().createBlankSessionCookie()
