import { migrationState } from '@/db/queries/migration-state'
import { health } from '@/lib/contracts/system'
import { Problem } from '@/lib/errors/problem'
import { handle } from '@/lib/http/handle'

export const GET = handle(health, async () => {
  const { applied, wanted } = await migrationState().catch((cause: unknown) => {
    throw new Problem('unavailable', 'The database does not answer.', 'Look whether it runs.', { cause })
  })
  if (applied === wanted) return { status: 'ready' as const, migration: wanted }
  throw new Problem(
    'unavailable',
    `The database is at ${applied}, not at ${wanted}.`,
    'Start the product again.',
  )
})
