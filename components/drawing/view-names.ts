import type { NamedView } from '@/scene/frame/named-views'

/** The named views as they are offered beside a drawing. */
export const viewOptions: { value: NamedView; label: string }[] = [
  { value: 'free', label: 'Free' },
  { value: 'end', label: 'End' },
  { value: 'drive', label: 'Drive end' },
  { value: 'side', label: 'Side' },
  { value: 'bank', label: 'Bank' },
  { value: 'top', label: 'Top' },
]
