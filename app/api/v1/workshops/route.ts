import { createWorkshop as contract } from '@/lib/contracts/workshops'
import { handle } from '@/lib/http/handle'
import { createWorkshop } from '@/lib/services/create-workshop'

export const POST = handle(contract, async ({ person, body }) => ({
  id: await createWorkshop(person, body.name),
}))
