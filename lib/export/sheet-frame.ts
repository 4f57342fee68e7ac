import { inks } from './inks'
import type { Element, Tags } from './tagged'
import type { Typesetter } from './typesetter'

export interface Box {
  x: number
  y: number
  width: number
  height: number
}

/** Points. */
const edge = 22
const zones = 8
export const titleBlock = { width: 300, height: 92 } as const
export const pad = 12

/** The frame of a page of this size: what is drawn stands inside it. */
export const frameOf = (width: number, height: number): Box => ({
  x: edge,
  y: edge + 6,
  width: width - 2 * edge,
  height: height - 2 * edge - 6,
})

/** The frame with its zones along the top. */
export function drawFrame(type: Typesetter, tags: Tags, frame: Box): void {
  const { pdf } = type
  tags.artifact(() => {
    pdf.lineWidth(1.4).strokeColor(inks.ink).rect(frame.x, frame.y, frame.width, frame.height).stroke()
    pdf.lineWidth(0.5).strokeColor(inks.line)
    for (let zone = 0; zone < zones; zone++) {
      const from = frame.x + (zone * frame.width) / zones
      if (zone > 0)
        pdf
          .moveTo(from, frame.y - 8)
          .lineTo(from, frame.y)
          .stroke()
      const middle = from + frame.width / zones / 2
      type.line(
        String(zone + 1),
        middle,
        frame.y - 3,
        { face: 'figure', size: 6, colour: inks.line },
        'middle',
      )
    }
  })
}

export interface TitleBlock {
  title: string
  sentence: string
  /** Five of them, name and value, in the order they are read; the sixth is the number of the page. */
  cells: [name: string, value: string][]
  workshop?: string
}

/** The title block at the bottom right: what this is, of what, from when, which page. */
export function drawTitleBlock(
  type: Typesetter,
  tags: Tags,
  parent: Element,
  frame: Box,
  { title: words, sentence, cells, workshop }: TitleBlock,
  page: { number: number; of: number },
): void {
  const { pdf } = type
  const { width, height } = titleBlock
  const x = frame.x + frame.width - width
  const y = frame.y + frame.height - height
  tags.artifact(() => {
    pdf.lineWidth(1.4).strokeColor(inks.ink).rect(x, y, width, height).stroke()
    pdf.lineWidth(0.5).strokeColor(inks.line)
    for (const row of [36, 64])
      pdf
        .moveTo(x, y + row)
        .lineTo(x + width, y + row)
        .stroke()
    pdf
      .moveTo(x + 100, y + 36)
      .lineTo(x + 100, y + height)
      .stroke()
    pdf
      .moveTo(x + 200, y + 36)
      .lineTo(x + 200, y + height)
      .stroke()
  })
  const section = tags.group(parent, 'Sect')
  const room = width - 16
  const title = fitted(type, words, room)
  tags.draw(section, page.number === 1 ? 'H1' : 'P', () =>
    type.line(title.text, x + 8, y + 17, { face: 'head', size: title.size, colour: inks.ink }),
  )
  tags.draw(section, 'P', () =>
    type.line(clipped(type, sentence, room, 8), x + 8, y + 29, { face: 'text', size: 8, colour: inks.soft }),
  )
  const cell = (column: number, row: number, name: string, value: string) =>
    tags.draw(section, 'P', () => {
      const at = x + 100 * column + 6
      const top = y + 36 + 28 * row
      type.line(name, at, top + 9, { face: 'text', size: 6.2, colour: inks.soft })
      const lines = type.lines(value, 90, { face: 'figure', size: 6.8 }).slice(0, 2)
      lines.forEach((line, i) =>
        type.line(line, at, top + 17.5 + 7.6 * i, { face: 'figure', size: 6.8, colour: inks.ink }),
      )
    })
  const sheet = `${page.number} of ${page.of}${workshop ? `, ${workshop}` : ''}`
  for (const [at, [name, value]] of [...cells, ['Sheet', sheet] as const].entries())
    cell(at % 3, Math.floor(at / 3), name, value)
}

/** The title as large as its place allows, and cut where even the least size is too long. */
function fitted(type: Typesetter, text: string, width: number): { text: string; size: number } {
  for (const size of [14, 12, 10, 8.5])
    if (type.width(text, { face: 'head', size }) <= width) return { text, size }
  return { text: clipped(type, text, width, 8.5, 'head'), size: 8.5 }
}

export function clipped(
  type: Typesetter,
  text: string,
  width: number,
  size: number,
  face: 'text' | 'head' | 'figure' = 'text',
): string {
  if (type.width(text, { face, size }) <= width) return text
  let short = [...text]
  while (short.length > 1 && type.width(`${short.join('')}…`, { face, size }) > width)
    short = short.slice(0, -1)
  return `${short.join('')}…`
}
