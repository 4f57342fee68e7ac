import { existsSync, mkdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { ensureBuild, nextEnvironment, nextProgram } from '../db/server/build.mjs'
import { serverPrograms } from '../db/server/binaries.mjs'
import { beganAt, freePort, run, startGroup, until } from '../db/server/processes.mjs'
import { runCanaries } from './quality/canaries.mjs'
import { ensureChromium } from './support/chromium.mjs'
import { startRoundRobin } from './support/round-robin.mjs'

const distDir = '.next-test'
const pass = { passed: 1, failed: 0 }
const environment = nextEnvironment(distDir, { DATABASE_URL: '', PORT: '', CI: '' })
const tool = (name) => join('node_modules/.bin', name)

/** A gate is one check: every command must end well. */
const gate =
  (...commands) =>
  async ({ root, stdio }) => {
    for (const [program, ...args] of commands)
      await run(program, args, { cwd: root, env: environment, stdio })
    return pass
  }

/** A command that may fail; its report file says how much. */
async function reported(report, command, args, options, count) {
  const { code } = await startGroup(command, args, options).ended
  if (!existsSync(report)) return { passed: 0, failed: 1 }
  const counts = count(JSON.parse(readFileSync(report, 'utf8')))
  // ended badly although no test failed: something around them did
  return code !== 0 && counts.failed === 0 ? { ...counts, failed: 1 } : counts
}

function countVitest({ testResults }) {
  const tests = testResults.flatMap(({ assertionResults }) => assertionResults)
  const passed = tests.filter(({ status }) => status === 'passed').length
  const brokenFiles = testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.length,
  )
  return { passed, failed: tests.length - passed + brokenFiles.length }
}

/** Vitest's tests of these projects; skipped ones count as failed, and so does having none. */
const vitest =
  (...projects) =>
  ({ root, folder, filters, stdio }) => {
    const report = join(folder, `${projects.join('-')}.json`)
    const args = [
      'run',
      '-c',
      'tests/quality/vitest.config.ts',
      ...projects.flatMap((name) => ['--project', name]),
    ]
    args.push('--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...filters)
    return reported(report, tool('vitest'), args, { cwd: root, env: environment, stdio }, countVitest)
  }

const healthy = (address) =>
  fetch(`${address}/api/v1/health`).then(
    ({ ok }) => ok,
    () => false,
  )

/**
 * The program as people start it, with data of its own: two web servers, whose turn it is one after the other whatever is
 * asked, and two workers. `stop()` tells whether it went cleanly and whether both servers had something to do.
 */
async function startProgram({ root, folder, stdio }) {
  const ports = [await freePort(), await freePort()]
  const servers = ports.map((port) => `http://127.0.0.1:${port}`)
  const { address, counts, stop } = await startRoundRobin(servers)
  const dataFolder = join(folder, 'data')
  mkdirSync(dataFolder)
  const env = {
    ...environment,
    PORT: ports.join(),
    WORKERS: '2',
    COUNTERTHROW_ORIGIN: address,
    COUNTERTHROW_DATA: dataFolder,
    RATE_LIMIT: 'off',
  }
  const program = startGroup(process.execPath, ['db/server/start.mjs'], { cwd: root, env, stdio })
  const up = await until(
    async () =>
      beganAt(program.pid) === null || (await Promise.all(servers.map(healthy))).every((answer) => answer),
    300_000,
    200,
  )
  if (!up || beganAt(program.pid) === null) throw new Error('The program did not start; see above.')
  const running = JSON.parse(readFileSync(join(dataFolder, 'running.json'), 'utf8'))
  return {
    address,
    async stop() {
      await program.stop()
      stop()
      const { code } = await program.ended
      const busy = counts.every((count) => count > 0)
      return code === 0 && busy && running.length === 5 && running.every(({ pid }) => beganAt(pid) === null)
    },
  }
}

const countPlaywright = ({ stats, errors }) => ({
  passed: stats.expected,
  failed: stats.unexpected + stats.flaky + stats.skipped + errors.length,
})

/** Playwright's tests against the real program, in Debian's browser, with WebGL and without. */
async function e2e({ root, folder, filters, stdio }, settings = {}) {
  const chromium = await ensureChromium()
  await ensureBuild(root, distDir)
  const program = await startProgram({ root, folder, stdio })
  const report = join(folder, 'playwright.json')
  const env = {
    ...environment,
    CHROMIUM: chromium,
    BASE_URL: program.address,
    PLAYWRIGHT_JSON_OUTPUT_NAME: report,
    ...settings,
  }
  const args = ['test', '-c', 'tests/quality/playwright.config.ts', '--reporter=list,json', ...filters]
  const counts = await reported(report, tool('playwright'), args, { cwd: root, env, stdio }, countPlaywright)
  const clean = await program.stop()
  if (!clean) console.error('The program did not stop cleanly.')
  return clean ? { ...counts, passed: counts.passed + 1 } : { ...counts, failed: counts.failed + 1 }
}

/** Code and prose; style sheets keep the look's own way of one rule a line, data stays as it was published. */
const formatted = [
  '{app,components,db,lib,scene,tests}/**/*.{ts,tsx,mts,mjs}',
  '*.{ts,mjs,md}',
  '!next-env.d.ts',
]

export const stages = {
  format: gate([
    ...[tool('prettier'), '--check', '--log-level', 'warn', '--config', 'tests/quality/prettier.json'],
    ...formatted,
  ]),
  lint: gate([tool('eslint'), '-c', 'tests/quality/eslint.config.mjs', '--max-warnings', '0', '.']),
  canaries: async () => {
    const results = await runCanaries()
    const failed = results.filter((result) => !result.passed).length
    return { passed: results.length - failed, failed }
  },
  cycles: gate([
    ...[tool('depcruise'), '--config', 'tests/quality/depcruise.config.mjs'],
    ...['app', 'components', 'scene', 'lib', 'db', 'tests/support', 'tests/e2e'],
  ]),
  types: gate(
    [process.execPath, nextProgram('.'), 'typegen'],
    [tool('tsc'), '--noEmit', '-p', 'tests/quality/tsconfig.next.json'],
  ),
  'pure-types': gate([tool('tsc'), '--noEmit', '-p', 'tests/quality/tsconfig.pure.json']),
  unit: vitest('unit', 'alone'),
  golden: vitest('golden'),
  rendering: vitest('rendering'),
  integration: vitest('integration'),
  servers: vitest('servers'),
  build: async ({ root }) => {
    await ensureBuild(root, distDir)
    return pass
  },
  e2e: (asked) => e2e(asked),
}

/**
 * All stages, for two cores, turn after turn; the lanes of a turn run side by side. The browser tests are two at a time and
 * have the machine to themselves, and so has, at last, what starts and kills servers.
 */
export const turns = [
  [
    ['format', 'lint', 'canaries', 'cycles', 'unit', 'golden', 'rendering'],
    ['types', 'pure-types', 'build', 'integration'],
  ],
  [['e2e']],
  [['servers']],
]

/** What both lanes would otherwise install at once. */
export async function installPrograms() {
  await ensureChromium()
  await serverPrograms()
}

/** Figures rather than checks, asked for by name: speeds, frame times, page weights. */
export async function bench(asked) {
  const args = ['bench', '--run', '-c', 'tests/quality/vitest.config.ts', '--project', 'bench']
  const speeds = await gate([tool('vitest'), ...args])(asked)
  const drawn = await e2e({ ...asked, filters: ['page-weight', 'tests/bench/'] }, { BENCH: 'on' })
  return { passed: speeds.passed + drawn.passed, failed: speeds.failed + drawn.failed }
}
