import { describe, expect, it } from 'vitest'
import { fillViewProjection, namedCamera, project } from '@/scene/frame/camera'
import { buildPose, fillPose } from '@/scene/frame/pose'
import type { Frame, Rig } from '@/scene/frame/types'
import { presetById } from '@/scene/model/presets'
import { buildGhost, paintGhost } from '@/scene/stage/past-ghost'
import type { Pen } from '@/scene/stage/paint-arrow'
import type { Palette } from '@/scene/stage/palette'
import { built, presetRig } from '../frame/rigs'

const [width, height] = [800, 600]
const palette = { line: '#747a7c' } as Palette

const i4 = presetById('i4-2000')!.train
const newer = presetRig('i4-2000').rig
const older = built('shorter', {
  ...i4,
  cylinderDefaults: { ...i4.cylinderDefaults, strokeMm: i4.cylinderDefaults.strokeMm! - 6 },
}).rig

function frameOf(rig: Rig): Frame {
  const frame = {
    pose: buildPose(rig),
    viewProjection: new Float64Array(16),
    eye: new Float64Array(3),
    tint: new Float32Array(4),
    still: true,
  }
  fillViewProjection(
    frame.viewProjection,
    frame.eye,
    namedCamera('free', rig, width / height),
    width / height,
  )
  return frame
}

/** A pen that keeps what it was told. */
function recorder() {
  const points: [number, number][] = []
  const lines: number[] = []
  const dashes: number[][] = []
  const pen = {
    setLineDash: (dash: number[]) => dashes.push([...dash]),
    beginPath() {},
    moveTo(x: number, y: number) {
      lines.push(1)
      points.push([x, y])
    },
    lineTo(x: number, y: number) {
      lines[lines.length - 1]++
      points.push([x, y])
    },
    stroke() {},
  } as unknown as Pen
  return { pen, points, lines, dashes }
}

/** Where every vertex of a rig's parts is seen at an angle, found without the painter. */
function seenVertices(
  rig: Rig,
  ids: (id: string) => boolean,
  angle: number,
  frame: Frame,
): [number, number][] {
  const pose = fillPose(buildPose(rig), rig, angle)
  const out = new Float64Array(3)
  return rig.parts.flatMap(({ id, mesh }, i) => {
    if (!ids(id)) return []
    const { positions } = rig.meshes[mesh]
    const [cos, sin, dx, dy] = pose.slice(4 * i, 4 * i + 4)
    return Array.from({ length: positions.length / 3 }, (_, v): [number, number] => {
      const [x, y, z] = positions.slice(3 * v, 3 * v + 3)
      project(out, frame.viewProjection, cos * x - sin * y + dx, sin * x + cos * y + dy, z, width, height)
      return [out[0], out[1]]
    })
  })
}

const keyOf = ([x, y]: [number, number]) => `${x.toFixed(6)} ${y.toFixed(6)}`

describe('paintGhost(pen, ghost, angle, …)', () => {
  const ghost = buildGhost(older, newer)
  const frame = frameOf(newer)

  it.each([0, 0.7, 2.1, 4.4])('draws the older version where it stands at exactly %d rad', (angle) => {
    const { pen, points, dashes } = recorder()
    paintGhost(pen, ghost, angle, frame, palette, [], width, height)
    expect(points.length).toBeGreaterThan(200)
    const where = new Set(seenVertices(older, () => true, angle, frame).map(keyOf))
    expect(points.filter((point) => !where.has(keyOf(point)))).toEqual([])
    // a piston of the newer version stands elsewhere, so what is drawn is not that
    const now = new Set(seenVertices(newer, (id) => id === 'piston:1', angle, frame).map(keyOf))
    expect(points.some((point) => now.has(keyOf(point)))).toBe(false)
    // thin dash-dot, and the pen is given back whole
    expect(dashes[0]).toHaveLength(4)
    expect(dashes.at(-1)).toEqual([])
  })

  it('draws only parts that differ, none of a group that is hidden, and nothing over itself', () => {
    expect(ghost.parts.map(({ index }) => older.parts[index].id)).not.toContain('main-journal:1')
    const all = recorder()
    paintGhost(all.pen, ghost, 1, frame, palette, [], width, height)
    const fewer = recorder()
    paintGhost(fewer.pen, ghost, 1, frame, palette, ['pistons', 'rods'], width, height)
    expect(fewer.points.length).toBeLessThan(all.points.length)
    const pistons = new Set(seenVertices(older, (id) => id === 'piston:1', 1, frame).map(keyOf))
    expect(fewer.points.some((point) => pistons.has(keyOf(point)))).toBe(false)
    expect(buildGhost(newer, newer).parts).toEqual([])
  })

  it('follows an outline round its corners, so that its dashes run on', () => {
    const { pen, lines } = recorder()
    paintGhost(pen, ghost, 0.7, frame, palette, [], width, height)
    const mean = lines.reduce((sum, count) => sum + count, 0) / lines.length
    expect(mean).toBeGreaterThan(6)
  })
})
