import { expect, still, test } from '../harness/harness'

const canvas = { preset: 'v2-90-1000', renderer: 'canvas' }

/** Lets the page have so many animation frames. */
const frames = (count: number) =>
  new Promise<void>((resolve) => {
    const next = (left: number) => (left === 0 ? resolve() : requestAnimationFrame(() => next(left - 1)))
    next(count)
  })

test('a stage on which nothing changes draws nothing', async ({ open }) => {
  const page = await open(canvas)
  const before = await page.evaluate(() => [window.harness.host.dataset.frames, window.harness.ticks.count])
  await page.evaluate(frames, 60)
  const after = await page.evaluate(() => [window.harness.host.dataset.frames, window.harness.ticks.count])
  expect(after).toEqual(before)
})

test('a stage asks for no animation frame while it sleeps', async ({ open }) => {
  const page = await open(canvas)
  const asked = await page.evaluate(async () => {
    const own = window.requestAnimationFrame.bind(window)
    let count = 0
    window.requestAnimationFrame = (callback) => {
      count++
      return own(callback)
    }
    await new Promise<void>((resolve) => own(() => own(() => own(() => resolve()))))
    return count
  })
  expect(asked).toBe(0)
})

test('play() draws angle after angle, pause() ends in one still picture of the angle where it stopped', async ({
  open,
}) => {
  const page = await open(canvas)
  await page.evaluate(() => {
    window.harness.clock.setRate(1)
    window.harness.clock.play()
  })
  await page.waitForFunction(() => window.harness.ticks.count > 10)
  await page.evaluate(() => window.harness.clock.pause())
  await still(page)
  const { angle, shown } = await page.evaluate(() => ({
    angle: (window.harness.clock.angle * 180) / Math.PI,
    shown: Number(window.harness.host.dataset.angle),
  }))
  expect(angle).toBeGreaterThan(0)
  expect(shown).toBeCloseTo(angle, 1)
})

test('keys work while the stage has the focus, and Tab leaves it', async ({ open }) => {
  const page = await open({
    ...canvas,
    look: JSON.stringify({ balloons: [{ number: 5, parts: ['piston:1'], state: 'plain' }] }),
  })
  const degrees = () => page.evaluate(() => (window.harness.clock.angle * 180) / Math.PI)
  await page.keyboard.press(']')
  expect(await degrees()).toBe(0)
  await page.locator('#host').focus()
  await page.keyboard.press(']')
  await page.keyboard.press('Shift+]')
  await page.keyboard.press('.')
  expect(await degrees()).toBeCloseTo(11.1, 9)
  await page.keyboard.press('ArrowRight')
  await page.keyboard.press('2')
  const cameras = await page.evaluate(() =>
    window.harness.events.filter(({ name }) => name === 'camera').map(({ value }) => value),
  )
  expect(cameras).toHaveLength(2)
  expect(cameras[1]).toMatchObject({ yaw: 0, pitch: 0 })
  await page.keyboard.press('Space')
  expect(await page.evaluate(() => window.harness.clock.playing)).toBe(true)
  await page.keyboard.press('Space')
  await page.keyboard.press('Tab')
  await expect(page.getByRole('button', { name: 'Number 5 of the parts list' })).toBeFocused()
  await page.keyboard.press('Enter')
  expect(await page.evaluate(() => window.harness.events.at(-1))).toEqual({ name: 'balloon', value: 5 })
  await page.keyboard.press('Tab')
  expect(await page.evaluate(() => window.harness.host.contains(document.activeElement))).toBe(false)
})

test('a drag orbits, Shift and a drag pans, the wheel zooms: each ends in one onCamera', async ({ open }) => {
  const page = await open(canvas)
  const cameras = () =>
    page.evaluate(() =>
      window.harness.events
        .filter(({ name }) => name === 'camera')
        .map(({ value }) => value as { yaw: number; distance: number; target: number[] }),
    )
  const drag = async () => {
    await page.mouse.move(450, 320)
    await page.mouse.down()
    await page.mouse.move(500, 330, { steps: 5 })
    await page.mouse.up()
  }
  await drag()
  await page.keyboard.down('Shift')
  await drag()
  await page.keyboard.up('Shift')
  await page.mouse.wheel(0, -240)
  await expect.poll(async () => (await cameras()).length).toBe(3)
  const [orbited, panned, zoomed] = await cameras()
  expect(panned.yaw).toBe(orbited.yaw)
  expect(panned.target).not.toEqual(orbited.target)
  expect(zoomed.distance).toBeLessThan(panned.distance)
})

test('two panes and the stage show one clock, and only one is told its part by the pointer', async ({
  open,
}) => {
  const page = await open(canvas)
  await page.evaluate(() => {
    for (const name of ['end', 'side'] as const) {
      const pane = document.createElement('div')
      pane.id = name
      document.querySelector('#panes')?.append(pane)
      window.harness.mount(pane, name)
    }
  })
  await still(page, '#end')
  await still(page, '#side')
  await page.evaluate(() => window.harness.clock.setAngle(1))
  await expect
    .poll(() =>
      page.evaluate(() => ['host', 'end', 'side'].map((id) => document.getElementById(id)?.dataset.angle)),
    )
    .toEqual(['57.30', '57.30', '57.30'])
  expect(await page.locator('#end').getAttribute('data-renderer')).toBe('canvas')
  expect(await page.locator('#end').getAttribute('role')).toBe('img')
  const events = await page.evaluate(() => window.harness.events.length)
  const box = await page.locator('#end').boundingBox()
  if (!box) throw new Error('the pane has no box')
  await page.mouse.click(box.x + box.width / 2, box.y + box.height / 2)
  expect(await page.evaluate(() => window.harness.events.length)).toBe(events)
})

test('a picked part is the one that is drawn there', async ({ open }) => {
  const page = await open({ ...canvas, view: 'side' })
  await page.mouse.click(450, 320)
  const { value } = await page.evaluate(() => window.harness.events.filter(({ name }) => name === 'pick')[0])
  expect(value).toEqual(expect.stringMatching(/^[a-z-]+(:.+)?$/))
  await page.mouse.click(5, 635)
  const picks = await page.evaluate(() => window.harness.events.filter(({ name }) => name === 'pick'))
  expect(picks).toHaveLength(2)
  expect(picks[1].value).toBeNull()
})

test('a hundred stages that came and went leave nothing behind', async ({ open }) => {
  const page = await open(canvas)
  const left = await page.evaluate(async () => {
    const { harness } = window
    const pane = document.createElement('div')
    document.querySelector('#panes')?.append(pane)
    for (let i = 0; i < 100; i++) {
      const stage = harness.mount(pane)
      if (i % 10 === 0) await new Promise((resolve) => requestAnimationFrame(resolve))
      stage.dispose()
    }
    return {
      children: pane.childElementCount,
      attributes: pane.getAttributeNames(),
      canvases: document.querySelectorAll('canvas').length,
    }
  })
  expect(left).toEqual({ children: 0, attributes: [], canvases: 2 })
})

test('a stage moves before its details are there, says so once, and takes them on while it runs', async ({
  open,
}) => {
  const page = await open({ ...canvas, bare: '', look: JSON.stringify({ overlays: { labels: true } }) })
  const labels = page.locator('.stage-label:visible')
  const marks = () => page.evaluate(() => performance.getEntriesByName('moving').length)
  const shown = () => page.locator('#host').getAttribute('data-angle')
  expect(await marks()).toBe(0)
  expect(await page.evaluate(() => window.harness.events.filter(({ name }) => name === 'seen').length)).toBe(
    1,
  )
  await page.evaluate(() => {
    window.harness.clock.setRate(1)
    window.harness.clock.play()
  })
  await expect.poll(shown).not.toBe('0.00')
  expect(await marks()).toBe(1)
  await expect(labels).toHaveCount(0)
  expect(await page.evaluate(() => window.harness.ticks.count)).toBe(0)

  await page.evaluate(() => window.harness.enrich())
  await expect(labels.first()).toBeVisible()
  await page.evaluate(() => window.harness.clock.pause())
  await still(page)
  await page.locator('#host').focus()
  const angle = () => page.evaluate(() => window.harness.clock.angle)
  const before = await angle()
  await page.keyboard.press(']')
  expect((await angle()) - before).toBeCloseTo(Math.PI / 180, 9)
  expect(await page.evaluate(() => window.harness.ticks.count)).toBeGreaterThan(0)
})
