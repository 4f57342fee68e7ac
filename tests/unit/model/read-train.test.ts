import { describe, expect, it } from 'vitest'
import { readTrain, type Issue } from '@/scene/model/read-train'
import { changed, REMOVED } from './change'
import { trace } from './refusal'
import { firing, geometry, references } from './refusals-of-crank'
import { gas, shape } from './refusals-of-values'

const issuesOf = (json: unknown): Issue[] => {
  const read = readTrain(json)
  return read.ok ? [] : read.issues
}

describe('readTrain(json) refuses', () => {
  it.each([...geometry, ...references, ...firing, ...gas, ...shape])(
    '%s',
    (_, preset, changes, code, paths, says) => {
      const issues = issuesOf(changed(preset, changes)).filter((issue) => issue.code === code)
      expect(issues.map(({ path }) => path).toSorted()).toEqual(paths.toSorted())
      for (const { message, fix } of issues) {
        expect(message).toContain(says)
        expect(fix).toMatch(/^[A-Z].*\.$/)
      }
    },
  )

  it.each([[null], [[]], ['text'], [undefined], [7], [{}]])('%j, which is no document', (json) => {
    expect(issuesOf(json).length).toBeGreaterThan(0)
  })

  it('everything that is wrong at once, each field and code once', () => {
    const issues = issuesOf(
      changed('i4-2000', {
        'cylinderDefaults.rodLengthMm': 45,
        firingOrder: ['1', '3', '3', '2'],
        'gas.combustionStartDeg': 170,
        'operating.idleRpm': 9000,
      }),
    )
    const codes = new Set(issues.map(({ code }) => code))
    for (const code of [
      'rod-too-short',
      'firing-order-repeats',
      'heat-release-angles',
      'speeds-out-of-order',
    ])
      expect(codes).toContain(code)
    expect(new Set(issues.map(({ path, code }) => `${path} ${code}`)).size).toBe(issues.length)
  })

  it('two hundred bad entries with a hundred issues', () => {
    const mains = Array.from({ length: 200 }, () => ({ id: 7, axialMm: 0 }))
    expect(issuesOf(changed('i4-2000', { mains }))).toHaveLength(100)
  })

  it('an impossible order with orders that fit', () => {
    const [{ fix }] = issuesOf(changed('i4-2000', { firingOrder: ['1', '4', '3', '2'] }))
    expect(fix).toContain('1-3-4-2')
    expect(fix).toContain('1-2-4-3')
  })
})

describe('readTrain(json) accepts', () => {
  it.each<[string, string, Record<string, unknown>]>([
    [
      'no compression ratio where no heat is released',
      'i4-2000',
      { gas: { model: 'none' }, 'cylinderDefaults.compressionRatio': REMOVED },
    ],
    ['a stated angle half a degree off', 'v2-45-1600', { 'cylinders.0.firesAtDeg': 337.9 }],
    ['a trace of two points', 'i4-2000', trace([-360, 0])],
    ['combustion that starts before the intake closes', 'i4-2000', { 'gas.combustionStartDeg': -150 }],
    ['an empty balance: no counterweights, no mains', 'i4-2000', { counterweights: [], mains: [] }],
    ['mains in any order', 'i4-2000', { 'mains.0.axialMm': 999 }],
    ['a stroke of its own where the throw is its own', 'i4-2000', { 'cylinders.0.strokeMm': 80 }],
  ])('%s', (_, preset, changes) => {
    expect(issuesOf(changed(preset, changes))).toEqual([])
  })

  it('a document that states no more than it must', () => {
    const read = readTrain({
      format: 'crank-train/1',
      cycle: 'two-stroke',
      banks: [{ id: 'A', angleDeg: 0 }],
      throws: [{ id: '1', angleDeg: 0, axialMm: 0 }],
      cylinders: [
        {
          id: '1',
          bank: 'A',
          throw: '1',
          axialMm: 0,
          boreMm: 50,
          strokeMm: 50,
          rodLengthMm: 90,
          pistonKg: 0.1,
          rod: { massKg: 0.1, cgFromBigEndMm: 30 },
        },
      ],
      firingOrder: ['1'],
    })
    expect(read).toMatchObject({
      ok: true,
      document: { title: 'Untitled', rotation: 'clockwise', crankcasePressureBar: 1.01325 },
    })
  })
})
