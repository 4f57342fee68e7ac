import { z } from 'zod'
import { themeSchema } from './common'
import { operation } from './operation'
import { printedFields } from './printed'

export const modelOf = operation({
  id: 'modelOf',
  method: 'POST',
  path: '/api/v1/models',
  summary:
    'The parts of a crank train at an angle as glTF 2.0: metres, y up, z from the free end to the drive end',
  for: 'anyone',
  limit: 'printing',
  body: z.object({
    ...printedFields,
    /** `gltf` is answered as model/gltf+json, with its buffer within. */
    form: z.enum(['glb', 'gltf']).default('glb'),
  }),
  status: 200,
  media: 'model/gltf-binary',
})

export const pictureOf = operation({
  id: 'pictureOf',
  method: 'POST',
  path: '/api/v1/pictures',
  summary: 'A crank train in ink at an angle and a view, as PNG',
  for: 'anyone',
  limit: 'printing',
  body: z.object({
    ...printedFields,
    width: z.int().min(64).max(2400).default(1600),
    height: z.int().min(64).max(2400).default(1000),
    /** `print` is black on white. */
    theme: z.enum([...themeSchema.options, 'print']).default('print'),
  }),
  status: 200,
  media: 'image/png',
})

export const modelOperations = [modelOf, pictureOf]
