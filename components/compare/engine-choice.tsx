'use client'

import { useId, useRef, useState } from 'react'
import { Refusal } from '@/lib/contracts/call'
import { presetGroups, presets } from '@/scene/model/presets'
import { readFile } from '@/scene/session/file'
import { presetRival, rivalOf, type Rival } from './engines'
import { readSceneOf, useWorkshopScenes } from './use-workshop-scenes'

interface Props {
  label: string
  rival: Rival | null
  onChoose(rival: Rival | null): void
  /** May be left empty. */
  optional: boolean
}

interface Fault {
  detail: string
  cure: string
}

/** Which engine stands in a place: a preset, a saved scene of the workshop, or a file. */
export function EngineChoice({ label, rival, onChoose, optional }: Props) {
  const id = useId()
  const file = useRef<HTMLInputElement>(null)
  const [fault, setFault] = useState<Fault | null>(null)
  const [fetching, setFetching] = useState(false)
  const { scenes, guest } = useWorkshopScenes()
  const choose = async (key: string) => {
    setFault(null)
    if (key === '') return onChoose(null)
    if (key === 'file') return file.current?.click()
    const [kind, name] = [key.slice(0, key.indexOf(':')), key.slice(key.indexOf(':') + 1)]
    if (kind === 'preset') return onChoose(presetRival(name))
    if (kind !== 'scene') return
    setFetching(true)
    try {
      const { version } = await readSceneOf(name)
      onChoose(rivalOf(key, version.document.train, version.document.view.speedRpm))
    } catch (error) {
      const { detail, cure } = error instanceof Refusal ? error.problem : unknownFault
      setFault({ detail, cure })
    } finally {
      setFetching(false)
    }
  }
  const bringIn = async (chosen: File) => {
    const answer = readFile(await chosen.text())
    if (answer.ok) {
      setFault(null)
      onChoose(rivalOf(`file:${chosen.name}`, answer.scene.train, answer.scene.view.speedRpm))
      return
    }
    const [issue] = answer.issues
    const where = issue.path ? `${chosen.name}, ${issue.path}: ` : `${chosen.name}: `
    setFault({ detail: `${where}${issue.message}`, cure: `${issue.fix} The engine that stood here stays.` })
  }
  return (
    <div className="lf compare-choice">
      <label htmlFor={id}>{label}</label>
      <span className="box">
        <select
          id={id}
          value={rival?.key ?? ''}
          disabled={fetching}
          onChange={(event) => void choose(event.target.value)}
        >
          {optional ? <option value="">None</option> : null}
          {rival?.key.startsWith('file:') ? <option value={rival.key}>{rival.key.slice(5)}</option> : null}
          {scenes.length > 0 ? (
            <optgroup label="Scenes of the workshop">
              {scenes.map((scene) => (
                <option key={scene.id} value={`scene:${scene.id}`}>
                  {scene.title}
                </option>
              ))}
            </optgroup>
          ) : null}
          {presetGroups.map((group) => (
            <optgroup key={group} label={`Presets, ${group}`}>
              {presets
                .filter((preset) => preset.group === group)
                .map((preset) => (
                  <option key={preset.id} value={`preset:${preset.id}`}>
                    {preset.train.title}
                  </option>
                ))}
            </optgroup>
          ))}
          <option value="file">From a file…</option>
        </select>
      </span>
      <input
        ref={file}
        type="file"
        className="vh"
        accept=".json,application/json"
        aria-label={`${label}, from a file`}
        tabIndex={-1}
        onChange={(event) => {
          const [chosen] = event.target.files ?? []
          if (chosen) void bringIn(chosen)
          event.target.value = ''
        }}
      />
      <p className="cap" role="status">
        {fault ? (
          <span className="compare-fault">
            <b>{fault.detail}</b> {fault.cure}
          </span>
        ) : guest ? (
          'Sign in to stand saved scenes here.'
        ) : null}
      </p>
    </div>
  )
}

const unknownFault: Fault = { detail: 'The scene could not be read.', cure: 'Try again in a minute.' }
