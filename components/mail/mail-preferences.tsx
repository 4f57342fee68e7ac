'use client'

import { useId, useState } from 'react'
import useSWR from 'swr'
import { Switch } from '@/components/ui/switch'
import { call, readAddress } from '@/lib/contracts/call'
import type { keepMailPreference, MailPreferences as Preferences } from '@/lib/contracts/mail'
import { kindWords, type MailKind } from '@/lib/letters/mail-kinds'

const address = '/api/v1/mail-preferences'

/** Which mails somebody gets: each kind on or off, kept at once. */
export function MailPreferences() {
  const id = useId()
  const { data, error, mutate } = useSWR<Preferences, Error>(address, readAddress)
  const [refused, setRefused] = useState<string | null>(null)

  const keep = async (kind: MailKind, wanted: boolean) => {
    setRefused(null)
    const body = { kind, wanted }
    const preferences = data?.preferences.map((one) => (one.kind === kind ? body : one)) ?? []
    try {
      await mutate(call<typeof keepMailPreference>({ method: 'PUT', path: address, body }), {
        optimisticData: { preferences },
        rollbackOnError: true,
        revalidate: false,
      })
    } catch (cause) {
      setRefused(`${kindWords[kind]}: ${(cause as Error).message}`)
    }
  }

  const wrong = refused ?? (error && !data ? error.message : null)
  return (
    <section className="mail-preferences" aria-labelledby={id}>
      <h2 id={id}>Mail</h2>
      <p className="cap">
        Invitations, new passwords and copies of your own questions are sent always. Each other mail also says
        how to turn its kind off.
      </p>
      {data ? (
        <ul>
          {data.preferences.map(({ kind, wanted }) => (
            <li key={kind}>
              <Switch label={kindWords[kind]} on={wanted} onChange={(on) => void keep(kind, on)} />
            </li>
          ))}
        </ul>
      ) : null}
      {wrong ? (
        <p className="refused" role="alert">
          {wrong}
        </p>
      ) : null}
    </section>
  )
}
