import PDFDocument from 'pdfkit'
import { heading, paragraph, type Columns } from './flow'
import { inks } from './inks'
import { notePicture, type PrintedPicture } from './note-picture'
import { pdfBytes } from './pdf-bytes'
import { drawFrame, drawTitleBlock, frameOf, pad, titleBlock } from './sheet-frame'
import { Tags, type Element } from './tagged'
import { Typesetter, type FaceFiles, type Style } from './typesetter'

/** A note as it is printed: what is known of it, its picture, and what was said. */
export interface PrintedNote {
  title: string
  facts: string[]
  picture: PrintedPicture | null
  posts: { by: string; words: string }[]
}

export interface NotesSheet {
  scene: string
  sceneId: string
  version: number
  date: string
  workshop: string
  /** "3 open, 9 settled" */
  sentence: string
  /** Which notes these are: "all", or what they were filtered by. */
  which: string
  notes: readonly PrintedNote[]
  fonts: FaceFiles
}

/** A4, on its long side, in points. */
const [width, height] = [841.89, 595.28]

const fact: Style = { face: 'figure', size: 7, colour: inks.soft }
const said: Style = { face: 'text', size: 8.4, colour: inks.ink }
const name: Style = { face: 'bold', size: 7.6, colour: inks.ink }

/** The notes of a scene as a tagged PDF, one after another in two columns. */
export async function notesSheet(sheet: NotesSheet): Promise<Uint8Array<ArrayBuffer>> {
  // how many pages there are is known once it has been set
  const trial = compose(sheet, 1)
  trial.pdf.end()
  return pdfBytes(compose(sheet, trial.pages).pdf)
}

function compose(sheet: NotesSheet, of: number) {
  const pdf = new PDFDocument({
    size: [width, height],
    margin: 0,
    autoFirstPage: false,
    tagged: true,
    pdfVersion: '1.7',
    lang: 'en',
    displayTitle: true,
    info: {
      Title: `${sheet.scene}: notes`,
      Subject: sheet.sentence,
      Creator: 'Counterthrow',
      Producer: 'Counterthrow',
    },
  })
  const type = new Typesetter(pdf, sheet.fonts)
  const tags = new Tags(pdf)
  const frame = frameOf(width, height)
  let pages = 0
  const newPage = (): Element => {
    pdf.addPage()
    pages++
    const page = tags.group(tags.root, 'Part')
    drawFrame(type, tags, frame)
    drawTitleBlock(type, tags, page, frame, blockOf(sheet), { number: pages, of })
    return page
  }
  const gap = 22
  const columnWidth = (frame.width - 2 * pad - gap) / 2
  const top = frame.y + 4
  let column = 0
  let page = newPage()
  const bottom = frame.y + frame.height - pad
  const columns: Columns = {
    x: frame.x + pad,
    y: top,
    width: columnWidth,
    bottom,
    room(needed) {
      if (columns.y + needed <= columns.bottom) return
      column = 1 - column
      if (column === 0) page = newPage()
      columns.x = frame.x + pad + column * (columnWidth + gap)
      columns.y = top
      columns.bottom = column === 0 ? bottom : bottom - titleBlock.height
    },
  }
  for (const note of sheet.notes) {
    const pictureHeight = note.picture ? note.picture.height + 8 : 0
    columns.room(38 + pictureHeight + 12 * note.facts.length)
    heading(type, tags, page, columns, note.title)
    if (note.picture) notePicture(type, tags, page, columns, note.picture)
    for (const line of note.facts) paragraph(type, tags, page, columns, line, fact)
    for (const { by, words } of note.posts) {
      columns.room(30)
      paragraph(type, tags, page, columns, by, name)
      for (const piece of pieces(type, words, columnWidth)) paragraph(type, tags, page, columns, piece, said)
    }
  }
  if (sheet.notes.length === 0) paragraph(type, tags, page, columns, 'No note matches.', said)
  tags.end()
  return { pdf, pages }
}

const blockOf = ({ scene, sceneId, version, date, workshop, sentence, which, notes }: NotesSheet) => ({
  title: scene,
  sentence: `Notes: ${sentence}`,
  cells: [
    ['Scene', sceneId],
    ['Looked at in version', String(version)],
    ['Date', date],
    ['Which', which],
    ['Notes', String(notes.length)],
  ] satisfies [string, string][],
  workshop,
})

/** Lines of words together where they are printed: so few that a column is never too short for them. */
const linesTogether = 6

function pieces(type: Typesetter, words: string, room: number): string[] {
  return words.split(/\r?\n/).flatMap((line) => {
    const lines = type.lines(line, room, said)
    const groups = Array.from(
      { length: Math.ceil(lines.length / linesTogether) },
      (_, i) => i * linesTogether,
    )
    return groups.map((from) => lines.slice(from, from + linesTogether).join(' '))
  })
}
