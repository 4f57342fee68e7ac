import { personOfToken } from '@/lib/auth/person'
import { printDesignSheet as contract } from '@/lib/contracts/design-sheets'
import { handle, sessionTokenOf } from '@/lib/http/handle'
import { printDesignSheet } from '@/lib/services/print-design-sheet'
import { fileResponse } from '../file-response'
import { drawForPrint } from '../print-picture'

export const POST = handle(contract, async ({ request, body }) => {
  // open to anyone: who asks matters only where a saved version is named
  const person = body.of ? await personOfToken(sessionTokenOf(request)) : null
  return fileResponse(
    await printDesignSheet(person, body, drawForPrint),
    'application/pdf',
    'design-sheet.pdf',
  )
})
