'use client'

import { createContext } from 'react'
import type { Stamp } from '@/lib/tables/table'

/** Where the figures on this page come from, asked at the moment a file is written. */
export const StampContext = createContext<() => Stamp>(() => ({}))
