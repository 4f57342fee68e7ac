import { Lucia, TimeSpan, type Cookie } from 'lucia'
import { config } from '@/lib/config'
import { sessionAdapter } from './session-adapter'
import { isStale, markSeen } from './last-seen'
import { sessionCookieName } from './session-cookie-name'
import { newToken } from './tokens'

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof create>
    UserId: string
    DatabaseUserAttributes: { email: string; name: string; workshopId: string | null }
    DatabaseSessionAttributes: { userAgent: string; lastSeenAt: Date }
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
    getUserAttributes: ({ email, name, workshopId }) => ({ email, name, workshopId }),
    getSessionAttributes: ({ lastSeenAt }) => ({ lastSeenAt }),
  })

let made: ReturnType<typeof create> | undefined
const lucia = () => (made ??= create())

export interface NewSession {
  token: string
  expiresAt: Date
}

/** What the browser said of itself, as much as is kept. */
const mostUserAgent = 400

export async function beginSession(userId: string, userAgent: string): Promise<NewSession> {
  const attributes = { userAgent: userAgent.slice(0, mostUserAgent), lastSeenAt: new Date() }
  const session = await lucia().createSession(userId, attributes, { sessionId: newToken() })
  return { token: session.id, expiresAt: session.expiresAt }
}

export const endSession = (token: string) => lucia().invalidateSession(token)

/** Who somebody is and which workshop they chose last, in which they may be no more. */
export interface SessionUser {
  id: string
  email: string
  name: string
  workshopId: string | null
}

/** Whose session this is, while it lasts. Half-way through it is extended; when it was last seen is kept to the minute. */
export async function userOfSession(token: string): Promise<SessionUser | null> {
  const { user, session } = await lucia().validateSession(token)
  if (!user) return null
  if (isStale(session.lastSeenAt)) await markSeen(token)
  return { id: user.id, email: user.email, name: user.name, workshopId: user.workshopId }
}

export const sessionTokenFrom = (cookieHeader: string) => lucia().readSessionCookie(cookieHeader)
export const sessionCookie = (token: string): Cookie => lucia().createSessionCookie(token)
export const blankSessionCookie = (): Cookie => lucia().createBlankSessionCookie()
