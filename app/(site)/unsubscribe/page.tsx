import type { Metadata } from 'next'
import { UnsubscribeSheet } from '@/components/mail/unsubscribe-sheet'
import { Problem } from '@/lib/errors/problem'
import { unsubscribeKind } from '@/lib/services/mail/unsubscribe'

export const metadata: Metadata = {
  title: 'Turn mails off',
  referrer: 'no-referrer',
  robots: { index: false },
}

interface Props {
  searchParams: Promise<{ token?: string | string[] }>
}

export default async function UnsubscribePage({ searchParams }: Props) {
  const { token } = await searchParams
  const given = typeof token === 'string' ? token : ''
  const kind = await unsubscribeKind(given).catch((error: unknown) => {
    if (error instanceof Problem && error.kind === 'not-found') return null
    throw error
  })
  return <UnsubscribeSheet token={given} kind={kind} />
}
