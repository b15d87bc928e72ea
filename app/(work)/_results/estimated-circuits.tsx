import type { InductionCircuit } from '@/lib/engine/case-input'
import { formatNumber } from '@/lib/quantity/format-number'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { circuitEstimator } from '@/lib/study/to-engine/circuit-input'
import { contradictionSentence, plateNotMetSentence } from '@/lib/study/words/plate-words'
import { Notice } from '@/lib/ui/notice'
import { FigureTable } from './figure-table'

const ohms = (value: number): string => `${formatNumber(value, { digits: 4 })}\u2009Ω`

const cageRow = (circuit: InductionCircuit, index: number): string => {
  const cage = circuit.cages[index]
  return cage ? `${ohms(cage.resistance)} + j${ohms(cage.reactance)}` : '–'
}

/** Circuits that were fitted to a nameplate: what came out, and what is left over against each plate figure. */
export function EstimatedCircuits({ document }: { document: StudyDocument }) {
  const motors = document.plant.motors.filter(({ circuit }) => circuit.kind === 'estimated')
  if (motors.length === 0) return null
  const estimate = circuitEstimator(document.frequency.si)
  const outcomes = motors.map((motor) => ({ motor, outcome: estimate(motor) }))
  const estimated = outcomes.flatMap(({ motor, outcome }) =>
    outcome.kind === 'estimated' ? [{ motor, ...outcome }] : [],
  )
  const quantities = [...new Set(estimated.flatMap(({ residuals }) => residuals.map(({ quantity }) => quantity)))]
  return (
    <section aria-labelledby="estimated" className="flex flex-col gap-2">
      <h2 id="estimated" className="m-0 text-title font-semibold">
        Circuits estimated from the nameplate
      </h2>
      {outcomes.map(({ motor, outcome }) =>
        outcome.kind === 'refused' ? (
          <Notice key={motor.id} tone="caution">
            {motor.tag}: {outcome.detail}
          </Notice>
        ) : null,
      )}
      {estimated.flatMap(({ motor, contradictions, flags }) => [
        ...contradictions.map((kind) => (
          <Notice key={`${motor.id}-${kind}`} tone="caution">
            {contradictionSentence[kind](motor.tag)}
          </Notice>
        )),
        ...(flags.some(({ kind }) => kind === 'not-met')
          ? [
              <Notice key={`${motor.id}-not-met`} tone="caution">
                {plateNotMetSentence(motor.tag)}
              </Notice>,
            ]
          : []),
      ])}
      <FigureTable
        caption="Star circuit, ohm per phase, rotor referred to the stator"
        items={estimated}
        itemId={({ motor }) => motor.id}
        name={({ motor }) => motor.tag}
        rows={[
          { label: 'Stator', print: ({ circuit }) => `${ohms(circuit.stator.re)} + j${ohms(circuit.stator.im)}` },
          { label: 'Magnetising reactance', print: ({ circuit }) => ohms(circuit.magnetising) },
          {
            label: 'Core-loss resistance',
            print: ({ circuit }) => (circuit.core === null ? 'left out' : ohms(circuit.core)),
          },
          { label: 'First cage', print: ({ circuit }) => cageRow(circuit, 0) },
          { label: 'Second cage', print: ({ circuit }) => cageRow(circuit, 1) },
          ...quantities.map((quantity) => ({
            label: `Left over: ${quantity.replaceAll('-', ' ')}, circuit against plate`,
            print: ({ residuals }: (typeof estimated)[number]) => {
              const found = residuals.find((one) => one.quantity === quantity)
              return found ? `${formatNumber(100 * found.residual, { decimals: 3 })}\u2009%` : '–'
            },
          })),
        ]}
      />
      <p className="m-0 max-w-4xl text-label text-soft">
        A nameplate does not fix the run-up. Each start is computed with every circuit that meets the plate; the range
        stands with the starting motors, and the verdict is that of the worst. Ask the maker for the torque-speed curve.
      </p>
    </section>
  )
}
