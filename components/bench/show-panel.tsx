'use client'

import { useEffect, useId, useRef, useState } from 'react'
import { Icon } from '@/components/ui/icon'
import { Segmented } from '@/components/ui/segmented'
import { Switch } from '@/components/ui/switch'
import { formatQuantity, withUnit } from '@/lib/units/format'
import { partGroups, type Overlays, type PartGroupName } from '@/scene/model/scene'
import type { Path } from '@/scene/session/path'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import type { RendererKind } from '@/scene/stage/types'

interface Props {
  renderer: RendererKind | 'auto'
  onRenderer(kind: RendererKind | 'auto'): void
  panes: boolean
  onPanes(on: boolean): void
}

const groupNames: Record<PartGroupName, string> = {
  crank: 'Crank',
  rods: 'Rods',
  pistons: 'Pistons',
  bores: 'Bores',
  flywheel: 'Flywheel',
  shafts: 'Balance shafts',
}
type Shown = 'shown' | 'ghost' | 'hidden'

/** What stands on the drawing, behind one word: forces, marks, groups of parts, section, and how it is drawn. */
export function ShowPanel({ renderer, onRenderer, panes, onPanes }: Props) {
  const { session } = useBench()
  const { model, train } = useResults()
  const view = useSessionState((state) => state.scene.view)
  const system = useSessionState((state) => state.system)
  const [open, setOpen] = useState(false)
  const id = useId()
  const box = useRef<HTMLDivElement>(null)
  const { overlays } = view

  useEffect(() => {
    if (!open) return
    const away = (event: PointerEvent) => {
      if (!box.current?.contains(event.target as Node)) setOpen(false)
    }
    document.addEventListener('pointerdown', away)
    return () => document.removeEventListener('pointerdown', away)
  }, [open])

  const set = (path: Path, value: unknown) => session.edit([{ path: ['view', ...path], value }])
  const overlay = (label: string, key: Exclude<keyof Overlays, 'on'>) => (
    <Switch label={label} on={overlays[key]} onChange={(on) => set(['overlays', key], on)} />
  )
  const place = (label: string, key: keyof Overlays['on']) => (
    <Switch label={label} on={overlays.on[key]} onChange={(on) => set(['overlays', 'on', key], on)} />
  )
  const stateOf = (group: PartGroupName): Shown =>
    view.hidden.includes(group) ? 'hidden' : view.ghost.includes(group) ? 'ghost' : 'shown'
  const setGroup = (group: PartGroupName, state: Shown) => {
    const put = (list: PartGroupName[], inside: boolean) => [
      ...list.filter((name) => name !== group),
      ...(inside ? [group] : []),
    ]
    session.edit([
      { path: ['view', 'hidden'], value: put(view.hidden, state === 'hidden') },
      { path: ['view', 'ghost'], value: put(view.ghost, state === 'ghost') },
    ])
  }
  const groups = partGroups.filter((group) => model.rig.parts.some((part) => part.group === group))
  const ends = {
    from: Math.min(...train.cylinders.map(({ axial, bore }) => axial - bore / 2)),
    to: Math.max(...train.cylinders.map(({ axial, bore }) => axial + bore / 2)),
  }
  const cut = view.sectionAxialMm
  const cutText = cut === null ? '' : formatQuantity(cut / 1000, 'length', system)
  return (
    <div
      className="show"
      ref={box}
      onKeyDown={(event) => {
        if (event.key === 'Escape') setOpen(false)
      }}
    >
      <button
        type="button"
        className="btn sm"
        aria-expanded={open}
        aria-controls={id}
        onClick={() => setOpen(!open)}
      >
        Show <Icon name="down" />
      </button>
      {open ? (
        <div className="show-panel" id={id} role="group" aria-label="What the drawing shows">
          <fieldset>
            <legend>Forces</legend>
            {overlay('Gas', 'gas')}
            {overlay('Inertia', 'inertia')}
            {overlay('Total', 'total')}
          </fieldset>
          <fieldset>
            <legend>Standing on</legend>
            {place('Pistons', 'pistons')}
            {place('Crank pins', 'crankPins')}
            {place('Mains', 'mains')}
          </fieldset>
          <fieldset>
            <legend>Marks</legend>
            {overlay('Shaking force and couple', 'shaking')}
            {overlay('Its path', 'orbit')}
            {overlay('Firing', 'firing')}
            {overlay('Pressure', 'pressure')}
            {overlay('Labels and balloons', 'labels')}
          </fieldset>
          <fieldset className="span">
            <legend>Parts</legend>
            {groups.map((group) => (
              <div key={group} className="show-group">
                <span>{groupNames[group]}</span>
                <Segmented
                  label={groupNames[group]}
                  value={stateOf(group)}
                  options={[
                    { value: 'shown', label: 'shown' },
                    { value: 'ghost', label: 'ghost' },
                    { value: 'hidden', label: 'hidden' },
                  ]}
                  onChange={(state) => setGroup(group, state)}
                />
              </div>
            ))}
          </fieldset>
          <fieldset className="span">
            <legend>Section across the crank</legend>
            <div className="show-group">
              <Switch
                label="Cut"
                on={cut !== null}
                onChange={(on) =>
                  set(['sectionAxialMm'], on ? Math.round(train.cylinders[0].axial * 1000) : null)
                }
              />
              <input
                type="range"
                aria-label="Section at"
                aria-valuetext={cutText ? withUnit(cutText.text, cutText.unit) : 'none'}
                min={Math.floor(ends.from * 1000)}
                max={Math.ceil(ends.to * 1000)}
                step={1}
                disabled={cut === null}
                value={cut ?? Math.floor(ends.from * 1000)}
                onChange={(event) => set(['sectionAxialMm'], Number(event.target.value))}
              />
              <span className="fig cut-at">{cutText ? withUnit(cutText.text, cutText.unit) : '–'}</span>
            </div>
          </fieldset>
          <fieldset className="span">
            <legend>Drawn by</legend>
            <div className="show-group">
              <Segmented
                label="Drawn by"
                value={renderer}
                options={[
                  { value: 'auto', label: 'as it suits' },
                  { value: 'webgl', label: '3D graphics' },
                  { value: 'canvas', label: 'without' },
                ]}
                onChange={onRenderer}
              />
            </div>
            <Switch label="End and side view beside it" on={panes} onChange={onPanes} />
          </fieldset>
        </div>
      ) : null}
    </div>
  )
}
