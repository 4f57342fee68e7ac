import { notFound } from 'next/navigation'
import { SharedSheet } from '@/components/sharing/shared-sheet'
import { Problem } from '@/lib/errors/problem'
import { openShareLink } from '@/lib/services/open-share-link'
import { summaryOf } from '@/scene/model/summary'
import { linkMetadata } from './link-metadata'

export const dynamic = 'force-dynamic'

export const metadata = linkMetadata

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
  if (!shared) notFound()
  return (
    <SharedSheet
      shared={shared}
      base={`/api/v1/shared/${encodeURIComponent(token)}`}
      summary={summaryOf(shared.document)}
    />
  )
}
