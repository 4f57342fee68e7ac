import * as contracts from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { createScene } from '@/lib/services/create-scene'
import { listScenes } from '@/lib/services/list-scenes'

export const GET = handle(contracts.listScenes, ({ person, query }) => listScenes(person, query))

export const POST = handle(contracts.createScene, ({ person, body, idempotencyKey }) =>
  createScene(person, body, idempotencyKey),
)
