import type { ChangeOverResult, RunningResult } from '@/lib/engine/case-result'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { CaseSummary } from '@/lib/study/summary'
import { changeOverTargetWords } from '@/lib/study/words/change-over-words'
import { busTag, motorTag } from '@/lib/study/words/tags'
import { FigureTable } from './figure-table'
import { activePower, current, orDash, percent, perUnit, reactivePower, seconds, speed, voltage } from './print'

interface Running {
  motorId: string
  running: RunningResult
  ratedVoltage: number
}

const outcomes: Record<RunningResult['outcome']['kind'], string> = {
  'rode-through': 'rode through',
  'pulled-out': 'pulled out',
  'dropped-out': 'dropped out, stays off',
  're-accelerated': 'dropped out, re-accelerates',
  'no-equilibrium': 'no steady speed before the start',
}

/** How the machines that were running came through the start. */
export function RunningTable({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  const items = result.motors.flatMap(({ motorId, running }): Running[] => {
    const ratedVoltage = document.plant.motors.find(({ id }) => id === motorId)?.ratedVoltage.si ?? Number.NaN
    return running ? [{ motorId, running, ratedVoltage }] : []
  })
  const ofRated = (value: number, { ratedVoltage }: Running) =>
    `${voltage(value)}, ${perUnit(value / ratedVoltage)} of rated`
  return (
    <FigureTable
      caption="Running motors"
      items={items}
      itemId={({ motorId }) => motorId}
      name={({ motorId }) => motorTag(document, motorId)}
      rows={[
        { label: 'Outcome', print: ({ running }) => outcomes[running.outcome.kind] },
        {
          label: 'Terminal voltage before the start',
          print: (item) => ofRated(item.running.before.motorVoltage, item),
        },
        { label: 'Current before the start', print: ({ running }) => current(running.before.motorCurrent) },
        { label: 'Speed before the start', print: ({ running }) => speed(running.before.speed) },
        {
          label: 'Lowest terminal voltage',
          print: (item) =>
            `${ofRated(item.running.lowestVoltage.voltage, item)}, at ${seconds(item.running.lowestVoltage.at)}`,
        },
        {
          label: 'Lowest speed',
          print: ({ running }) => `${speed(running.lowestSpeed.speed)} at ${seconds(running.lowestSpeed.at)}`,
        },
        {
          label: 'Largest current',
          print: ({ running }) => `${current(running.peakCurrent.current)} at ${seconds(running.peakCurrent.at)}`,
        },
        { label: 'Settled speed', print: ({ running }) => orDash(running.settledSpeed, speed) },
      ]}
    />
  )
}

interface ChangeOver {
  key: string
  change: ChangeOverResult
}

/** The instants at which starting devices moved on, and what the supply saw just after. */
export function ChangeOverTable({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  const place = result.places.findIndex(({ busId }) => busId === result.supply?.busId)
  const at = result.places[place]
  const items = result.changeOvers.map(
    (change): ChangeOver => ({ key: `${change.motorId}-${change.to}-${change.at}`, change }),
  )
  return (
    <FigureTable
      caption="Change-overs"
      items={items}
      itemId={({ key }) => key}
      name={({ change }) => `${motorTag(document, change.motorId)}: ${changeOverTargetWords[change.to]}`}
      rows={[
        { label: 'After the first switching-on', print: ({ change }) => seconds(change.at) },
        { label: 'Speed', print: ({ change }) => speed(change.speed) },
        { label: 'Line current just after', print: ({ change }) => current(change.state.lineCurrent) },
        { label: 'Motor current just after', print: ({ change }) => current(change.state.motorCurrent) },
        { label: 'Terminal voltage just after', print: ({ change }) => voltage(change.state.motorVoltage) },
        {
          label: `Change at ${at ? busTag(document, at.busId) : 'the supply'} just after, % of the voltage before the start`,
          print: ({ change }) => {
            const after = change.busVoltages[place]
            return at && after !== undefined ? percent((at.before - after) / at.before) : '–'
          },
        },
        {
          label: 'Slip at the change-over',
          print: ({ change }) => (change.tooEarly ? 'above breakdown: too early' : 'below breakdown'),
        },
      ]}
    />
  )
}

/** The source as it was computed with. */
export function SupplyTable({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  const { supply } = result
  if (!supply) return null
  return (
    <FigureTable
      caption="Supply"
      items={[supply]}
      itemId={({ busId }) => busId}
      name={({ busId }) => busTag(document, busId)}
      rows={[
        {
          label: 'Source impedance per phase, voltage factor applied',
          print: ({ impedance }) => `${impedance.re.toFixed(4)} + j${impedance.im.toFixed(4)}\u2009Ω`,
        },
        { label: 'Source voltage behind it (EMF)', print: ({ emf }) => voltage(emf) },
        {
          label: 'Power delivered before the start',
          print: ({ powerBefore }) => `${activePower(powerBefore.re)}, ${reactivePower(powerBefore.im)}`,
        },
      ]}
    />
  )
}
