import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { saveScene } from './support/scenes'
import { expect, test } from './support/test'

const versionOf = async (page: Page, scene: string, number: number) => {
  const answer = await page.request.get(`/api/v1/scenes/${scene}/versions/${number}`)
  expect(answer.status()).toBe(200)
  return (await answer.json()).version
}

/** A version more of the scene, with this done to its train. */
async function saveAnother(page: Page, scene: string, message: string, change: (train: TrainText) => void) {
  const { scene: head, version } = await (await page.request.get(`/api/v1/scenes/${scene}`)).json()
  change(version.document.train)
  const saved = await page.request.post(`/api/v1/scenes/${scene}/versions`, {
    data: { base: head.headVersion, message, document: version.document },
    headers: { 'sec-fetch-site': 'same-origin' },
  })
  expect(saved.status(), await saved.text()).toBe(201)
}

interface TrainText {
  shape: Record<string, number>
  masses: Record<string, number>
}

const save = async (page: Page, words: string) => {
  await page.getByRole('button', { name: /^Save version \d$/ }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByRole('textbox').fill(words)
  await dialog.getByRole('button', { name: /^Save version \d$/ }).click()
}

test('two tabs save at once: both sets of changes are shown, what both changed is chosen, and nothing is lost', async ({
  page,
  person,
  context,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'v8x-5000')
  const [one, other] = [benchPage(page), await context.newPage()]
  const two = benchPage(other)
  await one.open(`?scene=${scene}`)
  await two.open(`?scene=${scene}`)
  await two.type('Piston pin', '110')
  await two.type('Rings', '30')
  await save(other, 'lighter pin')
  await expect(other.getByText('Version 2 saved.')).toBeVisible()

  await one.type('Counterweight radius', '90')
  await one.type('Piston pin', '115')
  await save(page, 'radius up')
  const dialog = page.getByRole('dialog', { name: 'Version 2 was saved in between' })
  const mine = dialog.getByRole('region', { name: 'Yours since version 1' })
  await expect(mine.getByRole('row', { name: /Counterweight radius/ })).toContainText('89.590.0mm')
  const theirs = dialog.getByRole('region', { name: 'Version 2 since version 1' })
  await expect(theirs.getByRole('row', { name: /Ring mass/ })).toContainText('28.030.0g')

  const both = dialog.getByRole('button', { name: 'Save both as version 3' })
  await expect(both).toBeDisabled()
  await expect(dialog.getByRole('status')).toHaveText(
    'held: 1 value was changed in both and none is chosen yet',
  )
  await one.expectNoBarriers('dialog')
  const pin = dialog.getByRole('group', { name: /Piston pin mass/ })
  await pin.getByRole('radio', { name: /^Version 2/ }).focus()
  await page.keyboard.press('Space')
  await both.click()
  await expect(page.getByText('Version 3 saved.')).toBeVisible()
  await expect(one.field('Rings')).toHaveValue('30.0')

  const { parent, message, document } = await versionOf(page, scene, 3)
  expect({ parent, message }).toEqual({ parent: 2, message: 'radius up' })
  expect(document.train.shape.counterweightRadiusMm).toBe(90)
  expect(document.train.masses).toMatchObject({ pistonPinKg: 0.11, ringsKg: 0.03 })
  const { versions } = await (await page.request.get(`/api/v1/scenes/${scene}/versions`)).json()
  expect(versions.map((version: { number: number }) => version.number)).toEqual([3, 2, 1])
})

test('after somebody saved in between, mine becomes a scene of its own and theirs stays as it is', async ({
  page,
  person,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'v8x-5000')
  const bench = benchPage(page)
  await bench.open(`?scene=${scene}`)
  await saveAnother(page, scene, 'Lighter pin', ({ masses }) => (masses.pistonPinKg = 0.11))
  await bench.type('Rings', '30')
  await save(page, 'heavier rings')
  const dialog = page.getByRole('dialog', { name: 'Version 2 was saved in between' })
  await expect(dialog.getByRole('button', { name: 'Save both as version 3' })).toBeEnabled()
  await dialog.getByRole('radio', { name: /^A scene of its own/ }).check()
  await dialog.getByRole('button', { name: 'Save as a scene of its own' }).click()
  await expect(page.getByText('Version 1 saved.')).toBeVisible()
  await expect(page).not.toHaveURL(new RegExp(scene))
  await expect(bench.field('Rings')).toHaveValue('30.0')
  const { scene: theirs, version } = await (await page.request.get(`/api/v1/scenes/${scene}`)).json()
  expect([theirs.headVersion, version.document.train.masses.ringsKg]).toEqual([2, 0.028])
})

test('the list compares any two versions with what follows, and restores one as a new version', async ({
  page,
  person,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'v8x-5000')
  await saveAnother(page, scene, 'Radius up', ({ shape }) => (shape.counterweightRadiusMm = 90.5))
  await saveAnother(page, scene, 'Lighter pin', ({ masses }) => (masses.pistonPinKg = 0.11))
  await page.goto(`/scenes/${scene}/versions`)
  const changes = page.getByRole('region', { name: 'What changed' })
  await expect(changes.getByRole('row', { name: /Piston pin mass/ })).toContainText('112.0110.0g')
  await page.getByRole('radio', { name: 'Compare from version 1' }).focus()
  await page.keyboard.press('Space')
  await expect(changes.getByRole('row', { name: /Counterweight radius/ })).toContainText('89.590.5mm')
  await expect(changes.getByRole('row', { name: 'Skirt to counterweight' })).toContainText('2.41.4mm')
  await expect(changes.getByText('below 1.5 mm')).toBeVisible()
  await benchPage(page).expectNoBarriers()
  await benchPage(page).expectNoSidewaysScroll()

  await page.getByRole('button', { name: 'Restore… version 1' }).click()
  const dialog = page.getByRole('dialog', { name: 'Restore version 1' })
  await dialog.getByRole('textbox').fill('the gap was too small')
  await dialog.getByRole('button', { name: 'Save version 4' }).click()
  await expect(page.getByRole('row', { name: /^.*Version 4/ })).toContainText(
    'Restored from version 1: the gap was too small',
  )
  expect((await versionOf(page, scene, 4)).document).toEqual((await versionOf(page, scene, 1)).document)

  await page.getByRole('link', { name: 'Bench with version 2' }).click()
  await expect(benchPage(page).field('Counterweight radius')).toHaveValue('90.5')
})

test('an older version is drawn as a ghost and side by side at one crank angle', async ({ page, person }) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'i4-2000', { angleDeg: 90 })
  await saveAnother(page, scene, 'Longer rod', (train) => {
    const { cylinderDefaults } = train as unknown as { cylinderDefaults: { rodLengthMm: number } }
    cylinderDefaults.rodLengthMm += 8
  })
  await page.goto(`/scenes/${scene}/review?version=2`)
  const changes = page.getByRole('region', { name: 'What changed' })
  await expect(changes.getByText(/^Drawn otherwise:/)).toContainText('4 pistons')
  await changes.getByRole('radio', { name: 'Ghost of 1' }).click()
  await expect(page.getByRole('application', { name: 'Version 2, moving drawing' })).toBeVisible()
  await changes.getByRole('radio', { name: 'Side by side' }).click()
  for (const number of [1, 2])
    await expect(page.getByRole('application', { name: `Version ${number}, moving drawing` })).toBeVisible()
  await page.getByRole('slider', { name: 'Crank angle' }).press('ArrowRight')
  await expect(page.getByRole('slider', { name: 'Crank angle' })).toHaveAttribute('aria-valuenow', '91.0')
})
