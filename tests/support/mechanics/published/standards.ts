import { balanceGrades, crankDriveGrades } from '@/lib/mechanics/balance/two-planes'
import { answer } from '../kernel'
import type { Case } from './entry'
import { single } from './rig'

export const standards: Record<string, Case> = {
  'STD-01': {
    figures: (i) => {
      const document = { ...single({ radius: 0.04, rod: 0.15 }), crankMassKg: i.rotorMass_kg }
      const { permissibleKgMm } = answer(document, i.speed_rpm).balance.grade!
      return {
        permissibleResidualUnbalance_gmm: permissibleKgMm * 1000,
        permissibleSpecificUnbalance_um: (permissibleKgMm * 1000) / i.rotorMass_kg,
        perPlaneSymmetric_gmm: (permissibleKgMm * 1000) / 2,
      }
    },
  },
  'STD-03': {
    figures: () => {
      const grade = (kind: keyof typeof crankDriveGrades) => `G${crankDriveGrades[kind]}`
      return {
        inherentlyBalancedRigidlyMounted: grade('inherently balanced, rigidly mounted'),
        inherentlyBalancedElasticallyMounted: grade('inherently balanced, elastically mounted'),
        completeEnginesCarsTrucksLocomotives: grade('complete engines of cars, trucks and locomotives'),
        inherentlyUnbalancedRigidlyMounted: grade('inherently unbalanced, rigidly mounted'),
        inherentlyUnbalancedElasticallyMounted: grade('inherently unbalanced, elastically mounted'),
        slowMarineDieselBalanced: grade('large slow marine diesel, inherently balanced'),
        slowMarineDieselUnbalanced: grade('large slow marine diesel, inherently unbalanced'),
      }
    },
  },
  'STD-04': { figures: () => ({ grades: [...balanceGrades] }) },
  'STD-09': {
    figures: (i) => {
      const it = single({
        radius: 0.04,
        rod: 0.15,
        rodMass: i.rodBigEnd_g / 1000,
        rodCg: 0,
        bearing: i.rodBearing_g / 1000,
      })
      const cylinders = Array.from({ length: i.rodsPerPin }, (_, k) => ({
        ...it.cylinders[0],
        id: `${k + 1}`,
      }))
      const { bobWeights } = answer(
        { ...it, cylinders, firingOrder: cylinders.map((c) => c.id) },
        600,
      ).balance
      return { rotatingPartOfBobWeight_g: bobWeights['1'].rotatingKg * 1000 }
    },
  },
}
