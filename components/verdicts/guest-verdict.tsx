'use client'

import { useState } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { FormDialog } from '@/components/ui/form-dialog'
import { TextLine } from '@/components/ui/text-line'
import { sendTo } from '@/lib/contracts/call'
import { verdictWords, type VerdictWord } from '@/lib/review/version-states'
import { verdictLabels } from './verdict-labels'

interface Props {
  /** Of the link, for what stands under it. */
  address: string
  version: number
  onClose(): void
}

/** The word of whoever holds a link on the version it shows: kept, told to whoever sent the link, and binding nobody. */
export default function GuestVerdict({ address, version, onClose }: Props) {
  const [name, setName] = useState('')
  const [word, setWord] = useState<VerdictWord>('approve')
  const [sentence, setSentence] = useState('')
  const [given, setGiven] = useState(false)
  const about = { k: 'On', v: `version ${version}` }
  if (given)
    return (
      <Dialog
        title="Your word is given"
        about={about}
        onClose={onClose}
        actions={
          <button type="button" className="btn pri" onClick={onClose}>
            Close
          </button>
        }
      >
        <p role="status">
          {verdictLabels[word]}, {name.trim()}, on version {version}. Whoever sent the link is told.
        </p>
      </Dialog>
    )
  return (
    <FormDialog
      title="Your word on this version"
      about={about}
      keep="Not now"
      submit="Give verdict"
      onClose={onClose}
      send={async () => {
        await sendTo('POST', address, { body: { name, word, sentence } })
        setGiven(true)
      }}
    >
      {(refused) => (
        <>
          <p>It is kept with exactly this version. The workshop signs off its drawings itself.</p>
          <TextLine
            label="Your name, marked guest"
            value={name}
            onChange={setName}
            bad={refused === 'name'}
            maxLength={80}
            autoComplete="name"
            required
          />
          <fieldset className="guest-words">
            <legend>Your word</legend>
            {verdictWords.map((each) => (
              <label className="pick-one" key={each}>
                <input
                  type="radio"
                  name="guest-word"
                  checked={each === word}
                  onChange={() => setWord(each)}
                />
                {verdictLabels[each]}
              </label>
            ))}
          </fieldset>
          <TextLine
            label="In a sentence"
            value={sentence}
            onChange={setSentence}
            bad={refused === 'sentence'}
            maxLength={500}
            hint="For everything but a plain approval."
            required={word !== 'approve'}
          />
        </>
      )}
    </FormDialog>
  )
}
