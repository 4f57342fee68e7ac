import { config } from '@/lib/config'

/**
 * Whom a limit is for. Each trusted proxy adds the address it was called from at the end of X-Forwarded-For, so with
 * n of them the n-th from the end is the first that nobody could make up. Without a proxy the server is reached from
 * this machine alone, and everybody on it is one.
 */
export function clientAddress(request: { headers: Pick<Headers, 'get'> }): string {
  const { proxies } = config()
  if (proxies === 0) return 'this machine'
  const hops = (request.headers.get('x-forwarded-for') ?? '').split(',').map((hop) => hop.trim())
  return hops[hops.length - proxies] || 'unknown'
}
