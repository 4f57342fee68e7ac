import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { faceFiles } from '@/lib/export/font-files'
import { faces, type FaceFiles } from '@/lib/export/typesetter'

let fonts: Promise<FaceFiles> | undefined

/** Read once: they are part of the program. */
export const printFonts = () => (fonts ??= readFonts())

async function readFonts(): Promise<FaceFiles> {
  const files = faces.map(async (face) => {
    const path = join(/* turbopackIgnore: true */ process.cwd(), faceFiles[face])
    return [face, Uint8Array.from(await readFile(path))] as const
  })
  return Object.fromEntries(await Promise.all(files)) as FaceFiles
}
