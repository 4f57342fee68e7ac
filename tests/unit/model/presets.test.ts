import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { presetGroups, presets } from '@/scene/model/presets'
import { readTrain } from '@/scene/model/read-train'

const folder = new URL('../../../scene/model/presets/', import.meta.url)

describe('presets', () => {
  it('are all the files of their folder, each in a group of the trade', () => {
    const files = readdirSync(folder).map((name) => name.replace(/\.json$/, ''))
    expect(presets.map(({ id }) => id).toSorted()).toEqual(files.toSorted())
    expect(presets).toHaveLength(21)
    expect(new Set(presets.map(({ group }) => group))).toEqual(new Set(presetGroups))
  })

  it.each(presets.map(({ id }) => id))('%s reads as it stands in its file', (id) => {
    const json: unknown = JSON.parse(readFileSync(new URL(`${id}.json`, folder), 'utf8'))
    const read = readTrain(json)
    expect(read).toMatchObject({ ok: true })
    expect(presets.find((preset) => preset.id === id)!.train).toEqual(read.ok && read.document)
  })
})
