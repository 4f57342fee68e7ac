import { existsSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { Refusal, run } from './processes.mjs'

const isRoot = process.getuid?.() === 0

/** The path of a program on PATH, or null. */
export function onPath(program) {
  const folders = (process.env.PATH ?? '').split(delimiter).filter(Boolean)
  return folders.map((folder) => join(folder, program)).find((path) => existsSync(path)) ?? null
}

/** What `find` finds, after installing Debian's packages when it finds nothing at first. */
export async function ensureDebian({ find, packages, purpose, note = '' }) {
  const found = find()
  if (found) return found
  const install = ['install', '-y', '--no-install-recommends', ...packages]
  const command = `apt-get ${install.join(' ')}`
  if (!isRoot || !onPath('apt-get')) {
    throw new Refusal(`${purpose} is missing. Install it once, then run this again:\n  sudo ${command}`)
  }
  console.log(`${purpose} is missing; installing Debian's package: ${command}${note && `\n(${note})`}`)
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  await run('apt-get', ['update', '-q'], { env })
  await run('apt-get', install, { env })
  const installed = find()
  if (!installed) throw new Refusal(`${purpose} is still missing after: ${command}`)
  return installed
}
