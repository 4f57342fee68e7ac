import { readdirSync, readFileSync } from 'node:fs'
import type { CrankTrainInput } from '@/scene/model/crank-train'

const folder = new URL('../../../scene/model/presets/', import.meta.url)

/** The presets as documents, straight from their files. */
export const presetIds = readdirSync(folder)
  .map((name) => name.replace(/\.json$/, ''))
  .sort()

export const preset = (id: string) =>
  JSON.parse(readFileSync(new URL(`${id}.json`, folder), 'utf8')) as CrankTrainInput

export const ratedRpm = (document: CrankTrainInput) => document.operating!.ratedRpm!

/**
 * A preset as balancing tables have it: every cylinder the first one's reciprocating mass and nothing else, no
 * counterweight, plain rods instead of link rods, no offset. `alone`: its first cylinder upright on its own.
 */
export function idealReciprocating(id: string, { alone = false } = {}): CrankTrainInput {
  const document = preset(id)
  const masses = document.masses!
  const { rod } = masses
  const rodLength = document.cylinderDefaults!.rodLengthMm!
  // the table's radial shares its one master rod's mass out evenly
  const small = id === 'r7-11' ? 0.36 : (rod!.massKg * rod!.cgFromBigEndMm) / rodLength
  const pistonKg = masses.pistonKg! + masses.pistonPinKg! + masses.ringsKg! + masses.locksKg! + small
  const cylinders = document.cylinders.map((c) => ({
    id: c.id,
    bank: c.bank,
    throw: c.throw,
    axialMm: c.axialMm,
  }))
  return {
    ...document,
    cylinderDefaults: { ...document.cylinderDefaults, offsetMm: 0 },
    masses: { pistonKg, rod: { massKg: 1e-12, cgFromBigEndMm: 1 } },
    banks: alone ? document.banks.map((b) => ({ ...b, angleDeg: 0 })) : document.banks,
    throws: document.throws.map((t) => ({ ...t, unbalanceKgMm: 0 })),
    cylinders: alone ? cylinders.slice(0, 1) : cylinders,
    counterweights: [],
    firingOrder: alone ? [cylinders[0].id] : document.firingOrder,
    collectors: [],
    gas: { model: 'none' },
  }
}
