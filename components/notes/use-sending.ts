'use client'

import { useRef, useState } from 'react'
import { Refusal } from '@/lib/contracts/call'
import { refusalWords } from './refusal-words'

/**
 * Sends one thing at a time and keeps what was said against it; what was typed is the caller's and stays. The key is the
 * same until an answer has come: what may have been carried out is not carried out twice.
 */
export function useSending() {
  const key = useRef<string | null>(null)
  const [state, setState] = useState<{ busy: boolean; refused: string | null }>({
    busy: false,
    refused: null,
  })
  return {
    ...state,
    refuse: (refused: string | null) => setState({ busy: false, refused }),
    async send(what: (key: string) => Promise<unknown>, done?: () => void) {
      setState({ busy: true, refused: null })
      try {
        await what((key.current ??= crypto.randomUUID()))
        key.current = null
        setState({ busy: false, refused: null })
        done?.()
      } catch (error) {
        if (!(error instanceof Refusal && error.status === 0)) key.current = null
        setState({ busy: false, refused: refusalWords(error) })
      }
    },
  }
}
