'use client'

import { useId, useState } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { FormDialog } from '@/components/ui/form-dialog'
import { TextLine } from '@/components/ui/text-line'
import type { Role } from '@/lib/auth/access'
import { call } from '@/lib/contracts/call'
import type { createApiToken } from '@/lib/contracts/tokens'
import type { OwnWorkshop } from './own-workshop'

interface Props {
  workshops: OwnWorkshop[]
  present: string | null
  onClose(): void
  onMade(): void
}

const spans = [
  [7, '7 days'],
  [30, '30 days'],
  [90, '90 days'],
  [366, 'a year'],
] as const

/** Asks what the token is for, then shows it, this once. */
export function TokenDialog({ workshops, present, onClose, onMade }: Props) {
  const [secret, setSecret] = useState<string | null>(null)
  const [name, setName] = useState('')
  const [workshopId, setWorkshopId] = useState(present ?? workshops[0].id)
  const workshop = workshops.find(({ id }) => id === workshopId) ?? workshops[0]
  const [wanted, setWanted] = useState<Role | null>(null)
  const role = wanted && workshop.mayGive.includes(wanted) ? wanted : workshop.role
  const [days, setDays] = useState(90)
  if (secret !== null) return <SecretDialog name={name} secret={secret} onClose={onClose} />
  return (
    <FormDialog
      title="New API token"
      about={{ k: 'Acts for', v: `you, as ${role}` }}
      submit="Make token"
      keep="Not now"
      onClose={onClose}
      send={async () => {
        const made = await call<typeof createApiToken>({
          method: 'POST',
          path: '/api/v1/workshops/{id}/tokens',
          params: { id: workshop.id },
          body: { name, role, days },
        })
        setSecret(made.secret)
        onMade()
      }}
    >
      <TextLine label="What it is for" value={name} onChange={setName} maxLength={80} required />
      <Choice
        label="Workshop"
        value={workshop.id}
        options={workshops.map((one) => [one.id, one.name])}
        onChange={setWorkshopId}
      />
      <Choice
        label="As"
        value={role}
        options={workshop.mayGive.map((one) => [one, one])}
        onChange={(chosen) => setWanted(workshop.mayGive.find((one) => one === chosen) ?? null)}
      />
      <Choice
        label="Works for"
        value={String(days)}
        options={spans.map(([span, words]) => [String(span), words])}
        onChange={(chosen) => setDays(Number(chosen))}
      />
    </FormDialog>
  )
}

interface ChoiceProps {
  label: string
  value: string
  options: [value: string, words: string][]
  onChange(value: string): void
}

function Choice({ label, value, options, onChange }: ChoiceProps) {
  const id = useId()
  return (
    <div className="lf">
      <label htmlFor={id}>{label}</label>
      <div className="box">
        <select id={id} value={value} onChange={(event) => onChange(event.target.value)}>
          {options.map(([option, words]) => (
            <option key={option} value={option}>
              {words}
            </option>
          ))}
        </select>
      </div>
    </div>
  )
}

function SecretDialog({ name, secret, onClose }: { name: string; secret: string; onClose(): void }) {
  const id = useId()
  const [copied, setCopied] = useState('')
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(secret)
      setCopied('Copied.')
    } catch {
      setCopied('The browser does not let it be copied: select it and copy it by hand.')
    }
  }
  return (
    <Dialog
      title="Your token, shown this once"
      about={{ k: 'For', v: name }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={() => void copy()}>
            Copy
          </button>
          <button type="button" className="btn pri" onClick={onClose}>
            I have kept it
          </button>
        </>
      }
    >
      <div className="lf">
        <label htmlFor={id}>Token</label>
        <div className="box">
          <input id={id} className="fig" value={secret} readOnly onFocus={(event) => event.target.select()} />
        </div>
      </div>
      <p className="read">
        Only its fingerprint is kept here. The program sends it as{' '}
        <span className="fig">Authorization: Bearer</span>. Whoever has it can do what it can.
      </p>
      <p className="cap" role="status">
        {copied}
      </p>
    </Dialog>
  )
}
