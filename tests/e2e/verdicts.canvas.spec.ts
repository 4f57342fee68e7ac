import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { saveScene } from './support/scenes'
import { expect, test } from './support/test'

async function send(page: Page, method: string, path: string, data?: object) {
  const headers = { 'sec-fetch-site': 'same-origin' }
  const answer = await page.request.fetch(`/api/v1/${path}`, { method, data, headers })
  expect(answer.ok(), await answer.text()).toBe(true)
  return answer.status() === 204 ? null : answer.json()
}

/** An error pinned to the first piston of version 1. */
async function pinError(page: Page, scene: string) {
  const { version } = await send(page, 'GET', `scenes/${scene}`)
  const { overlays } = version.document.view
  const camera = { yawDeg: 35, pitchDeg: 12, distanceMm: 2400, targetMm: [0, 40, 10] }
  const anchor = {
    ...{ version: 1, partId: 'piston:1', pointMm: [0, 0, 0], angleDeg: 90, playing: false, speedRpm: 3000 },
    ...{ camera, view: null, hidden: [], ghost: [], overlays, sectionAxialMm: null, units: 'si' },
  }
  const words = 'The skirt stands 1.4 mm off, and we hold 1.5.'
  await send(page, 'POST', `scenes/${scene}/notes`, { kind: 'error', heading: 'Skirt', words, anchor })
}

/** A version in review by whoever is signed in on the page, who is alone in their workshop. */
async function inReview(page: Page, scene: string) {
  const { review } = await send(page, 'GET', `scenes/${scene}/versions/1/review`)
  await send(page, 'POST', `scenes/${scene}/versions/1/review`, {
    ...{ reviewers: [review.judges[0].id], due: '2999-12-31', message: 'Mind the skirt.' },
    checklist: ['Gap', 'Units'],
  })
}

test('ask, answer the checklist, held by an open error, settled, approved, and changed since', async ({
  page,
  person,
}) => {
  const scene = await saveScene(page, 'single-450')
  await pinError(page, scene)
  await page.goto(`/scenes/${scene}/review?version=1`)
  const block = page.getByRole('region', { name: 'Title block' })
  const bar = page.getByRole('region', { name: 'Your verdict' })
  await block.getByRole('button', { name: 'Ask for review…' }).click()
  const ask = page.getByRole('dialog')
  await expect(ask.getByRole('checkbox', { name: person.name })).toBeChecked()
  await ask.getByLabel(/^Checklist/).fill('Gap\nUnits')
  await ask.getByRole('button', { name: 'Ask for review' }).click()
  await expect(block).toContainText('In review')

  await expect(bar.getByRole('radio', { name: /^Approve held: note 1 is an open error/ })).toBeDisabled()
  await bar.getByRole('button', { name: 'Checklist, 2 to go…' }).click()
  const checklist = page.getByRole('dialog', { name: 'Checklist' })
  for (const item of ['Gap', 'Units']) {
    // by keyboard: the first answer of the group, then the next but one
    await checklist.getByRole('group', { name: item }).getByRole('radio', { name: 'Yes' }).focus()
    await page.keyboard.press('Space')
  }
  await checklist.getByRole('button', { name: 'Keep answers' }).click()
  await expect(block.getByRole('button', { name: '2 of 2 answered' })).toBeVisible()

  const settlement = { reason: 'will-not-change' }
  await send(page, 'POST', `scenes/${scene}/notes/1/settle`, { settlement, words: 'It is measured cold.' })
  await page.reload()
  await bar.getByRole('radio', { name: /^Approve freezes/ }).check()
  await bar.getByRole('button', { name: 'Give verdict' }).click()
  await expect(block).toContainText('Approved')
  await expect(page.locator('.stamp')).toContainText(`version 1, ${person.name}`)

  const { version } = await send(page, 'GET', `scenes/${scene}`)
  version.document.view.angleDeg = 30
  await send(page, 'POST', `scenes/${scene}/versions`, { base: 1, document: version.document })
  await page.goto(`/scenes/${scene}/review?version=2`)
  await expect(block).toContainText('changed since version 1')
})

test('a word without a sentence is refused where it is missing, and what was typed stays', async ({
  page,
  person,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'single-450')
  await inReview(page, scene)
  await page.goto(`/scenes/${scene}/review?version=1`)
  const bar = page.getByRole('region', { name: 'Your verdict' })
  await bar.getByRole('radio', { name: /^Ask for changes/ }).check()
  await bar.getByRole('button', { name: 'Give verdict' }).click()
  await expect(bar.getByRole('alert')).toContainText('Say in a sentence')
  const sentence = bar.getByLabel('In a sentence')
  await expect(sentence).toBeFocused()
  await page.keyboard.type('Gap first.')
  await page.keyboard.press('Enter')
  await expect(page.getByRole('region', { name: 'Title block' })).toContainText('Changes asked for')
  await expect(bar.getByRole('listitem').first()).toContainText('“Gap first.”')
})

test('the list of reviews shows what waits, and neither it nor the dialogs have barriers', async ({
  page,
  person,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'single-450')
  await inReview(page, scene)
  await page.goto('/review')
  await expect(page.getByRole('row').filter({ hasText: 'Mind the skirt.' })).toContainText('In review')
  const sheet = benchPage(page)
  await sheet.expectNoBarriers()
  await sheet.expectNoSidewaysScroll()
  await page.getByRole('link', { name: /450/ }).click()
  await page.getByRole('button', { name: '0 of 2 answered' }).click()
  await sheet.expectNoBarriers('dialog')
  await page.keyboard.press('Escape')
  await page.getByRole('button', { name: 'Evidence…' }).click()
  await expect(page.getByRole('dialog')).toContainText(/first .+, last/)
  await sheet.expectNoBarriers('dialog')
  await page.keyboard.press('Escape')
  await sheet.expectNoBarriers('.verdict')
})
