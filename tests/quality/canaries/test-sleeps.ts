// at: tests/e2e/canary.test.ts
// breaks: no-restricted-syntax, no-restricted-syntax
export const nap = async (page: { waitForTimeout(ms: number): Promise<void> }) => {
  await page.waitForTimeout(1000)
  await new Promise((resolve) => setTimeout(resolve, 1000))
}
