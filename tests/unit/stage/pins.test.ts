// @vitest-environment happy-dom
import { beforeAll, describe, expect, it } from 'vitest'
import { fillViewProjection, namedCamera, project } from '@/scene/frame/camera'
import { fillPinned, middleOfPart } from '@/scene/frame/pins'
import { createPicture, fillVisibility, turnPicture } from '@/scene/stage/picture'
import { createPinLayer, type Pin } from '@/scene/stage/pins'
import type { Hold, StageLook } from '@/scene/stage/types'
import { defaultView } from '@/scene/model/default-scene'
import { presetRig } from '../frame/rigs'

const size = { width: 900, height: 640, ratio: 1 }

/** A pen that draws nothing. */
const pen = new Proxy({} as CanvasRenderingContext2D, {
  get: () => () => undefined,
  set: () => true,
})

beforeAll(() => {
  HTMLCanvasElement.prototype.getContext = (() => pen) as never
})

const { rig, document: train } = presetRig('v8x-5000')

function standing(pins: Pin[]) {
  const host = document.createElement('div')
  const camera = namedCamera('free', rig, size.width / size.height)
  const palette = { pencil: '#7A4CC0', paper: '#F5F2EA' }
  const told: number[] = []
  const hold = {
    host,
    eye: { camera },
    sheet: size,
    palette,
    touch: () => {},
    wake: () => {},
  } as unknown as Hold
  const layer = createPinLayer()
  layer.listen((number) => told.push(number))
  layer.set(pins)
  const details = layer.details(hold, null)
  const picture = createPicture({ rig })
  const look = {
    ...{ hidden: [], ghost: [], lit: [], balloons: [] },
    forceUnit: 'N',
    overlays: defaultView(train).overlays,
  } as StageLook
  const draw = (angle: number, still: boolean, shown = look) => {
    turnPicture(picture, angle)
    fillVisibility(picture, shown)
    fillViewProjection(picture.frame.viewProjection, picture.frame.eye, camera, size.width / size.height)
    details.stand(picture, shown)
    details.finish(still)
  }
  const flags = () => [...host.querySelectorAll<HTMLButtonElement>('.stage-pin')]
  return { layer, picture, look, draw, flags, told }
}

const pinOn = (number: number, part: string, point?: [number, number, number]): Pin => ({
  ...{ number, part, form: 'filled', on: false, label: `Note ${number}` },
  point:
    point ??
    middleOfPart(
      rig,
      rig.parts.findIndex(({ id }) => id === part),
    ),
})

const journal = rig.parts.find(({ kind }) => kind === 'main-journal')!.id
const shownAt = (flag: HTMLElement) => (flag.dataset.at ?? '').split(' ').map(Number)

describe('createPinLayer()', () => {
  it('follows its part within a hundredth of a pixel wherever the crank stands', () => {
    const { picture, draw, flags } = standing([pinOn(1, 'piston:3')])
    const part = rig.parts.findIndex(({ id }) => id === 'piston:3')
    for (const angle of [0, 0.7, 2.5, 4.4, 6.9, 9.1, 12.5]) {
      draw(angle, true)
      const world = fillPinned(new Float64Array(3), picture.pose, part, ...middleOfPart(rig, part))
      const spot = new Float64Array(3)
      project(spot, picture.frame.viewProjection, world[0], world[1], world[2], size.width, size.height)
      const [x, y] = shownAt(flags()[0])
      expect(x).toBeCloseTo(spot[0], 1)
      expect(y).toBeCloseTo(spot[1], 1)
    }
  })

  it('tells which flag was pressed, and takes the flag away with a hidden part', () => {
    const { draw, flags, told, look } = standing([pinOn(4, 'piston:3'), pinOn(5, journal)])
    draw(0, true)
    expect(flags().map(({ textContent }) => textContent)).toEqual(['4', '5'])
    flags()[1].click()
    expect(told).toEqual([5])
    draw(0, true, { ...look, hidden: ['pistons'] })
    expect(flags().map(({ textContent }) => textContent)).toEqual(['5'])
  })

  it('meets the part under a place of the sheet, at the point that is pinned there', () => {
    const { layer, draw, flags } = standing([])
    draw(1, true)
    const met = layer.pick(size.width / 2, size.height / 2)
    expect(met).not.toBeNull()
    layer.set([pinOn(1, met!.part, met!.point)])
    draw(1, true)
    const [x, y] = shownAt(flags()[0])
    expect(Math.hypot(x - size.width / 2, y - size.height / 2)).toBeLessThan(0.05)
    expect(layer.pick(1, 1)).toBeNull()
  })

  it('gives two hundred pins as many flags as have room, those first that come first', () => {
    const ids = rig.parts.map(({ id }) => id)
    const { draw, flags } = standing(
      Array.from({ length: 200 }, (_, i) => pinOn(i + 1, ids[(7 * i) % ids.length])),
    )
    draw(0, true)
    expect(flags().length).toBeGreaterThan(20)
    expect(flags().length).toBeLessThan(60)
    expect(flags()[0].textContent).toBe('1')
    const began = performance.now()
    for (let i = 1; i <= 100; i++) draw(i * 0.05, false)
    const each = (performance.now() - began) / 100
    console.log(`200 pins: ${each.toFixed(2)} ms a moving frame, painting apart`)
  })
})
