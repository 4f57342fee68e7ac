'use client'

import { useId, useMemo, useState } from 'react'
import { angleWord } from '@/components/figures/interval-words'
import { LeafSection } from '@/components/figures/leaf'
import { FieldNote } from '@/components/ui/field-note'
import { fromSi } from '@/lib/units/units'
import { parseQuantity } from '@/lib/units/parse'
import { readPhasing, type PhasingProposal, type Proposed } from '@/scene/model/read-phasing'
import type { Issue } from '@/scene/model/issue'
import { useBench, useResults } from '@/scene/session/react'
import { splitNames } from '@/scene/session/split-names'
import { phasingChanges } from './edits'

/** Throws for an order somebody wants, with the mirrored crank beside them. */
export function PhasingSection() {
  const { train, document, analysis } = useResults()
  const { session } = useBench()
  const id = useId()
  const present = document.firingOrder.join('-')
  const [orderText, setOrderText] = useState<string | null>(null)
  const [intervalsText, setIntervalsText] = useState<string | null>(null)
  const [refused, setRefused] = useState(false)
  const text = orderText ?? present
  const own = analysis.firing.even ? undefined : analysis.firing.intervalsDeg
  const shownIntervals = intervalsText ?? own?.map(angleWord).join('-') ?? ''
  const asked = useMemo(() => {
    // What was not typed is the document's own, unrounded.
    const intervals =
      intervalsText === null ? { ok: true as const, degrees: own } : readIntervals(intervalsText)
    if (!intervals.ok) return intervals
    // Names may themselves hold a hyphen: then the document's own spelling is looked for first.
    const order = text.trim() === present ? document.firingOrder : splitNames(text)
    return readPhasing(document, train, order, intervals.degrees)
  }, [document, train, present, text, intervalsText, own])
  const issues = asked.ok ? [] : asked.issues
  const about = (path: string) => issues.filter((issue) => issue.path === path)
  const take = (proposal: PhasingProposal) => {
    const taken = session.edit(phasingChanges(document, proposal))
    setRefused(!taken)
    if (!taken) return
    setOrderText(null)
    setIntervalsText(null)
  }

  return (
    <LeafSection title="Throws for a wanted order">
      <div className="lf">
        <label htmlFor={`${id}-order`}>Wanted order</label>
        <TextBox
          id={`${id}-order`}
          text={text}
          bad={about('order').length > 0}
          note={`${id}-order-note`}
          onText={setOrderText}
        />
        <Refusals
          id={`${id}-order-note`}
          issues={about('order')}
          mend={{ label: `Back to ${present}`, run: () => setOrderText(null) }}
        />
      </div>
      <div className="lf">
        <label htmlFor={`${id}-intervals`}>Intervals, degrees</label>
        <TextBox
          id={`${id}-intervals`}
          text={shownIntervals}
          placeholder="even"
          bad={about('intervalsDeg').length > 0}
          note={`${id}-intervals-note`}
          onText={setIntervalsText}
        />
        <Refusals
          id={`${id}-intervals-note`}
          issues={about('intervalsDeg')}
          mend={{ label: 'Even intervals', run: () => setIntervalsText('') }}
        />
      </div>
      {asked.ok ? <Proposals proposal={asked.proposal} mirror={asked.mirror} onTake={take} /> : null}
      {refused ? (
        <p className="cap">
          The document does not take these throws: a value of the parts list is in the way.
        </p>
      ) : null}
      <p className="cap">
        A throw stands at its bank’s angle less the firing angle; the first cylinder’s throw stays.
        Counterweights stay where they are: judge the balance anew.
      </p>
    </LeafSection>
  )
}

interface TextBoxProps {
  id: string
  text: string
  placeholder?: string
  bad: boolean
  note: string
  onText(text: string): void
}

const TextBox = ({ id, text, placeholder, bad, note, onText }: TextBoxProps) => (
  <div className={bad ? 'box num bad' : 'box num'}>
    <input
      id={id}
      value={text}
      placeholder={placeholder}
      autoComplete="off"
      spellCheck={false}
      aria-invalid={bad || undefined}
      aria-describedby={bad ? note : undefined}
      onChange={(event) => onText(event.target.value)}
    />
  </div>
)

function Refusals({
  id,
  issues,
  mend,
}: {
  id: string
  issues: Issue[]
  mend: { label: string; run(): void }
}) {
  if (issues.length === 0) return null
  const [first, ...others] = issues
  const rest = others.map(({ message, fix }) => `${message} ${fix}`).join(' ')
  return <FieldNote id={id} head={first.message} text={`${first.fix} ${rest}`.trim()} mends={[mend]} />
}

interface ProposalsProps {
  proposal: PhasingProposal
  mirror: Proposed
  onTake(proposal: PhasingProposal): void
}

function Proposals({ proposal, mirror, onTake }: ProposalsProps) {
  const { document } = useResults()
  const columns = [
    { head: 'Proposed', proposal },
    ...(mirror.ok ? [{ head: 'Mirror', proposal: mirror.proposal }] : []),
  ]
  return (
    <>
      <table className="otab firing-phasing">
        <caption className="vh">Throw angles, degrees</caption>
        <thead>
          <tr>
            <th scope="col">Throw</th>
            <th scope="col">Present</th>
            {columns.map(({ head }) => (
              <th key={head} scope="col">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {document.throws.map(({ id, angleDeg }, index) => (
            <tr key={id}>
              <th scope="row">{id}</th>
              <td>{angleWord(angleDeg)}°</td>
              {columns.map(({ head, proposal: { throws } }) => (
                <td key={head}>{angleWord(throws[index].angleDeg)}°</td>
              ))}
            </tr>
          ))}
          <tr>
            <th scope="row">Fires</th>
            <td>{document.firingOrder.join('-')}</td>
            {columns.map(({ head, proposal: { order } }) => (
              <td key={head}>{order.join('-')}</td>
            ))}
          </tr>
        </tbody>
      </table>
      <p className="firing-take">
        {columns.map(({ head, proposal: one }) => (
          <button
            key={head}
            type="button"
            className="btn"
            aria-label={head === 'Mirror' ? 'Set the throws as mirrored' : 'Set the throws so'}
            onClick={() => onTake(one)}
          >
            {head === 'Mirror' ? 'Set them mirrored' : 'Set the throws so'}
          </button>
        ))}
      </p>
      <p className="cap">
        {mirror.ok
          ? 'The mirrored crank fires in the order backwards; it is also this crank turning the other way.'
          : `There is no mirror on these banks. ${mirror.issues.map(({ message }) => message).join(' ')}`}
      </p>
    </>
  )
}

type Intervals = { ok: true; degrees?: number[] } | { ok: false; issues: Issue[] }

function readIntervals(text: string): Intervals {
  const parts = splitNames(text)
  if (parts.length === 0) return { ok: true }
  const degrees: number[] = []
  for (const part of parts) {
    const parsed = parseQuantity(part, 'angle', '°')
    if (!parsed.ok) {
      const issue = {
        path: 'intervalsDeg',
        code: 'unread',
        message: parsed.message,
        fix: 'Example: 270-180-90-180.',
      }
      return { ok: false, issues: [issue] }
    }
    degrees.push(parsed.unit === '°' ? parsed.number : fromSi(parsed.value, '°'))
  }
  return { ok: true, degrees }
}
