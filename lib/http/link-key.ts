import type { LinkKey } from '@/lib/services/link-behind'

export const linkPassCookie = 'counterthrow_link'

/** Where cookies are not sent, as in a frame on another site, the pass is said in this header or in the address. */
export const linkPassHeader = 'x-link-pass'
export const linkPassParameter = 'pass'

const inCookies = new RegExp(`(?:^|; *)${linkPassCookie}=([\\w.-]+)`)

interface Shown {
  headers: Pick<Headers, 'get'>
  /** Absent for a page, which is told its query by the framework. */
  url?: string
}

/** What somebody shows at the address of a link. The cookie is set for that address alone. */
export function linkKeyOf({ headers, url }: Shown, token: string): LinkKey {
  const inCookie = inCookies.exec(headers.get('cookie') ?? '')?.[1]
  const inAddress = url ? new URL(url).searchParams.get(linkPassParameter) : null
  return { token, pass: headers.get(linkPassHeader) ?? inAddress ?? inCookie ?? null }
}
