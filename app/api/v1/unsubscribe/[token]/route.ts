import { askToUnsubscribe as askContract, unsubscribe as contract } from '@/lib/contracts/mail'
import { Problem } from '@/lib/errors/problem'
import { handle } from '@/lib/http/handle'
import { readBytes } from '@/lib/http/read-json'
import { unsubscribe } from '@/lib/services/mail/unsubscribe'

/** What a mail program posts for its reader (RFC 8058): without cookies, so that whoever has the mail may. */
export const POST = handle(contract, async ({ request, params }) => {
  const type = request.headers.get('content-type') ?? ''
  const sent = new Response(await readBytes(request), { headers: { 'content-type': type } })
  const form = await sent.formData().catch(() => null)
  if (form?.get('List-Unsubscribe') !== 'One-Click') {
    throw new Problem(
      'unreadable',
      'The request is not the form that turns mail off.',
      'Post List-Unsubscribe=One-Click as a form.',
    )
  }
  return { kind: await unsubscribe(params.token), wanted: false as const }
})

/** Looking turns nothing off. */
export const GET = handle(askContract, async ({ params, headers }) => {
  headers.set('location', `/unsubscribe?token=${encodeURIComponent(params.token)}`)
  headers.set('referrer-policy', 'no-referrer')
  return new Response(null, { status: askContract.status, headers })
})
