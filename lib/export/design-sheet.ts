import PDFDocument from 'pdfkit'
import type { SheetContent } from '@/lib/sheet/sheet-content'
import type { Paper } from '@/lib/sheet/sheet-parts'
import { drawMarks } from './draw-marks'
import { completenessList, heading, paragraph, table, type Columns } from './flow'
import { inks } from './inks'
import { pdfBytes } from './pdf-bytes'
import { drawFrame, drawTitleBlock, frameOf, pad, titleBlock, type Box, type TitleBlock } from './sheet-frame'
import { Tags, type Element } from './tagged'
import { Typesetter, type FaceFiles } from './typesetter'

/** Points, on its long side. */
const sizes: Record<Paper, [number, number]> = { A4: [841.89, 595.28], Letter: [792, 612] }

export interface DesignSheet {
  content: SheetContent
  paper: Paper
  /** The engine in ink, PNG; none where it is not asked for. */
  picture: Uint8Array<ArrayBuffer> | null
  fonts: FaceFiles
}

/** Where the picture of the engine stands on the first page, in points: what it is drawn for. */
export const pictureBox = (paper: Paper): Box => {
  const frame = frameOf(...sizes[paper])
  const side = 196
  return {
    x: frame.x + pad,
    y: frame.y + pad,
    width: frame.width - side - 3 * pad,
    height: frame.height - stripHeight - 3 * pad,
  }
}

const stripHeight = 172
/** The table that stands beside the drawing. */
const mainData = 'Main data'

/** The design sheet as a tagged PDF: the drawing with star and strip, then tables, the list of what is asked for, cautions. */
export async function designSheet({
  content,
  paper,
  picture,
  fonts,
}: DesignSheet): Promise<Uint8Array<ArrayBuffer>> {
  // how many pages there are is known once it has been set
  const trial = compose({ content, paper, picture: null, fonts }, 1)
  trial.pdf.end()
  const { pdf } = compose({ content, paper, picture, fonts }, trial.pages)
  return pdfBytes(pdf)
}

function compose({ content, paper, picture, fonts }: DesignSheet, of: number) {
  const [width, height] = sizes[paper]
  const { stamp } = content
  const pdf = new PDFDocument({
    size: [width, height],
    margin: 0,
    autoFirstPage: false,
    tagged: true,
    pdfVersion: '1.7',
    lang: 'en',
    displayTitle: true,
    info: {
      Title: `${stamp.title}: design sheet`,
      Subject: content.sentence,
      Creator: 'Counterthrow',
      Producer: 'Counterthrow',
    },
  })
  const type = new Typesetter(pdf, fonts)
  const tags = new Tags(pdf)
  const frame = frameOf(width, height)
  let pages = 0
  const newPage = (): Element => {
    pdf.addPage()
    pages++
    const page = tags.group(tags.root, 'Part')
    drawFrame(type, tags, frame)
    drawTitleBlock(type, tags, page, frame, blockOf(content), { number: pages, of })
    return page
  }
  firstPage(type, tags, newPage(), frame, paper, content, picture)
  flow(type, tags, frame, content, newPage)
  tags.end()
  return { pdf, pages }
}

/** What stands in the title block: what this is, of what, from when. */
function blockOf({ stamp, sentence, condition, method }: SheetContent): TitleBlock {
  const { sceneId, version, changed, date, workshop } = stamp
  const saved = version === undefined ? 'not saved' : changed ? `${version}, changed since` : `${version}`
  return {
    title: stamp.title,
    sentence,
    cells: [
      ['Scene', sceneId ?? 'not saved'],
      ['Version', saved],
      ['Date', date],
      ['Condition', condition],
      ['Method', method],
    ],
    workshop,
  }
}

function firstPage(
  type: Typesetter,
  tags: Tags,
  page: Element,
  frame: Box,
  paper: Paper,
  content: SheetContent,
  picture: Uint8Array<ArrayBuffer> | null,
) {
  const { pdf } = type
  const box = pictureBox(paper)
  if (picture)
    tags.draw(
      page,
      'Figure',
      () =>
        pdf.image(picture.buffer, box.x, box.y, {
          fit: [box.width, box.height],
          align: 'center',
          valign: 'center',
        }),
      { alt: content.pictureWords },
    )
  const side = {
    x: box.x + box.width + pad,
    y: box.y,
    width: frame.x + frame.width - pad - (box.x + box.width + pad),
    height: 196,
  }
  tags.draw(page, 'Figure', () => drawMarks(type, content.star, side), { alt: content.star.words })
  const caption = { face: 'text', size: 7, colour: inks.soft } as const
  tags.draw(page, 'P', () =>
    type.line(
      'Crank star, seen from the free end',
      side.x + side.width / 2,
      side.y + side.height + 6,
      caption,
      'middle',
    ),
  )
  const main = content.groups.flatMap(({ tables }) => tables).find(({ title }) => title === mainData)
  if (main) {
    const columns = column(
      side.x,
      side.y + side.height + 10,
      side.width,
      frame.y + frame.height - titleBlock.height - pad,
    )
    table(type, tags, page, columns, main)
  }
  const strip = {
    x: frame.x + pad,
    y: frame.y + frame.height - stripHeight - pad,
    width: frame.width - titleBlock.width - 3 * pad,
    height: stripHeight,
  }
  tags.draw(page, 'Figure', () => drawMarks(type, content.strip, strip), { alt: content.strip.words })
}

/** A column that never ends: whoever uses it has seen to the room. */
const column = (x: number, y: number, width: number, bottom: number): Columns => ({
  x,
  y,
  width,
  bottom,
  room: () => undefined,
})

function flow(type: Typesetter, tags: Tags, frame: Box, content: SheetContent, newPage: () => Element) {
  const count = 2
  const gap = 22
  const width = (frame.width - 2 * pad - (count - 1) * gap) / count
  const top = frame.y + 4
  const bottoms = [frame.y + frame.height - pad, frame.y + frame.height - titleBlock.height - pad]
  let at = 0
  let page = newPage()
  const columns: Columns = {
    x: frame.x + pad,
    y: top,
    width,
    bottom: bottoms[0],
    room(height) {
      if (columns.y + height <= columns.bottom) return
      at = (at + 1) % count
      if (at === 0) page = newPage()
      columns.x = frame.x + pad + at * (width + gap)
      columns.y = top
      columns.bottom = bottoms[at]
    },
  }
  for (const { title, tables } of content.groups) {
    heading(type, tags, page, columns, title)
    for (const each of tables) if (each.title !== mainData) table(type, tags, page, columns, each)
  }
  if (content.completeness) {
    heading(type, tags, page, columns, 'What a class society asks for')
    completenessList(type, tags, page, columns, content.completeness)
  }
  heading(type, tags, page, columns, 'What the figures assume')
  paragraph(type, tags, page, columns, `Method: ${content.method}.`)
  for (const words of content.assumptions) paragraph(type, tags, page, columns, words)
  heading(type, tags, page, columns, 'Cautions')
  for (const words of content.cautions) paragraph(type, tags, page, columns, words)
}
