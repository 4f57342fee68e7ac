import type { Metadata } from 'next'
import { openedLink, wordOf } from '@/app/opened-link'
import { PasswordSheet } from '@/components/sharing/password-sheet'
import { SharedSheet } from '@/components/sharing/shared-sheet'
import { config } from '@/lib/config'
import { summaryOf } from '@/scene/model/summary'
import { linkMetadata } from './link-metadata'
import { SecondStep } from './second-step'

export const dynamic = 'force-dynamic'

type Props = PageProps<'/s/[token]'>

/** A card for where links are talked about, only of what whoever reads the page may see; and how to frame it. */
export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { token } = await params
  const shared = await openedLink(token, null)
  if (!shared || shared.locked) return linkMetadata
  const { origin } = config()
  const address = `${origin}/s/${token}`
  const described = `${origin}/api/v1/oembed?url=${encodeURIComponent(address)}`
  const { sentence } = summaryOf(shared.document)
  return {
    ...linkMetadata,
    title: shared.title,
    description: sentence,
    openGraph: {
      ...{ type: 'website', title: shared.title, description: sentence, siteName: shared.workshop },
      images: [{ url: `${origin}/api/v1/shared/${token}/card.png`, width: 1200, height: 630, alt: sentence }],
    },
    ...(shared.framable && { alternates: { types: { 'application/json+oembed': described } } }),
  }
}

export default async function SharedPage({ params, searchParams }: Props) {
  const { token } = await params
  const shared = await openedLink(token, null)
  if (!shared) return <PasswordSheet action={`/s/${token}/pass`} said={wordOf(await searchParams, 'said')} />
  const base = `/api/v1/shared/${encodeURIComponent(token)}`
  return (
    <SharedSheet
      shared={shared}
      poster={`${base}/poster.png`}
      summary={summaryOf(shared.document)}
      after={
        <SecondStep
          token={token}
          pass={null}
          kind={shared.kind}
          version={shared.version}
          view={shared.document.view}
          endsAt={shared.endsAt}
        />
      }
    />
  )
}
