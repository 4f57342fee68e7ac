import { description } from '@/lib/contracts/system'
import { handle } from '@/lib/http/handle'
import { openApiDocument } from '@/lib/http/openapi'

export const GET = handle(description, async () => ({ ...openApiDocument() }))
