import { read, write } from '@/db/client'
import { countOfLink, lockNote, notesOfLink } from '@/db/queries/notes'
import { lockScene } from '@/db/queries/scenes'
import type {
  GuestNote,
  listGuestNotes as listContract,
  makeGuestNote as makeContract,
  replyAsGuest as replyContract,
} from '@/lib/contracts/guest-notes'
import type { AnswerOf, BodyOf, QueryOf } from '@/lib/contracts/operation'
import { linkUnavailable, notFound, Problem, refused } from '@/lib/errors/problem'
import { linkBehind, type LinkKey } from '../link-behind'
import { guestNotes } from './guest-answers'
import { insertNote } from './insert-note'
import { insertReply } from './insert-reply'
import { judgedAnchor } from './judged-anchor'
import { versionsOf } from './versions-of'

/** As many as one link takes: whoever needs more is better asked by another way. */
const mostOfLink = 200

/** Only what was made through the same link, by whoever held it. */
export const listGuestNotes = (
  key: LinkKey,
  { after = 0, limit }: QueryOf<typeof listContract>,
): Promise<AnswerOf<typeof listContract>> =>
  read(async (tx) => {
    const { guest } = await linkBehind(tx, key, 'note.read')
    const rows = await notesOfLink(tx, guest.linkId, after, limit + 1)
    return {
      notes: await guestNotes(tx, rows.slice(0, limit), after + 1),
      next: rows.length > limit ? after + limit : null,
    }
  })

export async function makeGuestNote(
  key: LinkKey,
  { name, ...body }: BodyOf<typeof makeContract>,
): Promise<GuestNote> {
  const { anchor } = body
  const scene = await read(async (tx) => {
    const { guest, version } = await linkBehind(tx, key, 'note.write')
    if (anchor.version !== version) throw notThisVersion(version)
    return (await versionsOf(tx, guest.sceneId, [version])).get(version)
  })
  const part = judgedAnchor(anchor, scene)
  return write(async (tx) => {
    const { guest, workshopId } = await linkBehind(tx, key, 'note.write')
    const { linkId, sceneId } = guest
    if (!(await lockScene(tx, sceneId))) throw linkUnavailable()
    const made = await countOfLink(tx, linkId)
    if (made >= mostOfLink) {
      throw new Problem('refused', `This link takes ${mostOfLink} notes.`, 'Ask the person who sent it.')
    }
    const by = { guestName: name, linkId }
    const { note } = await insertNote(tx, { id: sceneId, workshopId }, { ...body, by, part, mentions: [] })
    const [answer] = await guestNotes(tx, [note], made + 1)
    return answer
  })
}

const notThisVersion = (version: number) =>
  refused([
    {
      path: 'anchor.version',
      code: 'another-version',
      message: `This link shows version ${version}.`,
      fix: 'Open the link again, then pin the note to what it shows.',
    },
  ])

export const replyAsGuest = (
  key: LinkKey,
  ordinal: number,
  { name, words }: BodyOf<typeof replyContract>,
): Promise<GuestNote> =>
  write(async (tx) => {
    const { guest, workshopId } = await linkBehind(tx, key, 'note.write')
    const { linkId, sceneId } = guest
    const [found] = await notesOfLink(tx, linkId, ordinal - 1, 1)
    const note = found && (await lockNote(tx, sceneId, found.number))
    if (!note) throw notFound('note')
    await insertReply(tx, { id: sceneId, workshopId }, note, {
      by: { guestName: name },
      words,
      drawing: null,
      mentions: [],
    })
    const [answer] = await guestNotes(tx, [note], ordinal)
    return answer
  })
