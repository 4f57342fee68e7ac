import { findLayouts as contract } from '@/lib/contracts/layouts'
import { handle } from '@/lib/http/handle'
import { findLayouts } from '@/lib/services/find-layouts'

export const POST = handle(contract, async ({ body }) => findLayouts(body))
