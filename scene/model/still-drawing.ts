import { z } from 'zod'

/** What a drawing on the still picture may hold at most. */
export const mostOnStill = { shapes: 50, points: 2_000, words: 500 } as const

/** A place on the picture: from 0 at the left and the top to 1 at the right and the bottom. */
const share = z.number().min(0).max(1)
const placeSchema = z.tuple([share, share])

const span = { from: placeSchema, to: placeSchema }

/** Vectors in pencil over a still picture, and the words that say the same. */
export const stillDrawingSchema = z
  .object({
    /** Width of the picture through its height. */
    aspect: z.number().min(0.1).max(10),
    words: z.string().trim().min(1).max(mostOnStill.words),
    shapes: z
      .array(
        z.discriminatedUnion('shape', [
          z.object({ shape: z.literal('arrow'), ...span }),
          z.object({ shape: z.literal('box'), ...span }),
          z.object({
            shape: z.literal('freehand'),
            points: z.array(placeSchema).min(2).max(mostOnStill.points),
          }),
        ]),
      )
      .min(1)
      .max(mostOnStill.shapes),
  })
  .refine(
    ({ shapes }) =>
      shapes.reduce((sum, each) => sum + (each.shape === 'freehand' ? each.points.length : 2), 0) <=
      mostOnStill.points,
    {
      path: ['shapes'],
      message: `A drawing can have at most ${mostOnStill.points.toLocaleString('en')} points.`,
      params: { fix: 'Draw with fewer or simpler lines.' },
    },
  )

export type StillDrawing = z.output<typeof stillDrawingSchema>
