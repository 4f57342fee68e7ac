import { quantityText } from '@/lib/units/format'
import { units } from '@/lib/units/units'
import { niceBelow } from '@/scene/frame/nice-scale'
import type { StageLook } from './types'

export interface ScaleBar {
  /** Newtons that the bar stands for. */
  force: number
  /** Pixels. */
  length: number
  label: string
}

/** The longest bar of a round value (1, 2 or 5 times a power of ten) that is no longer than `longest` pixels. */
export function scaleBar(pixelsPerNewton: number, unit: StageLook['forceUnit'], longest = 64): ScaleBar {
  const newtons = units[unit].factor
  const force = niceBelow(longest / (pixelsPerNewton * newtons)) * newtons
  return {
    force,
    length: force * pixelsPerNewton,
    label: quantityText(force, 'force', unit === 'lbf' ? 'us' : 'si', { significant: 1 }),
  }
}
