'use client'

import { LeafSection } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import { SpeedWords } from '@/components/figures/speed-words'
import { DataTable } from '@/components/ui/data-table'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { rodCouples } from '@/lib/mechanics/loads/rod-couples'
import { methodLimits } from '@/lib/mechanics/method'
import { toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import { DEGREES, quantityAxis } from '@/components/figures/axis'

/** What the figures of the leaf assume, and how far the two-mass rod would be off. */
export function MethodSection({ parts }: { parts: CycleParts }) {
  const { speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const { cylinders } = parts.train
  const couples = rodCouples(parts, toSi(speedRpm, 'rpm'))
  const largest = (values: number[]) => Math.max(0, ...values.map(Math.abs))
  const inertia = quantityAxis('', 'inertia', largest(couples.map((one) => one.inertia)), system)
  const torque = quantityAxis('', 'torque', largest(couples.map(({ peak }) => peak)), system)
  return (
    <LeafSection title="Method" at={<SpeedWords />} wide>
      <p>
        {methodLimits} Each main carries its neighbouring throws by the lever rule, as if the crank were
        hinged at every main.
      </p>
      {couples.length > 0 ? (
        <>
          <p className="say">
            {couples.length === cylinders.length ? 'The rods’' : 'Some rods’'} own inertia is entered, so they
            are rigid bodies here. Two masses at their ends would leave out this couple on each rod:
          </p>
          <DataTable
            table={{
              title: 'What two masses for a rod leave out',
              columns: [
                { name: 'Rod', unit: '' },
                inertia.column('Inertia entered'),
                inertia.column('Of two masses'),
                inertia.column('Difference'),
                torque.column('Couple, most'),
                { name: 'at', unit: '°', decimals: 0 },
              ],
              rows: couples.map((one) => [
                cylinders[one.cylinder].id,
                inertia.shown(one.inertia),
                inertia.shown(one.twoMass),
                inertia.shown(one.error),
                torque.shown(one.peak),
                one.peakAngle * DEGREES,
              ]),
            }}
            page={12}
          />
        </>
      ) : (
        <p className="say">
          No rod’s own inertia is entered: each rod is two masses at its ends. Enter it in the parts list to
          see what couple that leaves out.
        </p>
      )}
      <Caution />
    </LeafSection>
  )
}
