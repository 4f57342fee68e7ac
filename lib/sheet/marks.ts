/**
 * A drawing as marks on a rectangle, y down: what the printed sheet and its preview draw alike. Lengths are in the
 * drawing's own units; `weight` is a line's width.
 */
export type Mark =
  | { kind: 'path'; d: string; weight: number; dash?: number[]; fill?: 'ink' | 'paper' }
  | { kind: 'text'; x: number; y: number; text: string; size: number; anchor: 'start' | 'middle' | 'end' }

export interface Drawing {
  width: number
  height: number
  /** In a sentence, for whoever does not see it. */
  words: string
  marks: Mark[]
}

const fixed = (value: number) => String(Math.round(value * 1000) / 1000)

/** Pieces of a path: numbers are written short. */
export const path = (...pieces: (string | number)[]): string =>
  pieces.map((piece) => (typeof piece === 'number' ? fixed(piece) : piece)).join(' ')

export const circle = (x: number, y: number, radius: number): string =>
  path(
    'M',
    x - radius,
    y,
    'a',
    radius,
    radius,
    '0 1 0',
    2 * radius,
    0,
    'a',
    radius,
    radius,
    '0 1 0',
    -2 * radius,
    0,
    'z',
  )

export const diamond = (x: number, y: number, half: number): string =>
  path('M', x, y - half, 'L', x + half, y, 'L', x, y + half, 'L', x - half, y, 'Z')
