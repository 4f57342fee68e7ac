import { expect, type Page } from '@playwright/test'
import { expectNoBarriers, expectNoSidewaysScroll } from './support/barriers'

/** Stands still at a known angle, typed into the flag of the strip. */
async function still(page: Page, angle: string) {
  const flag = page.getByLabel('Crank angle, degrees')
  await flag.fill(angle)
  await flag.blur()
}

/** The pages of the margin notes; the leaves have tabs of their own. */
export const notes = (page: Page) => page.getByRole('tablist', { name: 'Margin notes' })

/** The bench as a person finds it: fields by their names, the angle by what shows it. */
export const benchPage = (page: Page) => ({
  /** Opens it: standing at 0, running, or as whoever wants little motion finds it. */
  async open(query = '', how: 'still' | 'running' | 'found' = 'still') {
    if (how === 'running') await page.emulateMedia({ reducedMotion: 'no-preference' })
    await page.goto(`/bench${query}`)
    await expect(page.getByRole('heading', { name: 'Parts list' })).toBeVisible()
    if (how === 'still') await still(page, '0')
  },
  still: (angle = '0') => still(page, angle),
  field: (name: string) => page.getByRole('textbox', { name, exact: true }),
  async type(name: string, text: string) {
    const field = page.getByRole('textbox', { name, exact: true })
    await field.fill(text)
    await field.blur()
  },
  strip: page.getByRole('slider', { name: 'Crank angle' }),
  title: page.getByRole('textbox', { name: 'Title of the sheet' }),
  /** What was refused, said beside its field. */
  note: page.locator('.errnote'),
  picked: page.getByRole('region', { name: 'Picked part' }),
  drawing: page.getByRole('application', { name: 'Crank train, moving drawing' }),
  async preset(search: string) {
    await page.getByRole('button', { name: 'Presets…' }).click()
    await page.getByRole('searchbox').fill(search)
    await page.locator('.preset-list').getByRole('button').first().click()
  },
  /** Strip, flag and words are three writers of one angle. */
  async expectAngle(angle: string) {
    await expect(page.getByLabel('Crank angle, degrees')).toHaveValue(`${angle}°`)
    await expect(page.getByRole('slider', { name: 'Crank angle' })).toHaveAttribute('aria-valuenow', angle)
    await expect(page.locator('.words')).toContainText(`Crank ${angle}°`)
  },
  expectNoBarriers: (within?: string) => expectNoBarriers(page, within),
  expectNoSidewaysScroll: () => expectNoSidewaysScroll(page),
})
