import { openVersion } from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { openScene } from '@/lib/services/open-scene'

export const GET = handle(openVersion, ({ person, params }) => openScene(person, params.id, params.number))
