import { crankTrainSchema, type CrankTrain } from './crank-train'
import b4 from './presets/b4-2000.json'
import b6 from './presets/b6-3400.json'
import i3 from './presets/i3-1000.json'
import i4 from './presets/i4-2000.json'
import i4x from './presets/i4x-1000.json'
import i5 from './presets/i5-2500.json'
import i6 from './presets/i6-3000.json'
import i6d from './presets/i6d-12800.json'
import m6 from './presets/m6-2t-520.json'
import p2 from './presets/p2-270-700.json'
import r7 from './presets/r7-11.json'
import single2t from './presets/single-125-2t.json'
import single from './presets/single-450.json'
import v10 from './presets/v10-72-5000.json'
import v12 from './presets/v12-60-6000.json'
import v2x45 from './presets/v2-45-1600.json'
import v2x90 from './presets/v2-90-1000.json'
import v6x60 from './presets/v6-60-3000.json'
import v6x90 from './presets/v6-90s-3200.json'
import v8f from './presets/v8f-4200.json'
import v8x from './presets/v8x-5000.json'

export const presetGroups = ['single', 'twin', 'in-line', 'V', 'flat', 'radial', 'two-stroke'] as const
export type PresetGroup = (typeof presetGroups)[number]

export interface Preset {
  id: string
  group: PresetGroup
  train: CrankTrain
}

const preset = (id: string, group: PresetGroup, json: unknown): Preset => ({
  id,
  group,
  train: crankTrainSchema.parse(json),
})

/** Invented engines to start from, in the order they are listed. */
export const presets: readonly Preset[] = [
  preset('single-450', 'single', single),
  preset('p2-270-700', 'twin', p2),
  preset('v2-45-1600', 'twin', v2x45),
  preset('v2-90-1000', 'twin', v2x90),
  preset('i3-1000', 'in-line', i3),
  preset('i4-2000', 'in-line', i4),
  preset('i4x-1000', 'in-line', i4x),
  preset('i5-2500', 'in-line', i5),
  preset('i6-3000', 'in-line', i6),
  preset('i6d-12800', 'in-line', i6d),
  preset('v6-60-3000', 'V', v6x60),
  preset('v6-90s-3200', 'V', v6x90),
  preset('v8x-5000', 'V', v8x),
  preset('v8f-4200', 'V', v8f),
  preset('v10-72-5000', 'V', v10),
  preset('v12-60-6000', 'V', v12),
  preset('b4-2000', 'flat', b4),
  preset('b6-3400', 'flat', b6),
  preset('r7-11', 'radial', r7),
  preset('single-125-2t', 'two-stroke', single2t),
  preset('m6-2t-520', 'two-stroke', m6),
]

export const presetById = (id: string): Preset | undefined => presets.find((each) => each.id === id)
