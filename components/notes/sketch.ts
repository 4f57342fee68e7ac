import { mostOnStill, type StillDrawing } from '@/scene/model/still-drawing'

export type Shape = StillDrawing['shapes'][number]
export type Place = readonly [number, number]
export type Tool = Shape['shape']

/** What is being drawn on the still picture; it becomes part of a note once words say the same. */
export interface Sketch {
  /** Width of the picture through its height. */
  aspect: number
  shapes: readonly Shape[]
  tool: Tool
  words: string
}

export const emptySketch = (aspect: number): Sketch => ({ aspect, shapes: [], tool: 'arrow', words: '' })

const clamp = (value: number) => Math.min(1, Math.max(0, Math.round(value * 1e4) / 1e4))
const placed = ([x, y]: Place): [number, number] => [clamp(x), clamp(y)]

/** Neighbours that are nearer than this say nothing more, in shares of the picture. */
const fine = 0.004

/** Freehand without the points that a hand repeats; null where there was no line. */
export function freehand(places: readonly Place[]): Shape | null {
  const points: [number, number][] = []
  for (const place of places) {
    const last = points.at(-1)
    if (!last || Math.hypot(place[0] - last[0], place[1] - last[1]) >= fine) points.push(placed(place))
  }
  return points.length < 2 ? null : { shape: 'freehand', points }
}

/** An arrow or a box between two places; null where they are one. */
export const spanned = (tool: Exclude<Tool, 'freehand'>, from: Place, to: Place): Shape | null =>
  Math.hypot(to[0] - from[0], to[1] - from[1]) < fine
    ? null
    : { shape: tool, from: placed(from), to: placed(to) }

const pointsOf = (shape: Shape) => (shape.shape === 'freehand' ? shape.points.length : 2)

/** What stands against one more shape, in words. */
export function refusedShape({ shapes }: Sketch, next: Shape): string | null {
  if (shapes.length >= mostOnStill.shapes)
    return `A drawing holds ${mostOnStill.shapes} shapes at most: undo one first.`
  const points = [...shapes, next].reduce((sum, shape) => sum + pointsOf(shape), 0)
  return points > mostOnStill.points
    ? `A drawing holds ${mostOnStill.points} points at most: draw a shorter line.`
    : null
}

/** As a note keeps it; null while there is nothing to keep. */
export const stillDrawingOf = ({ aspect, shapes, words }: Sketch): StillDrawing | null =>
  shapes.length === 0 ? null : { aspect, shapes: [...shapes], words: words.trim() }
