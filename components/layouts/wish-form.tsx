'use client'

import { useId, type ReactNode } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { FieldNote } from '@/components/ui/field-note'
import { NumberField } from '@/components/ui/number-field'
import { Segmented } from '@/components/ui/segmented'
import { criterionWords } from './criteria'
import type { FormProblem, Importance, WishForm } from './form'

interface Props {
  form: WishForm
  problems: readonly FormProblem[]
  onChange(form: WishForm): void
}

type Text = 'cylinders' | 'bankAngles' | 'splitMost' | 'splitStep'

/** Which engines are gone through. */
export function EngineSection({ form, problems, onChange }: Props) {
  const set = (part: Partial<WishForm>) => onChange({ ...form, ...part })
  const two = form.banks === 'two'
  const field = (key: Text, label: string, unit: string, hint?: string) => (
    <Field
      name={key}
      label={label}
      hint={hint}
      text={form[key]}
      unit={unit}
      problems={problems}
      onText={(text) => set({ [key]: text })}
    />
  )
  return (
    <LeafSection title="Engine" at="equal cylinders, throws evenly spaced">
      <div className="layout-form">
        {field('cylinders', 'Number of cylinders', '', '1 to 12')}
        <Choice label="Working cycle">
          <Segmented
            label="Working cycle"
            value={form.cycle}
            options={[
              { value: 'four-stroke', label: 'four-stroke' },
              { value: 'two-stroke', label: 'two-stroke' },
            ]}
            onChange={(cycle) => set({ cycle })}
          />
        </Choice>
        <Choice label="Banks">
          <Segmented
            label="Banks"
            value={form.banks}
            options={[
              { value: 'one', label: 'one' },
              { value: 'two', label: 'two' },
            ]}
            onChange={(banks) => set({ banks })}
          />
        </Choice>
        {two ? field('bankAngles', 'Angles between banks', '°', 'each is tried: 90, or 60/90/120') : null}
        {two ? (
          <Choice label="Rods on each throw" full>
            <Segmented
              label="Rods on each throw"
              value={form.rods}
              options={[
                { value: 'paired', label: 'one of either bank' },
                { value: 'in-turn', label: 'one, banks in turn' },
              ]}
              onChange={(rods) => set({ rods })}
            />
          </Choice>
        ) : null}
        {two && form.rods === 'paired' ? (
          <Choice label="Pins" full>
            <Segmented
              label="Pins"
              value={form.pins}
              options={[
                { value: 'common', label: 'common' },
                { value: 'split', label: 'common or split' },
              ]}
              onChange={(pins) => set({ pins })}
            />
          </Choice>
        ) : null}
        {two && form.rods === 'paired' && form.pins === 'split' ? (
          <>
            {field('splitMost', 'Split to either side, at most', '°')}
            {field('splitStep', 'In steps of', '°')}
          </>
        ) : null}
      </div>
    </LeafSection>
  )
}

const importanceWords: Record<Importance, string> = {
  no: 'not asked',
  some: 'counts',
  much: 'counts 3 times',
  most: 'counts 10 times',
}

/** What is wished of them. */
export function WishSection({ form, problems, onChange }: Props) {
  const id = useId()
  return (
    <LeafSection title="Wishes" at="a limit shuts out, a weight ranks">
      <div className="wishes" role="group" aria-label="Wishes">
        {criterionWords
          .filter((criterion) => criterion.id !== 'sameBank' || form.banks === 'two')
          .map((criterion) => {
            const own = form.wishes[criterion.id]
            const problem = problems.find(({ field }) => field === criterion.id)
            const set = (part: Partial<typeof own>) =>
              onChange({ ...form, wishes: { ...form.wishes, [criterion.id]: { ...own, ...part } } })
            return (
              <div key={criterion.id} className="wish">
                <span className="wish-name">{criterion.wish}</span>
                <select
                  className="pick"
                  aria-label={`${criterion.wish}: weight`}
                  value={own.importance}
                  onChange={(event) => set({ importance: event.target.value as Importance })}
                >
                  {Object.entries(importanceWords).map(([value, label]) => (
                    <option key={value} value={value}>
                      {label}
                    </option>
                  ))}
                </select>
                <label className="cap" htmlFor={`${id}-${criterion.id}`}>
                  at most
                </label>
                <NumberField
                  id={`${id}-${criterion.id}`}
                  label={`${criterion.wish}: at most`}
                  text={own.atMost}
                  unit={criterion.unit}
                  placeholder="any"
                  refused={problem && own.atMost}
                  describedBy={problem && `${id}-${criterion.id}-note`}
                  onText={(atMost) => set({ atMost })}
                />
                {problem ? (
                  <FieldNote
                    id={`${id}-${criterion.id}-note`}
                    head={problem.head}
                    text={problem.message}
                    mends={[
                      ...(problem.mend
                        ? [{ label: `Use ${problem.mend}`, run: () => set({ atMost: problem.mend }) }]
                        : []),
                      { label: 'No limit', run: () => set({ atMost: '' }) },
                    ]}
                  />
                ) : null}
              </div>
            )
          })}
      </div>
    </LeafSection>
  )
}

function Choice({ label, full, children }: { label: string; full?: boolean; children: ReactNode }) {
  return (
    <div className={full ? 'lf full' : 'lf'}>
      <span className="lab">{label}</span>
      {children}
    </div>
  )
}

interface FieldProps {
  name: string
  label: string
  hint?: string
  text: string
  unit: string
  problems: readonly FormProblem[]
  onText(text: string): void
}

function Field({ name, label, hint, text, unit, problems, onText }: FieldProps) {
  const id = useId()
  const problem = problems.find(({ field }) => field === name)
  return (
    <div className="lf">
      <label htmlFor={id}>{label}</label>
      <NumberField
        id={id}
        look="box"
        text={text}
        unit={unit}
        refused={problem && text}
        describedBy={problem && `${id}-note`}
        onText={onText}
      />
      {problem ? (
        <FieldNote
          id={`${id}-note`}
          head={problem.head}
          text={problem.message}
          mends={problem.mend ? [{ label: `Use ${problem.mend}`, run: () => onText(problem.mend!) }] : []}
        />
      ) : hint ? (
        <p className="cap">{hint}</p>
      ) : null}
    </div>
  )
}
