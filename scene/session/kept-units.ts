import type { System } from '@/lib/units/quantities'

const KEY = 'counterthrow.units'

/** The units somebody chose on this machine. */
export const readUnits = (store: Pick<Storage, 'getItem'>): System =>
  store.getItem(KEY) === 'us' ? 'us' : 'si'

export const keepUnits = (store: Pick<Storage, 'setItem'>, system: System) => store.setItem(KEY, system)
