import { bench, describe } from 'vitest'
import { bestCollectorGroups } from '@/lib/mechanics/collector-groups'
import { rankedFiringOrders } from '@/lib/mechanics/firing-ranking'
import { inline, presetTrain, trainOf } from '@/tests/unit/mechanics/trains'

// Wanted: all orders of 16 cylinders, however uneven, and any grouping of them within 2 s.

const pins = Array.from({ length: 16 }, (_, k) => (k * 137.3) % 360)
const order = pins.map((_, k) => k).sort((a, b) => ((360 - pins[a]) % 360) - ((360 - pins[b]) % 360))
const sixteen = trainOf(inline(pins, { firingOrder: order.map((k) => `${k + 1}`) }))
const v12 = presetTrain('v12-60-6000')

describe('firing orders and collectors', () => {
  bench('all 32,753 orders of 16 uneven cylinders', () => void rankedFiringOrders(sixteen, { even: false }))
  bench('the 32 even orders of a V12', () => void rankedFiringOrders(v12, { even: true }))
  for (const count of [2, 3, 4])
    bench(`16 uneven cylinders into ${count} collectors`, () => void bestCollectorGroups(sixteen, count))
})
