import { passLink as contract } from '@/lib/contracts/shared'
import { clientAddress } from '@/lib/http/client-address'
import { handle } from '@/lib/http/handle'
import { linkPassCookies } from '@/lib/http/link-pass-cookies'
import { passLink } from '@/lib/services/pass-link'

export const POST = handle(contract, async ({ request, params, body, headers }) => {
  const passed = await passLink(params.token, body.password, clientAddress(request))
  const { pass, seconds } = passed
  if (pass !== null) {
    for (const cookie of linkPassCookies(params.token, pass, seconds)) headers.append('set-cookie', cookie)
  }
  return passed
})
