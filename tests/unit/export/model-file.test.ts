import { WebIO } from '@gltf-transform/core'
import { validateBytes } from 'gltf-validator'
import { describe, expect, it } from 'vitest'
import { modelFile, type ModelForm } from '@/lib/export/model-file'
import { buildRig } from '@/scene/frame/build-rig'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { presets } from '@/scene/model/presets'
import type { CrankTrain } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'

const colours = { part: 0xe9e5d9, metal: 0xfbfaf6, ink: 0x20262b }
const rigOf = (document: CrankTrain) => buildRig(document, toTrain(document))
const fileOf = (document: CrankTrain, angle: number, form: ModelForm = 'glb') =>
  modelFile(
    {
      rig: rigOf(document),
      angle,
      title: document.title,
      colours,
      stamp: { scene: 'a', version: 3, method: 'm' },
    },
    form,
  )
const opposite = (document: CrankTrain): CrankTrain => ({
  ...document,
  rotation: document.rotation === 'clockwise' ? 'counterclockwise' : 'clockwise',
})
const angle = 0.7

/** Column-major 4×4 × point. */
const moved = (m: ArrayLike<number>, [x, y, z]: number[]) =>
  [0, 1, 2].map((k) => m[k] * x + m[4 + k] * y + m[8 + k] * z + m[12 + k])

describe('modelFile', () => {
  it.each(
    presets.flatMap(({ id, train }) => [
      [id, train] as const,
      [`${id} the other way`, opposite(train)] as const,
    ]),
  )('modelFile(%s) has no error and no warning before the validator of the format', async (_, document) => {
    const report = await validateBytes(await fileOf(document, angle), { maxIssues: 10 })
    expect(report.issues.messages.filter(({ severity }) => severity < 2)).toEqual([])
    expect(report.issues).toMatchObject({ numErrors: 0, numWarnings: 0 })
    expect(report.info.totalTriangleCount).toBeGreaterThan(500)
  })

  it('modelFile(…, gltf) is the same model as JSON alone', async () => {
    const bytes = await fileOf(presets[0].train, angle, 'gltf')
    const report = await validateBytes(bytes, { format: 'gltf' })
    expect(report.issues).toMatchObject({ numErrors: 0, numWarnings: 0 })
    const binary = await validateBytes(await fileOf(presets[0].train, angle))
    expect(report.info.totalVertexCount).toBe(binary.info.totalVertexCount)
  })

  it.each([
    ['v8x-5000', false],
    ['v8x-5000', true],
    ['r7-11', true],
    ['b4-2000', false],
  ])('every part of %s (mirrored: %s) stands where its pose puts it', async (id, mirrored) => {
    const preset = presets.find((each) => each.id === id)!.train
    const document = mirrored ? opposite(preset) : preset
    const rig = rigOf(document)
    const pose = fillPose(buildPose(rig), rig, angle)
    const model = await new WebIO().readBinary(await fileOf(document, angle))
    const nodes = new Map(
      model
        .getRoot()
        .listNodes()
        .map((node) => [node.getName(), node]),
    )
    for (const [index, part] of rig.parts.entries()) {
      const node = nodes.get(part.id)!
      const matrix = node.getWorldMatrix()
      const [cos, sin, x, y] = pose.subarray(4 * index)
      const point = Array.from(rig.meshes[part.mesh].positions.subarray(0, 3))
      const wanted = [cos * point[0] - sin * point[1] + x, sin * point[0] + cos * point[1] + y, point[2]]
      moved(matrix, point).forEach((at, k) => expect(at).toBeCloseTo(wanted[k], 7))
      expect(node.getExtras()).toMatchObject({ words: part.label })
      const [first] = node.getMesh()!.listPrimitives()
      const { box } = rig.meshes[part.mesh]
      first
        .getAttribute('POSITION')!
        .getMin([])
        .forEach((least, k) => expect(least).toBeCloseTo(box[k], 7))
    }
  })

  it.each([false, true])(
    'faces look outwards (mirrored: %s): every closed part holds a positive volume',
    async (mirrored) => {
      const preset = presets.find(({ id }) => id === 'i4-2000')!.train
      const model = await new WebIO().readBinary(await fileOf(mirrored ? opposite(preset) : preset, angle))
      for (const node of model.getRoot().listNodes()) {
        const mesh = node.getMesh()
        if (!mesh) continue
        expect(determinant(node.getWorldMatrix())).toBeCloseTo(1, 9)
        let volume = 0
        for (const primitive of mesh.listPrimitives().filter((each) => each.getMode() === 4)) {
          const places = primitive.getAttribute('POSITION')!
          const indices = primitive.getIndices()!
          for (let at = 0; at < indices.getCount(); at += 3)
            volume += signedVolume([0, 1, 2].map((k) => places.getElement(indices.getScalar(at + k), [])))
        }
        expect(volume, node.getName()).toBeGreaterThan(0)
      }
    },
  )

  it('a clockwise engine turns its first pin to −x in the first quarter turn, another to +x; the drive end is at +z', async () => {
    const preset = presets.find(({ id }) => id === 'i4-2000')!.train
    const pinX = async (document: CrankTrain) => {
      const model = await new WebIO().readBinary(
        await fileOf(document, Math.PI / 2 - document.throws[0].angleDeg * (Math.PI / 180)),
      )
      const rod = model
        .getRoot()
        .listNodes()
        .find((node) => node.getName().startsWith('rod:'))!
      return rod.getTranslation()[0]
    }
    expect(await pinX({ ...preset, rotation: 'clockwise' })).toBeCloseTo(-0.0438, 4)
    expect(await pinX({ ...preset, rotation: 'counterclockwise' })).toBeCloseTo(0.0438, 4)
  })

  it('says where it comes from', async () => {
    const model = await new WebIO().readBinary(await fileOf(presets[0].train, angle))
    const [scene] = model.getRoot().listScenes()
    expect(scene.getName()).toBe(presets[0].train.title)
    expect(scene.getExtras()).toEqual({
      scene: 'a',
      version: 3,
      method: 'm',
      units: 'm',
      up: 'y',
      crankAngleDeg: (angle * 180) / Math.PI,
    })
  })
})

const determinant = (m: ArrayLike<number>) =>
  m[0] * (m[5] * m[10] - m[9] * m[6]) -
  m[4] * (m[1] * m[10] - m[9] * m[2]) +
  m[8] * (m[1] * m[6] - m[5] * m[2])

const signedVolume = ([a, b, c]: number[][]) =>
  (a[0] * (b[1] * c[2] - b[2] * c[1]) -
    a[1] * (b[0] * c[2] - b[2] * c[0]) +
    a[2] * (b[0] * c[1] - b[1] * c[0])) /
  6
