import { findLayouts, type LayoutLimits, type LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import type { Layout, LayoutRequest } from '@/lib/mechanics/layouts/layout'

export const DEG = Math.PI / 180

/** The whole search, stepped to its end. */
export function searchLayouts(request: LayoutRequest, limits: LayoutLimits = {}): LayoutSearch {
  const steps = findLayouts(request, limits)
  for (;;) {
    const step = steps.next()
    if (step.done) return step.value
  }
}

const common = { cycle: 4 * Math.PI, splits: [0], rodOffset: 0, balanceFactor: 0.5, rotating: 1, wishes: {} }

export const inLine = (cylinders: number, more: Partial<LayoutRequest> = {}): LayoutRequest => ({
  ...common,
  cylinders,
  rodsPerThrow: 1,
  bankAngles: [],
  ...more,
})

export const vee = (
  cylinders: number,
  bankDeg: number,
  more: Partial<LayoutRequest> = {},
): LayoutRequest => ({
  ...common,
  cylinders,
  rodsPerThrow: 2,
  bankAngles: [bankDeg * DEG],
  ...more,
})

/** Throw angles as they are written: 0/90/270/180. */
export const pins = ({ throwAngles }: Layout) =>
  throwAngles.map((angle) => Number((angle / DEG).toFixed(6))).join('/')
