import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { linkOpenings, shareLinks } from '@/db/schema'
import type { ShareLink } from '@/lib/contracts/share-links'
import { askQuestion } from '../ask-question'

const hour = 3_600_000
const visits = [
  { hoursAgo: 52, device: 'phone', drawingSeconds: 74, figuresSeconds: 20 },
  { hoursAgo: 27, device: 'desktop', drawingSeconds: 412, figuresSeconds: 396 },
  { hoursAgo: 3, device: 'tablet', drawingSeconds: 188, figuresSeconds: 61 },
] as const

/** Delphine opens the link that she was sent, three times within three days, and asks something. */
export async function visitLink({ link, url }: { link: ShareLink; url: string }): Promise<void> {
  const now = Date.now()
  const rows = visits.map(({ hoursAgo, ...visit }) => ({
    ...{ linkId: link.id, version: 3, openedAt: new Date(now - hoursAgo * hour) },
    ...visit,
  }))
  await write(async (tx) => {
    await tx.insert(linkOpenings).values(rows)
    await tx
      .update(shareLinks)
      .set({ opened: rows.length, lastOpenedAt: rows[rows.length - 1].openedAt })
      .where(eq(shareLinks.id, link.id))
  })
  await askQuestion(
    { token: url.split('/s/')[1], pass: null },
    {
      ...{ name: 'Delphine Astercroft', email: 'delphine@example.com', website: '', writtenForMs: 60_000 },
      question: 'Would the counterweights still clear the sump if the throw were 2 mm longer?',
      ...{ angleDeg: 90, view: null },
    },
    'the demonstration',
  )
}
