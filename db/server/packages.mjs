import { existsSync, readFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { alone } from './lock.mjs'
import { run } from './processes.mjs'

const packagesOf = (file) => (existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')).packages : null)

/** Does what npm says it has put into node_modules agree with the lock file? */
function upToDate(root) {
  const wanted = packagesOf(join(root, 'package-lock.json'))
  const there = packagesOf(join(root, 'node_modules/.package-lock.json'))
  if (!there) return false
  return Object.entries(wanted).every(([path, { version, integrity, optional }]) => {
    const installed = there[path]
    // what is optional is there only where the machine suits it
    if (!path || (optional && !installed)) return true
    return installed?.version === version && installed.integrity === integrity
  })
}

/** Installs exactly the lock file's packages when they are missing or others. */
export async function ensurePackages(root) {
  if (upToDate(root)) return
  await alone(`installing packages in ${root}`, async () => {
    if (upToDate(root)) return
    console.log('Installing packages (npm ci) …')
    // npm's own script through this very Node, so that no other version of either gets in
    const beside = join(dirname(process.execPath), '../lib/node_modules/npm/bin/npm-cli.js')
    const npm = [process.env.npm_execpath, beside].find((path) => path && existsSync(path))
    const [command, ...first] = npm ? [process.execPath, npm] : ['npm']
    await run(command, [...first, 'ci', '--no-audit', '--no-fund'], { cwd: root })
  })
}
