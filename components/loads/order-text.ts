import { formatNumber } from '@/lib/units/format'

/** An order as it is called: 4, 4.5. */
export const orderText = (order: number): string => formatNumber(order, { decimals: order % 1 === 0 ? 0 : 1 })
