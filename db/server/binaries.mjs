import { spawnSync } from 'node:child_process'
import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { ensureDebian, onPath } from './debian.mjs'

const debianRoot = '/usr/lib/postgresql'

/** Folders with a server's programs: Debian's, newest first, then the one on PATH. */
function folders() {
  const versions = existsSync(debianRoot) ? readdirSync(debianRoot).map(Number).filter(Boolean) : []
  const all = versions.sort((a, b) => b - a).map((number) => join(debianRoot, String(number), 'bin'))
  const inPath = onPath('initdb')
  if (inPath) all.push(dirname(inPath))
  return all.filter((folder) => existsSync(join(folder, 'initdb')) && existsSync(join(folder, 'postgres')))
}

function majorOf(folder) {
  const answer = spawnSync(join(folder, 'postgres'), ['--version'], { encoding: 'utf8' }).stdout ?? ''
  return /\d+/.exec(answer)?.[0]
}

/** The server's programs, installed when there are none: of the version that made these files, else the newest. */
export function serverPrograms(cluster) {
  const file = cluster && join(cluster, 'PG_VERSION')
  const version = file && existsSync(file) ? readFileSync(file, 'utf8').trim() : null
  return ensureDebian({
    find: () => folders().find((folder) => !version || majorOf(folder) === version) ?? null,
    packages: [version ? `postgresql-${version}` : 'postgresql'],
    purpose: version ? `PostgreSQL ${version}, which made the data here,` : 'The PostgreSQL server',
    note: 'only its programs are used; a server that Debian sets up beside them is left alone',
  })
}
