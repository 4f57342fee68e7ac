import { bench, describe } from 'vitest'
import { DEG, inLine, searchLayouts, vee } from '@/tests/support/mechanics/layout-search'

/** Whole searches in one thread, with the wishes of the form as it opens. */
const wishes = {
  unevenness: { weight: 3 },
  secondForce: {},
  secondCouple: {},
  firstForce: {},
  firstCouple: {},
  counterweight: {},
}
const splits = Array.from({ length: 21 }, (_, i) => (i - 10) * 6 * DEG)

describe('findLayouts', () => {
  bench('four in line', () => void searchLayouts(inLine(4, { wishes })))
  bench('six in line', () => void searchLayouts(inLine(6, { wishes })))
  bench('eight in line', () => void searchLayouts(inLine(8, { wishes })))
  bench('90° V6, 21 split angles', () => void searchLayouts(vee(6, 90, { wishes, splits })))
  bench('90° V8', () => void searchLayouts(vee(8, 90, { wishes })))
})
