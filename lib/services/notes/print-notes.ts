import { read } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import { settlementInWords, standingInWords } from '@/lib/contracts/note-words'
import type { Note, NoteFilter, NotePost } from '@/lib/contracts/notes'
import type { PrintedPicture } from '@/lib/export/note-picture'
import { notesSheet, type PrintedNote } from '@/lib/export/notes-sheet'
import { placeOnPicture } from '@/lib/pictures/place-on-picture'
import { drawForPrint } from '@/lib/pictures/print-picture'
import { quantityText } from '@/lib/units/format'
import { capital } from '@/scene/model/say'
import type { Scene } from '@/scene/model/scene'
import { printFonts } from '../print-fonts'
import { exportedNotes } from './exported-notes'
import { writerInWords } from './notes-csv'
import { versionsOf } from './versions-of'

/** Of the picture of a view, in points. */
const size = { width: 224, height: 140 }

/** The notes that match, each with the picture of its view, as a PDF. */
export async function printNotes(
  person: Person | null,
  sceneId: string,
  filter: NoteFilter,
): Promise<Uint8Array<ArrayBuffer>> {
  const { scene, workshop, version, notes } = await exportedNotes(person, sceneId, filter)
  const pinned = notes.map(({ anchor }) => anchor.version)
  const scenes = await read((tx) => versionsOf(tx, sceneId, pinned))
  const printed: PrintedNote[] = []
  // one at a time: a picture is a few megabytes while it is drawn
  for (const note of notes) printed.push(await printedNote(note, version, scenes.get(note.anchor.version)))
  const open = notes.filter(({ state }) => state === 'open').length
  return notesSheet({
    ...{ scene, sceneId, version, workshop },
    date: dayOf(new Date().toISOString()),
    sentence: `${open} open, ${notes.length - open} settled`,
    which: filterInWords(filter),
    notes: printed,
    fonts: await printFonts(),
  })
}

async function printedNote(note: Note, version: number, scene: Scene | undefined): Promise<PrintedNote> {
  const { number, heading, settled } = note
  return {
    title: heading === '' ? `Note ${number}` : `Note ${number}: ${heading}`,
    facts: [
      capital(
        [note.kind, note.state, ...(settled ? [settlementInWords(settled.settlement)] : [])].join(', '),
      ),
      placeInWords(note),
      ...(note.standing === 'same' ? [] : [`In version ${version}: ${standingInWords(note)}`]),
      ...(settled
        ? [`Settled by ${settled.by}, ${dayOf(settled.at)}${settled.words && `: ${settled.words}`}`]
        : []),
    ],
    picture: scene ? await pictureOf(note, scene) : null,
    posts: note.posts.map((post) => ({
      by: `${writerInWords(post.by)}, ${dayOf(post.at)}${post.editedAt ? ', edited' : ''}`,
      words: wordsOf(post),
    })),
  }
}

const angleOf = ({ anchor }: Note) => quantityText((anchor.angleDeg * Math.PI) / 180, 'angle', 'si')

const placeInWords = (note: Note) =>
  `${note.part} at ${angleOf(note)}, version ${note.anchor.version}` +
  (note.anchor.version === note.version ? '' : `, made on version ${note.version}`)

function wordsOf({ words, deletedAt, drawing }: NotePost): string {
  if (deletedAt) return '(deleted)'
  return drawing ? `${words}\nDrawn: ${drawing.words}` : words
}

async function pictureOf(note: Note, scene: Scene): Promise<PrintedPicture> {
  const { angleDeg, speedRpm, camera, hidden, ghost, overlays, sectionAxialMm } = note.anchor
  const view = { angleDeg, speedRpm, camera, hidden, ghost, overlays, sectionAxialMm }
  const png = await drawForPrint({ ...scene, view: { ...scene.view, ...view } }, size)
  const pin = placeOnPicture(scene.train, note.anchor, size.width / size.height)
  return {
    ...size,
    png: Uint8Array.from(png),
    pin,
    label: String(note.number),
    drawing: note.posts[0].drawing,
    words: `${placeInWords(note)}${pin ? '' : ', outside the picture'}`,
  }
}

const dayOf = (time: string) =>
  new Date(time).toLocaleDateString('en-GB', {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    timeZone: 'UTC',
  })

function filterInWords({ madeOn, state, kind, author, part }: NoteFilter): string {
  const chosen = [
    state,
    kind && `kind ${kind}`,
    part && `part ${part}`,
    madeOn && `made on version ${madeOn}`,
    author && (author === 'guest' ? 'by guests' : 'by one author'),
  ].filter((each) => each !== undefined)
  return chosen.length > 0 ? chosen.join(', ') : 'all'
}
