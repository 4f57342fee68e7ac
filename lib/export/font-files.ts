import type { Face } from './typesetter'

/** Where each face lies, from the root of the program; whoever prints reads them. */
export const faceFiles: Record<Face, string> = {
  text: 'lib/export/fonts/instrument-sans-400.ttf',
  bold: 'lib/export/fonts/instrument-sans-600.ttf',
  head: 'lib/export/fonts/bricolage-grotesque-600.ttf',
  figure: 'lib/export/fonts/spline-sans-mono-400.ttf',
}
