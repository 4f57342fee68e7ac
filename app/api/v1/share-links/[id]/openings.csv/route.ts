import { openingsCsv } from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { exportOpenings, openingsTable } from '@/lib/services/link-openings'
import { tableCsv } from '@/lib/tables/csv'

export const GET = handle(openingsCsv, async ({ person, params }) => {
  const { link, openings } = await exportOpenings(person, params.id)
  return new Response(tableCsv(openingsTable(link, openings)), {
    headers: {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': 'attachment; filename="openings.csv"',
      'cache-control': 'no-store',
    },
  })
})
