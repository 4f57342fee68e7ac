import { config } from '@/lib/config'
import { linkPassCookie } from './link-key'

/** The addresses of one link, page and interface: a pass is sent to these and to no other. */
export const linkPaths = (token: string) =>
  ['/s', '/api/v1/shared'].map((root) => `${root}/${encodeURIComponent(token)}`)

export const linkPassAttributes = (seconds: number) => ({
  ...{ maxAge: seconds, httpOnly: true, secure: config().secure, sameSite: 'lax' as const },
})

/** As Set-Cookie wants them. */
export const linkPassCookies = (token: string, pass: string, seconds: number): string[] =>
  linkPaths(token).map(
    (path) =>
      `${linkPassCookie}=${pass}; Path=${path}; Max-Age=${seconds}; HttpOnly; SameSite=Lax${config().secure ? '; Secure' : ''}`,
  )
