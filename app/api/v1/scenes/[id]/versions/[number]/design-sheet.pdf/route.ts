import { versionDesignSheet } from '@/lib/contracts/design-sheets'
import { handle } from '@/lib/http/handle'
import { printVersion } from '@/lib/services/print-design-sheet'
import { sheetParts } from '@/lib/sheet/sheet-parts'
import { fileResponse } from '../../../../../file-response'
import { drawForPrint } from '@/lib/pictures/print-picture'

export const GET = handle(versionDesignSheet, async ({ person, params, query }) => {
  const bytes = await printVersion(
    person,
    params.id,
    params.number,
    { ...query, parts: sheetParts },
    drawForPrint,
  )
  return fileResponse(bytes, 'application/pdf', `design-sheet-version-${params.number}.pdf`)
})
