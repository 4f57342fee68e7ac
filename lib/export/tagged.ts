import type PDFDocument from 'pdfkit'

type Pdf = typeof PDFDocument.prototype
export type Element = PDFKit.PDFStructureElement

interface ElementOptions {
  alt?: string
  scope?: 'Column' | 'Row'
}

/** The structure of a tagged document, written as it is drawn: an element, and what is drawn for it. */
export class Tags {
  readonly root: Element

  constructor(private readonly pdf: Pdf) {
    this.root = pdf.struct('Document')
    pdf.addStructure(this.root)
  }

  /** An element that holds others. */
  group(parent: Element, type: string, options: ElementOptions = {}): Element {
    const element = this.pdf.struct(type, options as PDFKit.Mixins.StructureElementOptions)
    parent.add(element)
    return element
  }

  /** An element of drawn content; all of it is on one page. */
  draw(parent: Element, type: string, draw: () => void, options: ElementOptions = {}): void {
    const element = this.group(parent, type, options)
    element.add(this.pdf.markStructureContent(type))
    draw()
    this.pdf.endMarkedContent()
    element.end()
  }

  /** What only frames and rules: not read aloud. */
  artifact(draw: () => void): void {
    this.pdf.markContent('Artifact', { type: 'Layout' })
    draw()
    this.pdf.endMarkedContent()
  }

  end(): void {
    this.root.end()
  }
}
