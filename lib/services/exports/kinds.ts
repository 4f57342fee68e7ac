import type { Operation, Person } from '@/lib/auth/access'
import type { Wanted } from '@/lib/contracts/exports'
import { drawForPrint } from '@/lib/pictures/print-picture'
import { sheetParts } from '@/lib/sheet/sheet-parts'
import { printNotes } from '../notes/print-notes'
import { printVersion } from '../print-design-sheet'

export interface MadeFile {
  file: Uint8Array<ArrayBuffer>
  media: string
  fileName: string
}

/** What somebody must be allowed to do with the scene to have such a file. */
export const exportRight: Record<Wanted['kind'], Operation> = {
  'design-sheet': 'scene.read',
  'notes-pdf': 'note.read',
}

/** Makes the file for whoever asked, with what they may see now. */
export async function makeFile(person: Person, wanted: Wanted): Promise<MadeFile> {
  switch (wanted.kind) {
    case 'design-sheet':
      return {
        file: await printVersion(
          person,
          wanted.sceneId,
          wanted.version,
          { ...wanted, parts: sheetParts },
          drawForPrint,
        ),
        media: 'application/pdf',
        fileName: `design-sheet-version-${wanted.version}.pdf`,
      }
    case 'notes-pdf':
      return {
        file: await printNotes(person, wanted.sceneId, { ...wanted.filter, version: wanted.version }),
        media: 'application/pdf',
        fileName: `notes-version-${wanted.version}.pdf`,
      }
  }
}
