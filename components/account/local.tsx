'use client'

import { useSyncExternalStore } from 'react'

const never = () => () => {}

/** Words that only the reader's own browser can say, such as a time in their zone: the server leaves them out. */
export function Local({ write }: { write(): string }) {
  return useSyncExternalStore(never, write, () => '…')
}
