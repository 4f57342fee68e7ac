import { config } from '@/lib/config'
import { Problem } from '@/lib/errors/problem'

/**
 * A write that carries cookies must come from our own pages: the browser says so itself in Sec-Fetch-Site, or else
 * in Origin. A call without cookies acts for nobody and needs no such proof.
 */
export function requireSameOrigin(request: { headers: Pick<Headers, 'get' | 'has'> }): void {
  if (!request.headers.has('cookie')) return
  const site = request.headers.get('sec-fetch-site')
  if (site === 'same-origin') return
  const origin = request.headers.get('origin')
  const { origin: ours, secure } = config()
  const asked = `${secure ? 'https' : 'http'}://${request.headers.get('host')}`
  if (site === null && origin !== null && (origin === ours || origin === asked)) return
  throw new Problem(
    'foreign-origin',
    'This was not sent from a page of ours.',
    'Open the page here and try again.',
  )
}
