import type { Train } from '@/lib/mechanics/train'
import type { CrankTrainInput } from '@/scene/model/crank-train'
import { presets } from '@/scene/model/presets'
import { readTrain } from '@/scene/model/read-train'

export const RPM = (2 * Math.PI) / 60
export const DEG = Math.PI / 180

/** The train of a document that must be good. */
export function trainOf(json: unknown): Train {
  const read = readTrain(json)
  if (!read.ok) throw new Error(read.issues.map(({ path, message }) => `${path}: ${message}`).join('\n'))
  return read.train
}

export const presetDocument = (id: string) => {
  const preset = presets.find((one) => one.id === id)
  if (!preset) throw new Error(`no preset ${id}`)
  return structuredClone(preset.train)
}

export const presetTrain = (id: string): Train => trainOf(presetDocument(id))

/** A small four-stroke in-line engine with pins at the given angles, 100 mm apart. */
export function inline(pinsDeg: readonly number[], more: Partial<CrankTrainInput> = {}): CrankTrainInput {
  return {
    format: 'crank-train/1',
    cycle: 'four-stroke',
    cylinderDefaults: { boreMm: 80, strokeMm: 80, rodLengthMm: 140, compressionRatio: 10 },
    masses: { pistonKg: 0.4, rod: { massKg: 0.6, cgFromBigEndMm: 42 } },
    banks: [{ id: 'A', angleDeg: 0 }],
    throws: pinsDeg.map((angleDeg, index) => ({ id: `${index + 1}`, angleDeg, axialMm: 100 * index })),
    cylinders: pinsDeg.map((_, index) => ({
      id: `${index + 1}`,
      bank: 'A',
      throw: `${index + 1}`,
      axialMm: 100 * index,
    })),
    mains: [...pinsDeg, 0].map((_, index) => ({ id: `M${index + 1}`, axialMm: 100 * index - 50 })),
    firingOrder: pinsDeg.map((_, index) => `${index + 1}`),
    ...more,
  }
}
