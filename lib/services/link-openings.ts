import { eq } from 'drizzle-orm'
import { read, write } from '@/db/client'
import { dropOldOpenings, keptDaysOf, pageOfOpenings } from '@/db/queries/link-log'
import { linkOpenings, shareLinks } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import type { LinkOpening, ShareLink } from '@/lib/contracts/share-links'
import type { Table } from '@/lib/tables/table'
import { audit } from './audit'
import { linkOf } from './link-of'
import { shareLinkAnswer } from './share-link-answer'

/** No workshop keeps more of one link: two years of two hundred a day. */
const mostOpenings = 150_000

type Row = typeof linkOpenings.$inferSelect

const openingAnswer = ({ linkId: _, openedAt, ...row }: Row): LinkOpening => ({
  ...row,
  openedAt: openedAt.toISOString(),
})

export async function listOpenings(
  person: Person | null,
  id: string,
  page: { before?: string; limit: number },
): Promise<{ openings: LinkOpening[]; keptDays: number; next: string | null }> {
  return read(async (tx) => {
    await linkOf(tx, person, 'link.openings', id)
    const { rows, next } = await pageOfOpenings(tx, id, page)
    return { openings: rows.map(openingAnswer), keptDays: await keptDaysOf(tx, id), next }
  })
}

/** All that is kept of a link's openings, for a file. */
export async function exportOpenings(
  person: Person | null,
  id: string,
): Promise<{ link: ShareLink; openings: LinkOpening[] }> {
  return read(async (tx) => {
    const { row } = await linkOf(tx, person, 'link.openings', id)
    const { rows } = await pageOfOpenings(tx, id, { limit: mostOpenings })
    return { link: shareLinkAnswer(row, new Date()), openings: rows.map(openingAnswer) }
  })
}

export const openingsTable = (link: ShareLink, openings: readonly LinkOpening[]): Table => ({
  title: `Openings of the link ${link.label || link.id}`,
  columns: [
    ...['Opened at', 'Device'].map((name) => ({ name, unit: '' })),
    { name: 'Version', unit: '' },
    ...['Drawing', 'Figures', 'Notes'].map((name) => ({ name, unit: 's' })),
  ],
  rows: openings.map((one) => [
    ...[one.openedAt, one.device, one.version],
    ...[one.drawingSeconds, one.figuresSeconds, one.notesSeconds],
  ]),
})

/** When and how a link was opened, forgotten on request: the rows and the count. */
export async function eraseOpenings(person: Person | null, id: string): Promise<{ erased: number }> {
  return write(async (tx) => {
    const { row, scene, person: by } = await linkOf(tx, person, 'link.erase', id)
    const { count } = await tx.delete(linkOpenings).where(eq(linkOpenings.linkId, id))
    await tx.update(shareLinks).set({ opened: 0, lastOpenedAt: null }).where(eq(shareLinks.id, id))
    await audit(tx, {
      actorId: by.id,
      workshopId: scene.workshopId,
      operation: 'link.erase',
      subject: `link:${id}`,
      before: { opened: row.link.opened, openings: count },
      after: { opened: 0, openings: 0 },
    })
    return { erased: count }
  })
}

/** What each workshop no longer keeps. Done twice it changes nothing more. */
export const eraseOldOpenings = (now: Date): Promise<number> => write((tx) => dropOldOpenings(tx, now))
