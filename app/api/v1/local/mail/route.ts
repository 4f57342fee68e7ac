import { keptMails } from '@/lib/adapters/mail/local'
import { config, loopbackNames } from '@/lib/config'
import { localMail } from '@/lib/contracts/system'
import { notFound } from '@/lib/errors/problem'
import { handle } from '@/lib/http/handle'

/** Whoever reads these mails can set anybody's password: only where nobody but this machine gets in. */
export const GET = handle(localMail, async ({ request }) => {
  const { mail, loopback } = config()
  // a page elsewhere may have its own name lead to this machine, but not change what the browser says it asked for
  const asked = new URL(`http://${request.headers.get('host')}`).hostname
  if (mail.by !== 'local' || !loopback || !loopbackNames.has(asked)) throw notFound('page')
  return { mails: await keptMails() }
})
