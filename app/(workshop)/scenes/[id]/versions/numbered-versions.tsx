'use client'

import type { ComponentProps } from 'react'
import { rowNumber } from '@/components/bench/row-number'
import { VersionRegister } from '@/components/versions/version-register'
import type { Scene } from '@/scene/model/scene'

type Props = Omit<ComponentProps<typeof VersionRegister>, 'numberOf'> & {
  /** Whose parts list gives the numbers. */
  latest: Scene
}

/** Changes carry the numbers of the parts list, which is the bench's. */
export const NumberedVersions = ({ latest, ...props }: Props) => (
  <VersionRegister {...props} numberOf={(change) => rowNumber(change, latest)} />
)
