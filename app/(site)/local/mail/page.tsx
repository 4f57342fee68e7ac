import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { connection } from 'next/server'
import { LocalMailSheet } from '@/components/mail/local-mail-sheet'
import { keptMails } from '@/lib/adapters/mail/local'
import { config } from '@/lib/config'

export const metadata: Metadata = {
  title: 'Mail kept here',
  referrer: 'no-referrer',
  robots: { index: false },
}

/** Whoever reads these mails can set anybody's password: only where nobody but this machine gets in. */
export default async function LocalMailPage() {
  await connection()
  const { mail, loopback } = config()
  if (mail.by !== 'local' || !loopback) notFound()
  return <LocalMailSheet first={{ mails: await keptMails() }} />
}
