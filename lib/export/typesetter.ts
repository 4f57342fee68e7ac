import type PDFDocument from 'pdfkit'

export const faces = ['text', 'bold', 'head', 'figure'] as const
export type Face = (typeof faces)[number]

/** A TrueType file for every face. */
export type FaceFiles = Record<Face, Uint8Array<ArrayBuffer>>

export interface Style {
  face: Face
  size: number
  colour?: string
}

interface Run {
  face: Face
  text: string
}

/** What a character is replaced by when no face has it, after its accents have been tried away. */
const UNKNOWN = '?'

/** The part of the font engine's face that is read here: pdfkit keeps it on its own font. */
interface EngineFont {
  font: { hasGlyphForCodePoint(code: number): boolean }
}

/** Sets text: finds a face that has each character, measures, breaks lines. */
export class Typesetter {
  private readonly known = new Map<string, boolean>()

  constructor(
    readonly pdf: typeof PDFDocument.prototype,
    files: FaceFiles,
  ) {
    for (const face of faces) pdf.registerFont(face, files[face])
  }

  width(text: string, { face, size }: Style): number {
    let width = 0
    for (const run of this.runs(text, face))
      width += this.pdf.font(run.face).fontSize(size).widthOfString(run.text)
    return width
  }

  /** One line with its baseline at y. */
  line(text: string, x: number, y: number, style: Style, anchor: 'start' | 'middle' | 'end' = 'start'): void {
    let at = anchor === 'start' ? x : x - this.width(text, style) * (anchor === 'end' ? 1 : 0.5)
    for (const run of this.runs(text, style.face)) {
      this.pdf
        .font(run.face)
        .fontSize(style.size)
        .fillColor(style.colour ?? '#000')
      this.pdf.text(run.text, at, y, { lineBreak: false, baseline: 'alphabetic' })
      at += this.pdf.widthOfString(run.text)
    }
  }

  /** Words broken into lines of at most this width; a word that is longer is broken in itself. */
  lines(text: string, width: number, style: Style): string[] {
    const lines: string[] = []
    let line = ''
    for (const word of text.split(/\s+/).flatMap((each) => this.pieces(each, width, style))) {
      const longer = line === '' ? word : `${line} ${word}`
      if (this.width(longer, style) <= width) line = longer
      else {
        lines.push(line)
        line = word
      }
    }
    return [...lines, line].filter((each) => each !== '')
  }

  private pieces(word: string, width: number, style: Style): string[] {
    if (this.width(word, style) <= width) return [word]
    const pieces: string[] = []
    let piece = ''
    for (const letter of word) {
      if (piece !== '' && this.width(piece + letter, style) > width) {
        pieces.push(piece)
        piece = ''
      }
      piece += letter
    }
    return [...pieces, piece]
  }

  private runs(text: string, face: Face): Run[] {
    const runs: Run[] = []
    for (const letter of text) {
      const shown = this.shown(letter, face)
      const last = runs.at(-1)
      if (last?.face === shown.face) last.text += shown.text
      else runs.push(shown)
    }
    return runs
  }

  private shown(letter: string, face: Face): Run {
    for (const text of [letter, letter.normalize('NFKD').replace(/\p{M}/gu, '')])
      for (const each of [face, 'figure', 'head'] as const)
        if (text !== '' && [...text].every((part) => this.has(each, part))) return { face: each, text }
    return { face, text: UNKNOWN }
  }

  private has(face: Face, letter: string): boolean {
    const key = face + letter
    const known = this.known.get(key)
    if (known !== undefined) return known
    const { _font } = this.pdf.font(face) as unknown as { _font: EngineFont }
    const has = _font.font.hasGlyphForCodePoint(letter.codePointAt(0)!)
    this.known.set(key, has)
    return has
  }
}
