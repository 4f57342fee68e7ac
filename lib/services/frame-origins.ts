import { read } from '@/db/client'
import { framesOf } from '@/db/queries/share-links'
import { hashToken } from '@/lib/auth/tokens'

/** The sites that may frame what stands behind this token: none where nothing does, or nothing any more. */
export const frameOrigins = (token: string): Promise<string[]> => read((tx) => framesOf(tx, hashToken(token)))
