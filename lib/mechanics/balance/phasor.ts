import type { Complex } from '@/lib/numerics/fourier'
import type { Phasor } from '../balance'

/** Phasors as complex numbers: vertical + i·horizontal. */
export const complex = ({ size, angle }: Phasor): Complex => ({
  re: size * Math.cos(angle),
  im: size * Math.sin(angle),
})

export const phasor = ({ re, im }: Complex): Phasor => ({
  size: Math.hypot(re, im),
  angle: Math.atan2(im, re),
})

export const nothing: Complex = { re: 0, im: 0 }
export const plus = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im })
export const minus = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im })
export const scaled = ({ re, im }: Complex, by: number): Complex => ({ re: by * re, im: by * im })
/** Re(a·conj b): how far a points along b, times its size. */
export const along = (a: Complex, b: Complex): number => a.re * b.re + a.im * b.im
