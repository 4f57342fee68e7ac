import { openingsJson } from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { exportOpenings } from '@/lib/services/link-openings'

export const GET = handle(openingsJson, async ({ person, params, headers }) => {
  headers.set('content-disposition', 'attachment; filename="openings.json"')
  return exportOpenings(person, params.id)
})
