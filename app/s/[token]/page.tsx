import type { Metadata } from 'next'
import { SharedSheet } from '@/components/sharing/shared-sheet'
import { UnavailableSheet } from '@/components/sharing/unavailable-sheet'
import { Problem } from '@/lib/errors/problem'
import { openShareLink } from '@/lib/services/open-share-link'
import { summaryOf } from '@/scene/model/summary'

export const dynamic = 'force-dynamic'

/** The address is a secret: it is neither indexed nor told to anybody who is linked from here. */
export const metadata: Metadata = {
  title: 'Shared scene',
  referrer: 'no-referrer',
  robots: { index: false, follow: false },
}

/** Null for unknown, ended and withdrawn alike. */
async function opened(token: string) {
  try {
    return await openShareLink(token)
  } catch (error) {
    if (error instanceof Problem && error.status === 404) return null
    throw error
  }
}

export default async function SharedPage({ params }: PageProps<'/s/[token]'>) {
  const { token } = await params
  const shared = await opened(token)
  if (!shared) return <UnavailableSheet />
  return (
    <SharedSheet
      shared={shared}
      poster={`/api/v1/shared/${encodeURIComponent(token)}/poster.png`}
      summary={summaryOf(shared.document)}
    />
  )
}
