import { archiveScene as contract } from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { archiveScene } from '@/lib/services/archive-scene'

export const POST = handle(contract, async ({ person, params }) => ({
  scene: await archiveScene(person, params.id),
}))
