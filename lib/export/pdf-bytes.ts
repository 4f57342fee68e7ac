import type PDFDocument from 'pdfkit'

/** Ends a document and gives the whole of it. */
export function pdfBytes(pdf: typeof PDFDocument.prototype): Promise<Uint8Array<ArrayBuffer>> {
  const chunks: Uint8Array[] = []
  return new Promise((resolve, reject) => {
    pdf.on('data', (chunk: Uint8Array) => chunks.push(chunk))
    pdf.on('error', reject)
    pdf.on('end', () => resolve(joined(chunks)))
    pdf.end()
  })
}

function joined(chunks: readonly Uint8Array[]): Uint8Array<ArrayBuffer> {
  const all = new Uint8Array(chunks.reduce((sum, { length }) => sum + length, 0))
  let at = 0
  for (const chunk of chunks) {
    all.set(chunk, at)
    at += chunk.length
  }
  return all
}
