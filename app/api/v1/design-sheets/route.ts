import { printDesignSheet as contract } from '@/lib/contracts/design-sheets'
import { personOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { printDesignSheet } from '@/lib/services/print-design-sheet'
import { fileResponse } from '../file-response'
import { drawForPrint } from '@/lib/pictures/print-picture'

export const POST = handle(contract, async ({ request, body }) => {
  // open to anyone: who asks matters only where a saved version is named
  const person = body.of ? await personOf(request) : null
  return fileResponse(
    await printDesignSheet(person, body, drawForPrint),
    'application/pdf',
    'design-sheet.pdf',
  )
})
