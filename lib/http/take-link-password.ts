import { asProblem } from '@/lib/errors/as-problem'
import { passLink } from '@/lib/services/pass-link'
import { clientAddress } from './client-address'
import { linkPassParameter } from './link-key'
import { linkPassCookies } from './link-pass-cookies'

/**
 * A form's answer to "this link wants a password": back to the page, with the pass as cookies or, where none are sent, in
 * the address. It needs no script. What was wrong stands in the address as a word that the page knows.
 */
export async function takeLinkPassword(
  request: Request,
  page: '/s' | '/embed',
  token: string,
): Promise<Response> {
  const back = `${page}/${encodeURIComponent(token)}`
  const headers = new Headers({ location: back, 'cache-control': 'no-store' })
  try {
    const password = String((await request.formData()).get('password') ?? '').slice(0, 200)
    const { pass, seconds } = await passLink(token, password, clientAddress(request))
    if (pass !== null && page === '/embed') headers.set('location', `${back}?${linkPassParameter}=${pass}`)
    if (pass !== null && page === '/s') {
      for (const cookie of linkPassCookies(token, pass, seconds)) headers.append('set-cookie', cookie)
    }
  } catch (error) {
    const { status } = asProblem(error)
    if (status === 401) headers.set('location', `${back}?said=wrong`)
    else if (status === 429) headers.set('location', `${back}?said=often`)
  }
  return new Response(null, { status: 303, headers })
}
