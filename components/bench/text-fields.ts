import { formatNumber } from '@/lib/units/format'
import { parseQuantity } from '@/lib/units/parse'
import type { Scene } from '@/scene/model/scene'
import type { Doubt, Field, Reading } from '@/scene/session/field'
import { orderSlip } from '@/scene/session/order-slip'
import type { Change } from '@/scene/session/path'
import { splitNames } from '@/scene/session/split-names'
import { angleSlip } from '@/scene/session/usual'

/** A field of several values in one line: `0/90/270/180`, `1-8-4-3-6-5-7-2`. */
export interface TextField extends Field {
  show(scene: Scene): string
}

const angle = (value: number) => {
  const [, part = ''] = String(Number(Math.abs(value).toFixed(4))).split('.')
  return formatNumber(value, { decimals: part.length })
}

/** Angles of a list, one entry an item, in the document's order. */
function angleList(list: 'banks' | 'throws', label: string, word: string): TextField {
  return {
    key: list,
    label,
    show: ({ train }) => train[list].map((item) => angle(item.angleDeg)).join('/'),
    read(text, scene): Reading {
      const { train } = scene
      const parts = text.split('/')
      if (parts.length !== train[list].length)
        return {
          ok: false,
          message: `${count(parts.length, 'angle')} for ${count(train[list].length, word)}. Write one for each, with / between: ${train[list].map((item) => angle(item.angleDeg)).join('/')}.`,
          mends: [],
        }
      const changes: Change[] = []
      let turned: Doubt | null = null
      for (const [i, part] of parts.entries()) {
        const parsed = parseQuantity(part, 'angle', '°')
        if (!parsed.ok) return { ok: false, message: parsed.message, mends: [] }
        const value = parsed.unit === '°' ? parsed.number : (parsed.value * 180) / Math.PI
        const doubt = angleSlip(value, scene, { number: parsed.number, unit: parsed.unit, system: 'si' })
        const wrapped = () =>
          parts.map((each, k) => (k === i ? angle(((value % 360) + 360) % 360) : each.trim()))
        if (doubt && !turned) turned = { ...doubt, mends: [{ ...doubt.mends[0], text: wrapped().join('/') }] }
        changes.push({ path: ['train', list, i, 'angleDeg'], value })
      }
      return { ok: true, changes, doubt: turned }
    },
  }
}

const count = (n: number, word: string) => `${n} ${word}${n === 1 ? '' : 's'}`

export const bankAngles = angleList('banks', 'Bank angles', 'bank')
export const throwAngles = angleList('throws', 'Throws', 'throw')

export const firingOrder: TextField = {
  key: 'firingOrder',
  label: 'Firing order',
  show: ({ train }) => train.firingOrder.join('-'),
  read: (text, { train }) => {
    // Names may themselves hold a hyphen: then the document's own spelling is looked for first.
    const order = text.trim() === train.firingOrder.join('-') ? train.firingOrder : splitNames(text)
    const slip = orderSlip(order, train)
    if (slip) return { ok: false, ...slip }
    return { ok: true, changes: [{ path: ['train', 'firingOrder'], value: order }] }
  },
}

export const mainPlaces: TextField = {
  key: 'mains',
  label: 'Mains at',
  show: ({ train }) => train.mains.map((main) => angle(main.axialMm)).join('/'),
  read(text) {
    const mains = []
    for (const [i, part] of text.split('/').entries()) {
      if (part.trim() === '') continue
      const parsed = parseQuantity(part, 'length', 'mm')
      if (!parsed.ok) return { ok: false, message: parsed.message, mends: [] }
      mains.push({ id: `M${i + 1}`, axialMm: Number((parsed.value * 1000).toPrecision(12)) })
    }
    return { ok: true, changes: [{ path: ['train', 'mains'], value: mains }] }
  },
}
