import { plainNumber } from '@/lib/units/format'
import { plainField } from '@/scene/session/plain-field'
import { quantityField, type QuantityField } from '@/scene/session/field'
import type { Scene } from '@/scene/model/scene'

const weightOf = ({ train }: Scene, index: number) => train.counterweights[index]

/** The moment of a counterweight: it changes the mass, the radius stays. */
const momentField = (index: number): QuantityField =>
  quantityField({
    key: `counterweights.${index}.moment`,
    label: 'Moment',
    quantity: 'unbalance',
    documentUnit: 'kg mm',
    get: (scene) => {
      const weight = weightOf(scene, index)
      return weight && weight.massKg * weight.radiusMm
    },
    changes: (value = 0, scene) => {
      const { radiusMm } = weightOf(scene, index)
      const massKg = radiusMm > 0 ? value / radiusMm : 0
      return [{ path: ['train', 'counterweights', index, 'massKg'], value: massKg }]
    },
    refuse: (value) =>
      value < 0
        ? {
            message: 'A moment is 0 or more. Turn the weight by 180° to put it on the other side.',
            mends: [{ label: `Use ${plainNumber(-value)} kg mm`, text: `${plainNumber(-value)} kg mm` }],
          }
        : null,
  })

/** What can be typed of one counterweight, in the order of the table. */
export const webFields = (index: number) => ({
  axial: plainField(['counterweights', index, 'axialMm'], 'Along', 'length', 'mm'),
  moment: momentField(index),
  angle: plainField(['counterweights', index, 'angleDeg'], 'Angle', 'angle', '°'),
  radius: plainField(['counterweights', index, 'radiusMm'], 'Radius', 'length', 'mm'),
  mass: plainField(['counterweights', index, 'massKg'], 'Mass', 'mass', 'kg'),
})
