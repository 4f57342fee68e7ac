import { exportFile } from '@/lib/contracts/exports'
import { handle } from '@/lib/http/handle'
import { exportedFile } from '@/lib/services/exports/read-export'
import { fileResponse } from '../../../file-response'

export const GET = handle(exportFile, async ({ person, params }) => {
  const { file, media, fileName } = await exportedFile(person, params.id)
  return fileResponse(file, media, fileName)
})
