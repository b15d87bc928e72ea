import { Anchored } from '@/app/(work)/_comments/anchored'
import type { PlaceResult } from '@/lib/engine/case-result'
import type { RuleInstant } from '@/lib/engine/criteria/rule'
import { printAnchor } from '@/lib/study/anchors/anchor'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { relativeVoltage, voltageAt } from '@/lib/study/voltage-change'
import { changeReferenceNames, instantNames } from '@/lib/study/words/quantity-words'
import { busTag } from '@/lib/study/words/tags'
import { ScrollRegion } from '@/lib/ui/scroll-region'
import { percent, seconds, voltage } from './print'

const instants: readonly RuleInstant[] = ['first', 'deepest', 'settled-after-start', 'settled-after-process']
const references = ['change-of-before', 'change-of-nominal', 'remaining-of-nominal'] as const

/** Every place at every instant, against each of the three references. */
interface VoltageTableProps {
  document: StudyDocument
  caseId: string
  places: readonly PlaceResult[]
}

export function VoltageTable({ document, caseId, places }: VoltageTableProps) {
  return (
    <ScrollRegion label="Voltages" className="w-fit max-w-full border border-hair bg-sheet">
      <table className="dense">
        <caption className="px-2.5 pt-1.5 text-left font-semibold">Line voltage at each place</caption>
        <thead>
          <tr>
            <th scope="col">Place</th>
            <th scope="col">Instant</th>
            <th scope="col" className="number">
              Voltage
            </th>
            {references.map((reference) => (
              <th key={reference} scope="col" className="number">
                {changeReferenceNames[reference]}
              </th>
            ))}
            <th scope="col" className="number">
              after the first switching-on
            </th>
          </tr>
        </thead>
        {places.map((place) => (
          <tbody key={place.busId} className="border-b border-rule">
            <tr>
              <th scope="rowgroup" rowSpan={instants.length + 1}>
                {busTag(document, place.busId)}
                <span className="block font-normal text-soft">nominal {voltage(place.nominal)}</span>
              </th>
              <td>before the start</td>
              <td className="number">
                <Anchored on={printAnchor({ kind: 'voltage', caseId, busId: place.busId, instant: 'before' })}>
                  {voltage(place.before)}
                </Anchored>
              </td>
              <td className="number">–</td>
              <td className="number">–</td>
              <td className="number">{percent(place.before / place.nominal)}</td>
              <td className="number">–</td>
            </tr>
            {instants.map((instant) => (
              <Row key={instant} caseId={caseId} place={place} instant={instant} />
            ))}
          </tbody>
        ))}
      </table>
    </ScrollRegion>
  )
}

function Row({ caseId, place, instant }: { caseId: string; place: PlaceResult; instant: RuleInstant }) {
  const found = voltageAt(place, instant)
  const strong = instant === 'deepest' ? 'number font-semibold' : 'number'
  if (!found)
    return (
      <tr>
        <td>{instantNames[instant]}</td>
        <td colSpan={5} className="text-soft">
          not reached
        </td>
      </tr>
    )
  return (
    <tr>
      <td>{instantNames[instant]}</td>
      <td className={strong}>
        <Anchored on={printAnchor({ kind: 'voltage', caseId, busId: place.busId, instant })}>
          {voltage(found.voltage)}
        </Anchored>
      </td>
      {references.map((reference) => (
        <td key={reference} className={strong}>
          {percent(relativeVoltage(place, found.voltage, reference))}
        </td>
      ))}
      <td className="number">{found.at === null ? '–' : seconds(found.at)}</td>
    </tr>
  )
}
