import { restoreScene as contract } from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { restoreScene } from '@/lib/services/restore-scene'

export const POST = handle(contract, async ({ person, params }) => ({
  scene: await restoreScene(person, params.id),
}))
