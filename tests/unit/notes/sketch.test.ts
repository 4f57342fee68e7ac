import { describe, expect, it } from 'vitest'
import { emptySketch, freehand, refusedShape, spanned, stillDrawingOf } from '@/components/notes/sketch'
import { mostOnStill, stillDrawingSchema } from '@/scene/model/still-drawing'

describe('freehand(places)', () => {
  it('keeps the line and leaves out what a hand repeats', () => {
    expect(
      freehand([
        [0.1, 0.1],
        [0.1, 0.1],
        [0.1001, 0.1],
        [0.3, 0.2],
      ]),
    ).toEqual({
      shape: 'freehand',
      points: [
        [0.1, 0.1],
        [0.3, 0.2],
      ],
    })
    expect(
      freehand([
        [0.5, 0.5],
        [0.5, 0.5],
      ]),
    ).toBeNull()
  })
  it('stays on the picture', () => {
    expect(
      freehand([
        [-1, 0.5],
        [2, 3],
      ]),
    ).toEqual({
      shape: 'freehand',
      points: [
        [0, 0.5],
        [1, 1],
      ],
    })
  })
})

describe('spanned(tool, from, to)', () => {
  it('is nothing between a place and itself', () => {
    expect(spanned('arrow', [0.2, 0.2], [0.2, 0.2])).toBeNull()
    expect(spanned('box', [0.2, 0.2], [0.4, 0.5])).toEqual({ shape: 'box', from: [0.2, 0.2], to: [0.4, 0.5] })
  })
})

describe('stillDrawingOf(sketch)', () => {
  it('is what a note keeps, once there is a shape and words', () => {
    const sketch = emptySketch(1.4)
    expect(stillDrawingOf(sketch)).toBeNull()
    const arrow = spanned('arrow', [0.2, 0.2], [0.4, 0.5])!
    const drawing = stillDrawingOf({ ...sketch, shapes: [arrow], words: ' here ' })
    expect(stillDrawingSchema.parse(drawing)).toEqual({ aspect: 1.4, words: 'here', shapes: [arrow] })
  })
})

describe('refusedShape(sketch, next)', () => {
  it('says what stands against one shape or point too many, just where the document refuses it', () => {
    const arrow = spanned('arrow', [0.2, 0.2], [0.4, 0.5])!
    const full = {
      ...emptySketch(1),
      words: 'x',
      shapes: Array.from({ length: mostOnStill.shapes - 1 }, () => arrow),
    }
    expect(refusedShape(full, arrow)).toBeNull()
    expect(refusedShape({ ...full, shapes: [...full.shapes, arrow] }, arrow)).toMatch(/50 shapes/)
    const long = {
      shape: 'freehand' as const,
      points: Array.from({ length: mostOnStill.points - 2 }, (_, i): [number, number] => [i / 2000, 0.5]),
    }
    expect(refusedShape({ ...emptySketch(1), shapes: [arrow] }, long)).toBeNull()
    expect(refusedShape({ ...emptySketch(1), shapes: [arrow, arrow] }, long)).toMatch(/2000 points/)
  })
})
