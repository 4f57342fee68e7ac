import { formatNumber } from '@/lib/units/format'

/** An angle in degrees, to a tenth where it is not whole. */
export const angleWord = (angleDeg: number) =>
  formatNumber(angleDeg, { decimals: Math.abs(angleDeg - Math.round(angleDeg)) < 0.05 ? 0 : 1 })

/** "8 × 90" where all are alike, else "270-180-90-180"; degrees. */
export const intervalWords = (intervalsDeg: readonly number[], even: boolean) =>
  even && intervalsDeg.length > 2
    ? `${intervalsDeg.length} × ${angleWord(intervalsDeg[0])}`
    : intervalsDeg.map(angleWord).join('-')
