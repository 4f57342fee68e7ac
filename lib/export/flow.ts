import type { Asked } from '@/lib/sheet/completeness'
import type { SheetTable } from '@/lib/sheet/figure-table'
import { inks } from './inks'
import type { Element, Tags } from './tagged'
import type { Style, Typesetter } from './typesetter'

/** Where the next thing goes: columns from the left, then a new page. */
export interface Columns {
  x: number
  y: number
  width: number
  bottom: number
  /** Room for this height, on from here; a column or page further where there is none. */
  room(height: number): void
}

const rowHeight = 11
/** A table no taller than this is not cut. */
const keptWhole = 200
const small: Style = { face: 'text', size: 7.4, colour: inks.ink }
const figure: Style = { face: 'figure', size: 7.2, colour: inks.ink }
const caption: Style = { face: 'text', size: 6.8, colour: inks.soft }

export function heading(type: Typesetter, tags: Tags, parent: Element, columns: Columns, text: string): void {
  columns.room(22 + 3 * rowHeight)
  columns.y += 16
  tags.draw(parent, 'H2', () =>
    type.line(text, columns.x, columns.y, { face: 'head', size: 11.5, colour: inks.ink }),
  )
  columns.y += 6
}

export function paragraph(
  type: Typesetter,
  tags: Tags,
  parent: Element,
  columns: Columns,
  text: string,
  style = small,
): void {
  const lines = type.lines(text, columns.width, style)
  const lead = style.size * 1.32
  columns.room(lead * lines.length + 4)
  const { x } = columns
  tags.draw(parent, 'P', () => {
    for (const line of lines) {
      columns.y += lead
      type.line(line, x, columns.y, style)
    }
  })
  columns.y += 3
}

/** A table, cut between rows where a column ends; its head stands again on every piece. */
export function table(
  type: Typesetter,
  tags: Tags,
  parent: Element,
  columns: Columns,
  content: SheetTable,
): void {
  const { pdf } = type
  const rows = content.rows
  const whole = 14 + rowHeight * (rows.length + 2)
  columns.room(whole < keptWhole ? whole : 14 + 6 * rowHeight)
  columns.y += 13
  tags.draw(parent, 'H3', () =>
    type.line(content.title, columns.x, columns.y, { face: 'bold', size: 8.2, colour: inks.ink }),
  )
  columns.y += 3
  const element = tags.group(parent, 'Table')
  const headed = content.head.some((name) => name !== '')
  const widths = widthsOf(type, content, columns.width)
  const ends = widths.map((_, i) => widths.slice(0, i + 1).reduce((sum, width) => sum + width, 0))
  const rule = (weight: number, colour: string) =>
    tags.artifact(() =>
      pdf
        .lineWidth(weight)
        .strokeColor(colour)
        .moveTo(columns.x, columns.y + 3)
        .lineTo(columns.x + columns.width, columns.y + 3)
        .stroke(),
    )
  const head = () => {
    if (!headed) return rule(0.8, inks.ink)
    const lines = content.head.map((name, i) => type.lines(name, widths[i] - 4, caption))
    const height = Math.max(...lines.map(({ length }) => length)) * 8
    const row = tags.group(element, 'TR')
    lines.forEach((words, i) =>
      tags.draw(
        row,
        'TH',
        () =>
          words.forEach((line, k) => {
            const y = columns.y + height - 8 * (words.length - 1 - k)
            if (i === 0) type.line(line, columns.x, y, caption)
            else type.line(line, columns.x + ends[i], y, caption, 'end')
          }),
        { scope: 'Column' },
      ),
    )
    row.end()
    columns.y += height
    rule(0.8, inks.ink)
  }
  head()
  for (const cells of rows) {
    const words = type.lines(cells[0], widths[0] - 6, small)
    const last = type.lines(cells.at(-1)!, widths.at(-1)! - 2, figure)
    const height = rowHeight + 8 * (Math.max(words.length, last.length, 1) - 1)
    const before = columns.y
    columns.room(height + 2)
    if (columns.y < before) head()
    const row = tags.group(element, 'TR')
    tags.draw(
      row,
      'TH',
      () => words.forEach((line, k) => type.line(line, columns.x, columns.y + rowHeight + 8 * k, small)),
      { scope: 'Row' },
    )
    cells.slice(1).forEach((text, i) =>
      tags.draw(row, 'TD', () => {
        const lines = i + 2 === cells.length ? last : [text]
        lines.forEach((line, k) =>
          type.line(line, columns.x + ends[i + 1], columns.y + rowHeight + 8 * k, figure, 'end'),
        )
      }),
    )
    row.end()
    columns.y += height
    rule(0.3, inks.hair)
  }
  element.end()
  columns.y += 4
  if (content.words) paragraph(type, tags, parent, columns, content.words, caption)
}

/** Figures take what they need, names the rest. A table without heads is words: half and half. */
function widthsOf(type: Typesetter, { head, rows }: SheetTable, width: number): number[] {
  const figures = head.slice(1).map((_, i) => {
    const most = Math.max(...rows.map((cells) => type.width(cells[i + 1], figure)))
    return Math.max(most, Math.min(46, type.width(head[i + 1], caption))) + 10
  })
  const needed = figures.reduce((sum, each) => sum + each, 0)
  const names = Math.min(
    width * 0.45,
    Math.max(type.width(head[0], caption), ...rows.map(([name]) => type.width(name, small))) + 8,
  )
  const scale = Math.min(1, (width - Math.min(names, 0.45 * width)) / needed)
  const scaled = figures.map((each) => each * scale)
  const rest = width - scaled.reduce((sum, each) => sum + each, 0)
  if (head.length === 2) return [rest, scaled[0]]
  // figures spread over the column, so that the last one ends at its edge
  const spare = Math.max(0, rest - names) / figures.length
  return [Math.min(rest, names), ...scaled.map((each) => each + spare)]
}

const sign = { present: 'tick', 'in part': 'part', missing: 'dash' } as const

/** The list of what is asked for: a sign, the word, and what was found. */
export function completenessList(
  type: Typesetter,
  tags: Tags,
  parent: Element,
  columns: Columns,
  items: readonly Asked[],
): void {
  const { pdf } = type
  const list = tags.group(parent, 'L')
  for (const { item, standing, found } of items) {
    const words = type.lines(`${item}: ${found}`, columns.width - 62, small)
    columns.room(9.6 * words.length + 3)
    const top = columns.y + 9
    tags.artifact(() => {
      const [x, y] = [columns.x + 4, top - 2.6]
      pdf.lineWidth(0.9).strokeColor(inks.ink)
      if (sign[standing] === 'tick') {
        pdf.circle(x, y, 3.6).stroke()
        pdf
          .moveTo(x - 1.8, y)
          .lineTo(x - 0.4, y + 1.6)
          .lineTo(x + 2, y - 1.6)
          .stroke()
      } else if (sign[standing] === 'part') pdf.path(`M ${x - 3.8} ${y + 3} l 3.8 -6.6 l 3.8 6.6 z`).stroke()
      else
        pdf
          .dash(2, { space: 1.4 })
          .moveTo(x - 4, y)
          .lineTo(x + 4, y)
          .stroke()
          .undash()
    })
    tags.draw(list, 'LI', () => {
      type.line(standing, columns.x + 14, top, { ...small, face: 'bold' })
      words.forEach((line, k) => type.line(line, columns.x + 56, top + 9.6 * k, small))
    })
    columns.y += 9.6 * words.length + 3
  }
  list.end()
}
