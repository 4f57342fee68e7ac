import { fileURLToPath } from 'node:url'
import { defineConfig } from '@playwright/test'

const root = fileURLToPath(new URL('../..', import.meta.url))
const quiet = [
  '--no-sandbox',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--no-first-run',
  // no name leads out of this machine
  '--host-resolver-rules=MAP * ~NOTFOUND, EXCLUDE 127.0.0.1',
]

const browser = (...more: string[]) => ({
  launchOptions: { executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium', args: [...quiet, ...more] },
})
const withoutWebgl = browser('--disable-3d-apis')

// `name.spec.ts` runs with and without WebGL; `name.webgl.spec.ts`, `name.canvas.spec.ts` and `name.phone.spec.ts`
// run in that project alone.
const only = (name: string) => `**/*.${name}.spec.ts`

export default defineConfig({
  testDir: `${root}tests`,
  testMatch: [
    'e2e/**/*.spec.ts',
    'rendering/**/*.spec.ts',
    ...(process.env.BENCH ? ['bench/**/*.spec.ts'] : []),
  ],
  outputDir: `${root}test-results`,
  workers: 2,
  retries: 0,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: [['list']],
  use: {
    baseURL: process.env.BASE_URL ?? 'http://127.0.0.1:3000',
    viewport: { width: 1440, height: 900 },
    // an engine that runs all the time would take half the machine; tests of motion ask for it
    contextOptions: { reducedMotion: 'reduce' },
    // a trace of every page would cost as much as the tests; what failed is drawn and described anyway
    screenshot: 'only-on-failure',
  },
  projects: [
    { name: 'canvas', testIgnore: [only('webgl'), only('phone')], use: withoutWebgl },
    { name: 'webgl', testIgnore: [only('canvas'), only('phone')], use: browser() },
    {
      name: 'phone',
      testMatch: only('phone'),
      use: { ...withoutWebgl, viewport: { width: 360, height: 740 }, hasTouch: true, isMobile: true },
    },
  ],
})
