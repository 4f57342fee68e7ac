import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'

/** No barrier that a machine can see, of whatever weight; in one part of the page where only that has changed. */
export async function expectNoBarriers(page: Page, within?: string) {
  const axe = new AxeBuilder({ page }).options({ resultTypes: ['violations'] })
  await expectNone(within ? axe.include(within) : axe)
}

/** In the other theme, where nothing but the colours can be another. */
export const expectColoursApart = (page: Page) =>
  expectNone(new AxeBuilder({ page }).options({ resultTypes: ['violations'], runOnly: ['color-contrast'] }))

async function expectNone(axe: AxeBuilder) {
  const { violations } = await axe.analyze()
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.target).join(' ')}`)).toEqual(
    [],
  )
}

export async function expectNoSidewaysScroll(page: Page) {
  const wide = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
  expect(wide).toBeLessThanOrEqual(0)
}
