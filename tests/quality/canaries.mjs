// Files that break the house's rules on purpose, each where its first line says: the gates must see exactly what
// its second line says (`comment`: one that tries to silence a rule). A gate that has gone blind fails here.
import { spawnSync } from 'node:child_process'
import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ESLint } from 'eslint'
import prettier from 'prettier'

const here = fileURLToPath(new URL('.', import.meta.url))
const root = join(here, '../..')
const bin = (name) => join(root, 'node_modules/.bin', name)

async function lintCanaries() {
  const eslint = new ESLint({ cwd: root, overrideConfigFile: join(here, 'eslint.config.mjs') })
  const names = readdirSync(join(here, 'canaries')).filter((name) => name.endsWith('.ts'))
  return Promise.all(
    names.map(async (name) => {
      const code = readFileSync(join(here, 'canaries', name), 'utf8')
      const [, at, breaks] = /^\/\/ at: (.+)\n\/\/ breaks:(.*)\n/.exec(code)
      const [{ messages }] = await eslint.lintText(code, { filePath: join(root, at) })
      const expected = breaks
        .split(',')
        .map((rule) => rule.trim())
        .filter(Boolean)
        .sort()
        .join(', ')
      const seen = messages
        .map(({ ruleId }) => ruleId ?? 'comment')
        .sort()
        .join(', ')
      // an import that leads nowhere is refused for that alone and would prove nothing about its room
      const lost = name !== 'nothing-there.ts' && messages.find(({ message }) => /source "@\//.test(message))
      return { name, passed: seen === expected && !lost, seen: lost ? lost.message : seen, expected }
    }),
  )
}

function toolCanary(name, tool, args, wanted) {
  const { status, stdout, stderr } = spawnSync(bin(tool), args, { cwd: root, encoding: 'utf8' })
  const said = stdout + stderr
  const passed = status !== 0 && wanted.every((part) => said.includes(part))
  return { name, passed, seen: said.slice(0, 500), expected: wanted.join(', ') }
}

/** What became of each canary; what went wrong is printed. */
export async function runCanaries() {
  const cruise = ['--config', 'tests/quality/depcruise.config.mjs', 'tests/quality/canaries/cycle']
  const types = ['--noEmit', '-p', 'tests/quality/canaries/pure/tsconfig.json']
  const options = JSON.parse(readFileSync(join(here, 'prettier.json'), 'utf8'))
  const tidy = await prettier.check('export const a = "b";\n', { ...options, filepath: 'canary.ts' })
  const results = [
    ...(await lintCanaries()),
    toolCanary('cycle', 'depcruise', cruise, ['no-circular']),
    toolCanary('pure types', 'tsc', types, ["'document'", "'process'"]),
    { name: 'formatting', passed: !tidy, seen: 'tidy', expected: 'untidy' },
  ]
  for (const { name, passed, seen, expected } of results) {
    if (!passed)
      console.log(`${name}\n  expected: ${expected || 'nothing'}\n  seen:     ${seen || 'nothing'}`)
  }
  return results
}
