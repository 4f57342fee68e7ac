import { describe, expect, it } from 'vitest'
import { flattenRig } from '@/scene/canvas/raster/prepare'
import { boxMesh, rigOf } from '@/tests/support/drawing/small-rig'

describe('flattenRig(rig)', () => {
  const mesh = boxMesh(2, 3, 4, true)
  const flat = flattenRig(
    rigOf([{ mesh }, { mesh: boxMesh(1, 1, 1) }, { mesh: boxMesh(1, 1, 1), part: { body: 0 } }]),
  )

  it('counts vertices, faces and edges of every part, and a surface more for the paper', () => {
    expect(flat.partCount).toBe(3)
    expect(flat.vertexCount).toBe(3 * (mesh.positions.length / 3))
    expect(flat.faceCount).toBe(3 * 12)
    expect(flat.edgeCount).toBe(3 * 12)
    expect(flat.surfaceCount).toBe(1 + 3 * 6)
    expect(2 ** flat.surfaceBits).toBeGreaterThanOrEqual(flat.surfaceCount)
    expect(2 ** (flat.surfaceBits - 1)).toBeLessThan(flat.surfaceCount)
  })

  it('knows part, body and cut of each surface', () => {
    expect(flat.surfacePart[0]).toBe(-1)
    for (let s = 1; s < flat.surfaceCount; s++) expect(flat.surfacePart[s]).toBe(Math.floor((s - 1) / 6))
    expect([...flat.surfaceBody.subarray(13)]).toEqual(Array(6).fill(0))
    expect([...flat.surfaceCut].filter(Boolean)).toHaveLength(2)
    expect([...flat.partCut]).toEqual([1, 0, 0])
  })

  it('measures faces: areas add up to the box, offsets are its half sizes', () => {
    const faces = flat.meshFace[1]
    expect(flat.areas.subarray(0, faces).reduce((sum, area) => sum + area, 0)).toBeCloseTo(
      2 * (6 + 8 + 12),
      5,
    )
    expect(new Set([...flat.offsets.subarray(0, faces)].map((offset) => offset.toFixed(5)))).toEqual(
      new Set(['1.00000', '1.50000', '2.00000']),
    )
  })

  it('puts a bank where the firing points of its cylinders are', () => {
    const part = (bank: number, cylinder: number) => ({ mesh, part: { bank, cylinder } })
    const placed = flattenRig(rigOf([part(0, 0), part(1, 1), part(1, 2)], [[0, 3, 0], [4, 3, 1], [4, 3, 3]])) // prettier-ignore
    expect([...placed.banks.points]).toEqual([0, 3, 0, 4, 3, 2])
    expect(placed.banks.reach).toBeCloseTo((3 + 5 + 5) / 3, 9)
  })
})
