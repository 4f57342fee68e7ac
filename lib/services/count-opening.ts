import { and, eq, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { linkOpenings, shareLinks } from '@/db/schema'
import { roleIn, type Person } from '@/lib/auth/access'
import { deviceOf, isRobot } from './device-of'
import { linkBehind, type LinkKey } from './link-behind'

/**
 * Counts that somebody has a link's page before them: whatever only fetches it, as mail scanners do, is not counted,
 * nor are robots that run scripts and the workshop's own people.
 */
export async function countOpening(
  key: LinkKey,
  { userAgent, person }: { userAgent: string; person: Person | null },
): Promise<{ opening: string | null }> {
  return write(async (tx) => {
    const { guest, workshopId, version } = await linkBehind(tx, key, 'opening.count')
    if (isRobot(userAgent) || (person && roleIn(person, workshopId))) return { opening: null }
    const [row] = await tx
      .insert(linkOpenings)
      .values({ linkId: guest.linkId, version, device: deviceOf(userAgent) })
      .returning({ id: linkOpenings.id })
    await tx
      .update(shareLinks)
      .set({ opened: sql`${shareLinks.opened} + 1`, lastOpenedAt: sql`now()` })
      .where(eq(shareLinks.id, guest.linkId))
    return { opening: row.id }
  })
}

interface Looked {
  drawingSeconds: number
  figuresSeconds: number
  notesSeconds: number
}

/** Sums so far, as often as they are told: they only grow, and no longer than the page has been open. */
export async function keepLooking(key: LinkKey, opening: string, looked: Looked): Promise<void> {
  await write(async (tx) => {
    const { guest } = await linkBehind(tx, key, 'opening.count')
    const open = sql`extract(epoch from now() - ${linkOpenings.openedAt})::integer + 1`
    const grown = (name: keyof Looked) =>
      sql`greatest(${linkOpenings[name]}, least(${looked[name]}::integer, ${open}))`
    await tx
      .update(linkOpenings)
      .set({
        drawingSeconds: grown('drawingSeconds'),
        figuresSeconds: grown('figuresSeconds'),
        notesSeconds: grown('notesSeconds'),
      })
      .where(and(eq(linkOpenings.id, opening), eq(linkOpenings.linkId, guest.linkId)))
  })
}
