import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'

interface StructNode {
  role?: string
  alt?: string
  children?: StructNode[]
}

/** A PDF read back: its words page by page, what it says of itself, and its structure. */
export async function readPdf(bytes: Uint8Array) {
  const task = getDocument({ data: bytes.slice(), verbosity: 0 })
  const pdf = await task.promise
  const pages: { text: string; width: number; height: number; roles: StructNode[]; beyond: string[] }[] = []
  for (let number = 1; number <= pdf.numPages; number++) {
    const page = await pdf.getPage(number)
    const [, , width, height] = page.view
    const { items } = await page.getTextContent()
    const words = items.flatMap((item) => ('str' in item ? [item] : []))
    const roles: StructNode[] = []
    const walk = (node: StructNode) => {
      roles.push(node)
      node.children?.forEach(walk)
    }
    walk((await page.getStructTree()) as StructNode)
    pages.push({
      text: words
        .map(({ str }) => str)
        .join(' ')
        .replace(/\s+/g, ' '),
      width,
      height,
      roles,
      beyond: words
        .filter(
          ({ transform: [, , , , x, y], width: length }) =>
            x < 0 || y < 0 || x + length > width || y > height,
        )
        .map(({ str }) => str),
    })
  }
  const { info } = await pdf.getMetadata()
  const marked = await pdf.getMarkInfo()
  await task.destroy()
  return {
    pages,
    info: info as Record<string, unknown>,
    marked: (marked as { Marked?: boolean } | null)?.Marked,
  }
}
