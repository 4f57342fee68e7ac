import { answer } from '../kernel'
import { entries, inputs, type Case, type Figures } from './entry'
import { single } from './rig'

interface FiringInputs {
  firingOrder: number[]
  crankPinAngleByCylinder_deg: Record<string, number>
  bankAxisByCylinder_deg: Record<string, number>
  cycle_deg: number
}

/** The entry's layout as a document: one throw a cylinder, one bank an axis. */
function firingOf(id: string): Figures {
  const it = inputs<FiringInputs>(id)
  const ids = Object.keys(it.crankPinAngleByCylinder_deg).sort((a, b) => Number(a) - Number(b))
  const axes = [...new Set(Object.values(it.bankAxisByCylinder_deg))]
  const bankOf = (cylinder: string) => `${axes.indexOf(it.bankAxisByCylinder_deg[cylinder])}`
  const { firing } = answer(
    {
      ...single({ radius: 0.04, rod: 0.15 }),
      cycle: it.cycle_deg === 720 ? 'four-stroke' : 'two-stroke',
      banks: axes.map((angleDeg, i) => ({ id: `${i}`, angleDeg })),
      throws: ids.map((id, i) => ({ id, angleDeg: it.crankPinAngleByCylinder_deg[id], axialMm: 100 * i })),
      cylinders: ids.map((id, i) => ({ id, bank: bankOf(id), throw: id, axialMm: 100 * i })),
      firingOrder: it.firingOrder.map(String),
    },
    600,
  )
  const banks: Record<string, string> = {
    bankOddIntervals_deg: '1',
    bankEvenIntervals_deg: '2',
    bankAIntervals_deg: '1',
    bankBIntervals_deg: '5',
  }
  const expected = entries.find((e) => e.id === id)!.expected
  return {
    firingIntervals_deg: firing.intervalsDeg,
    ...Object.fromEntries(
      Object.entries(banks)
        .filter(([key]) => key in expected)
        .map(([key, cylinder]) => [key, firing.banks[bankOf(cylinder)].intervalsDeg]),
    ),
  }
}

export const firing: Record<string, Case> = Object.fromEntries(
  entries.filter((e) => e.id.startsWith('FIR-')).map((e) => [e.id, { figures: () => firingOf(e.id) }]),
)
