import { listed } from '@/scene/model/say'

const plurals: Record<string, string> = { flywheel: 'flywheel', 'free-end': 'free end' }
const words = (kind: string) => plurals[kind] ?? `${kind.replace(/-/g, ' ')}s`

/** Drawn parts in words, by kind: "counterweights 1F and 4D, 8 pistons". */
export function partWords(ids: readonly string[]): string {
  const kinds = new Map<string, string[]>()
  for (const id of ids) {
    const [kind, name = ''] = id.split(/:(.*)/s)
    kinds.set(kind, [...(kinds.get(kind) ?? []), name])
  }
  return [...kinds]
    .map(([kind, names]) => {
      if (names[0] === '') return words(kind)
      if (names.length > 3) return `${names.length} ${words(kind)}`
      const one = names.length === 1 ? words(kind).replace(/s$/, '') : words(kind)
      return `${one} ${listed(names)}`
    })
    .join(', ')
}
