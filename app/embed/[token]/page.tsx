import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { openedLink, wordOf } from '@/app/opened-link'
import { linkMetadata } from '@/app/s/[token]/link-metadata'
import { FramedSheet } from '@/components/sharing/framed-sheet'
import { PasswordSheet } from '@/components/sharing/password-sheet'
import { linkPassParameter } from '@/lib/http/link-key'
import { frameOrigins } from '@/lib/services/frame-origins'
import { summaryOf } from '@/scene/model/summary'
import { CountFrame } from './count-frame'

export const dynamic = 'force-dynamic'

export const metadata: Metadata = linkMetadata

/** A link's page inside another site's: only of links that name such sites, and the same "not here" for all others. */
export default async function FramedPage({ params, searchParams }: PageProps<'/embed/[token]'>) {
  const { token } = await params
  if ((await frameOrigins(token)).length === 0) notFound()
  const search = await searchParams
  const pass = wordOf(search, linkPassParameter)
  const shared = await openedLink(token, pass ?? '')
  if (!shared) return <PasswordSheet action={`/embed/${token}/pass`} said={wordOf(search, 'said')} />
  const base = `/api/v1/shared/${encodeURIComponent(token)}`
  const proof = pass === null ? '' : `?${linkPassParameter}=${encodeURIComponent(pass)}`
  return (
    <FramedSheet
      shared={shared}
      page={`/s/${token}`}
      poster={`${base}/poster.png${proof}`}
      summary={summaryOf(shared.document)}
      after={<CountFrame token={token} pass={pass} />}
    />
  )
}
