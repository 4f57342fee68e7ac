'use client'

import { useId, useState, type ReactNode } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { Segmented } from '@/components/ui/segmented'
import { plainNumber, quantityText } from '@/lib/units/format'
import { parseQuantity } from '@/lib/units/parse'
import type { Quantity, System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { Scene } from '@/scene/model/scene'
import { judge } from '@/scene/session/judge'
import { keepFitting, type Fitted } from '@/scene/session/keep-fitting'
import { useSessionState } from '@/scene/session/react'
import { setOut, type SettingOut } from '@/scene/session/set-out'
import { throwPitch } from '@/scene/session/structure'

interface Answer {
  document: CrankTrain
  /** What of the old train was taken over, and what was not. */
  fitted: Fitted | null
}
type Problem = { field: string; message: string }
interface Typed {
  title: string
  cycle: SettingOut['cycle']
  arrangement: SettingOut['arrangement']
  banks: string
  throws: string
  bore: string
  stroke: string
  pitch: string
  values: 'keep' | 'fresh'
}

/** The dialog begins with what stands on the bench, so that one more throw is one more angle. */
function begun({ train }: Scene, system: System): Typed {
  const { cylinders, throws, banks, cylinderDefaults: common } = train
  const angles = (list: { angleDeg: number }[]) => list.map(({ angleDeg }) => plainNumber(angleDeg)).join('/')
  const size = (mm: number | undefined, otherwise: string) =>
    mm === undefined
      ? otherwise
      : quantityText(mm / 1000, 'length', system, { decimals: system === 'si' ? 2 : 4 })
  const linked = cylinders.some(({ link }) => link)
  const inTurn = banks.length > 1 && cylinders.length === throws.length
  return {
    ...fresh,
    title: train.title,
    cycle: train.cycle,
    arrangement: linked ? 'master-rod' : inTurn ? 'banks-in-turn' : 'every-bank',
    banks: angles(banks),
    throws: angles(throws.toSorted((one, other) => one.axialMm - other.axialMm)),
    bore: size(common.boreMm, fresh.bore),
    stroke: size(common.strokeMm, fresh.stroke),
    pitch: throwPitch(train) === undefined ? '' : size(throwPitch(train), ''),
  }
}

const fresh: Typed = {
  title: 'New crank train',
  cycle: 'four-stroke',
  arrangement: 'every-bank',
  banks: '0',
  throws: '0/180/180/0',
  bore: '86 mm',
  stroke: '86 mm',
  pitch: '',
  values: 'keep',
}

/** Reads the form; the answer is a document that runs, or what is wrong and where. */
function read(typed: Typed, system: System, old: CrankTrain): Answer | Problem {
  const angles = (text: string) => {
    const out: number[] = []
    for (const part of text.split('/')) {
      const parsed = parseQuantity(part, 'angle', '°')
      if (!parsed.ok) return parsed.message
      out.push(parsed.number)
    }
    return out
  }
  const amount = (text: string, quantity: Quantity) => {
    const parsed = parseQuantity(text, quantity, system)
    return parsed.ok ? fromSi(parsed.value, 'mm') : parsed.message
  }
  const bankAngles = angles(typed.banks)
  if (typeof bankAngles === 'string') return { field: 'banks', message: bankAngles }
  const throwAngles = angles(typed.throws)
  if (typeof throwAngles === 'string') return { field: 'throws', message: throwAngles }
  if (typed.arrangement === 'master-rod' && bankAngles.length < 2)
    return {
      field: 'banks',
      message: 'A master rod needs the angle of every cylinder round the crank, such as 0/72/144/216/288.',
    }
  const boreMm = amount(typed.bore, 'length')
  if (typeof boreMm === 'string') return { field: 'bore', message: boreMm }
  const strokeMm = amount(typed.stroke, 'length')
  if (typeof strokeMm === 'string') return { field: 'stroke', message: strokeMm }
  const pitchMm = typed.pitch.trim() === '' ? undefined : amount(typed.pitch, 'length')
  if (typeof pitchMm === 'string') return { field: 'pitch', message: pitchMm }
  if (!(boreMm > 0)) return { field: 'bore', message: 'The bore must be above 0.' }
  if (!(strokeMm > 0)) return { field: 'stroke', message: 'The stroke must be above 0.' }
  const { title, cycle, arrangement } = typed
  const laid = setOut({ title, cycle, arrangement, bankAngles, throwAngles, boreMm, strokeMm, pitchMm })
  const sized = { ...old.cylinderDefaults, boreMm, strokeMm }
  const fitted = typed.values === 'keep' ? keepFitting({ ...old, cylinderDefaults: sized }, laid) : null
  const document = fitted?.document ?? laid
  const [issue] = judge(document)
  return issue ? { field: 'throws', message: `${issue.message} ${issue.fix}` } : { document, fitted }
}

const cylindersOf = ({ arrangement, banks, throws }: Typed) => {
  const count = (text: string) => text.split('/').filter((part) => part.trim() !== '').length
  return arrangement === 'banks-in-turn' ? count(throws) : count(banks) * count(throws)
}

/** A new train from its layout alone: the proportions are the program's until real ones are typed. */
export function SetOutDialog({ onClose, onDone }: { onClose(): void; onDone(document: CrankTrain): void }) {
  const system = useSessionState((state) => state.system)
  const scene = useSessionState((state) => state.scene)
  const [typed, setTyped] = useState(() => begun(scene, system))
  const [problem, setProblem] = useState<Problem | null>(null)
  const id = useId()
  const set = <K extends keyof Typed>(key: K, value: Typed[K]) => {
    setTyped({ ...typed, [key]: value })
    setProblem(null)
  }
  const field = (
    key: 'title' | 'banks' | 'throws' | 'bore' | 'stroke' | 'pitch',
    label: string,
    hint?: ReactNode,
  ) => (
    <div className="lf">
      <label htmlFor={`${id}-${key}`}>{label}</label>
      <div className={problem?.field === key ? 'box bad' : 'box'}>
        <input
          id={`${id}-${key}`}
          value={typed[key]}
          aria-invalid={problem?.field === key || undefined}
          aria-describedby={problem?.field === key ? `${id}-problem` : undefined}
          onChange={(event) => set(key, event.target.value)}
        />
      </div>
      {problem?.field === key ? (
        <p className="msg" id={`${id}-problem`} role="alert">
          {problem.message}
        </p>
      ) : hint ? (
        <p className="cap">{hint}</p>
      ) : null}
    </div>
  )
  const ahead = read(typed, system, scene.train)
  const fitted = 'document' in ahead ? ahead.fitted : null
  const submit = () => {
    const answer = read(typed, system, scene.train)
    if ('document' in answer) onDone(answer.document)
    else setProblem(answer)
  }
  return (
    <Dialog
      title="Set out a crank train"
      wide
      about={{ k: 'Cylinders', v: String(cylindersOf(typed)) }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Keep the drawing
          </button>
          <button type="button" className="btn pri" onClick={submit}>
            Set out
          </button>
        </>
      }
    >
      <form
        className="set-out"
        onSubmit={(event) => {
          event.preventDefault()
          submit()
        }}
      >
        {field('title', 'Title')}
        <div className="lf">
          <span className="lab">Cycle</span>
          <Segmented
            label="Cycle"
            value={typed.cycle}
            options={[
              { value: 'four-stroke', label: 'four-stroke' },
              { value: 'two-stroke', label: 'two-stroke' },
            ]}
            onChange={(cycle) => set('cycle', cycle)}
          />
        </div>
        {field('banks', 'Bank angles, from upright', 'one for each bank: 0, or −45/45')}
        {field('throws', 'Throw angles, free end first', 'one for each crank pin: 0/90/270/180')}
        <div className="lf full">
          <span className="lab">On each throw</span>
          <Segmented
            label="On each throw"
            value={typed.arrangement}
            options={[
              { value: 'every-bank', label: 'a cylinder of every bank' },
              { value: 'banks-in-turn', label: 'one cylinder, banks in turn' },
              { value: 'master-rod', label: 'link rods on a master' },
            ]}
            onChange={(arrangement) => set('arrangement', arrangement)}
          />
        </div>
        {field('bore', 'Bore')}
        {field('stroke', 'Stroke')}
        {field('pitch', 'Throw pitch', 'by the bore where left empty')}
        <div className="lf full">
          <span className="lab">Everything else</span>
          <Segmented
            label="Everything else"
            value={typed.values}
            options={[
              { value: 'keep', label: 'as it is, where it fits' },
              { value: 'fresh', label: 'usual proportions of the bore' },
            ]}
            onChange={(values) => set('values', values)}
          />
        </div>
        <button type="submit" className="vh" tabIndex={-1}>
          Set out
        </button>
      </form>
      {fitted ? (
        <div className="fitted" role="status">
          <p>
            <b>Stays:</b> {fitted.kept.join('; ')}.
          </p>
          {fitted.reset.length > 0 ? (
            <p>
              <b>Is set anew or dropped:</b> {fitted.reset.join('; ')}. One step back brings all of it again.
            </p>
          ) : null}
        </div>
      ) : null}
      {fitted ? null : (
        <p className="cap">
          Rods, masses, journals and gas begin with usual proportions of the bore, and the firing order with
          the most even one that the throws allow. Everything can be typed over afterwards.
        </p>
      )}
    </Dialog>
  )
}
