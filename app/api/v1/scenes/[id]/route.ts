import * as contracts from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { openScene } from '@/lib/services/open-scene'
import { renameScene } from '@/lib/services/rename-scene'

export const GET = handle(contracts.openScene, ({ person, params, query }) =>
  openScene(person, params.id, query.version),
)

export const PATCH = handle(contracts.renameScene, async ({ person, params, body }) => ({
  scene: await renameScene(person, params.id, body.title),
}))
