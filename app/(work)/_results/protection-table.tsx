import type { StartResult } from '@/lib/engine/case-result'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { startsAllowedIn } from '@/lib/study/starts-allowed'
import type { CaseSummary } from '@/lib/study/summary'
import { elementName, startsAllowedPhrase } from '@/lib/study/words/protection-words'
import { motorTag } from '@/lib/study/words/tags'
import { type FigureRow, FigureTable } from './figure-table'
import { current, orDash, percent, seconds } from './print'
import type { Results } from './results'

type Protection = NonNullable<StartResult['protection']>

interface Item {
  key: string
  name: string
  motorId: string
  start: StartResult
}

interface ProtectedItem extends Item {
  protection: Protection
  /** Names of the elements, in their order. */
  elements: readonly string[]
}

const itemsOf = (document: StudyDocument, result: CaseSummary): readonly Item[] =>
  result.motors.flatMap(({ motorId, start, earlierAttempts }) => {
    const all = start ? [...(earlierAttempts ?? []), start] : []
    const tag = motorTag(document, motorId)
    return all.map((one, i) => ({
      key: `${motorId} ${i}`,
      name: all.length > 1 ? `${tag}, attempt ${i + 1}` : tag,
      motorId,
      start: one,
    }))
  })

/** Figures of every element that has one, by its name. */
const byElement = (
  { protection, elements }: ProtectedItem,
  print: (element: Protection['elements'][number]) => string | null,
): string => {
  const texts = protection.elements.flatMap((element, k) => {
    const text = print(element)
    return text === null ? [] : [`${elements[k] ?? element.kind} ${text}`]
  })
  return texts.length === 0 ? '–' : texts.join('; ')
}

const rows: readonly FigureRow<ProtectedItem>[] = [
  { label: 'Started, without a trip', print: ({ protection }) => orDash(protection.startedAt, seconds) },
  {
    label: 'Operates at',
    print: (item) => byElement(item, ({ operatesAt }) => (operatesAt === null ? null : seconds(operatesAt))),
  },
  {
    label: 'Least time to a trip during the start, each element',
    print: (item) =>
      byElement(item, ({ least }) => (least === null ? null : `${seconds(least.time)} at ${seconds(least.at)}`)),
  },
  { label: 'Least time to a trip, all elements', print: ({ protection }) => orDash(protection.tripMargin, seconds) },
  {
    label: 'Rotor held at this voltage: motor current',
    print: ({ protection }) => current(protection.lockedRotor.current),
  },
  { label: 'Rotor held: trip', print: ({ protection }) => orDash(protection.lockedRotor.trip, seconds) },
  {
    label: 'Rotor held: permissible time',
    print: ({ protection }) => orDash(protection.lockedRotor.permissible, seconds),
  },
  {
    label: 'Rotor held: permissible time less trip',
    print: ({ protection }) => orDash(protection.lockedRotor.margin, seconds),
  },
  {
    label: 'Thermal limit curve: least time behind a trip',
    print: ({ protection: { limitCurve } }) =>
      limitCurve ? `${orDash(limitCurve.margin, seconds)} at ${current(limitCurve.current)}` : '–',
  },
  {
    label: 'Heat of the thermal image, before and after',
    print: (item) =>
      byElement(item, ({ heat }) => (heat ? `${percent(heat.before, 1)}, ${percent(heat.after, 1)}` : null)),
  },
  {
    label: 'Released by the thermal image',
    print: (item) =>
      byElement(item, ({ heat, inhibitedFor }) => {
        if (!heat) return null
        return inhibitedFor === undefined ? 'yes' : `not for another ${seconds(inhibitedFor)}`
      }),
  },
]

/** How the relays of a case take its starts, with what the comparison is not. */
export function ProtectionTable({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  const items = itemsOf(document, result).flatMap((item): ProtectedItem[] => {
    const { protection } = item.start
    const record = document.plant.motors.find(({ id }) => id === item.motorId)?.protection
    return protection ? [{ ...item, protection, elements: (record?.elements ?? []).map(elementName) }] : []
  })
  if (items.length === 0) return null
  return (
    <div className="flex flex-col gap-1">
      <FigureTable
        caption="Relay against start and thermal limit"
        items={items}
        itemId={({ key }) => key}
        name={({ name }) => name}
        rows={rows}
      />
      <p className="m-0 max-w-4xl text-dense text-soft">
        A start that ends before the trip shows that a start is possible. Settings are the work of a licensed engineer
        with local codes, the data of the makers of relay and motor, and the tolerances of both, which are not in these
        times.
      </p>
    </div>
  )
}

/** Heat that the starts of a case leave, and the starts an hour that all sources allow. */
export function HeatTable({ results, result }: { results: Results; result: CaseSummary }) {
  const { document, summary } = results
  const allowed = startsAllowedIn(document, summary, result)
  const heatRows: readonly FigureRow<Item>[] = [
    {
      label: 'Heat of the start, of what a locked rotor may bring',
      print: ({ start }) => orDash(start.heatBalance?.ofStart, percent),
    },
    {
      label: 'Heat before and after',
      print: ({ start: { heatBalance } }) =>
        heatBalance ? `${percent(heatBalance.before, 1)}, ${percent(heatBalance.after, 1)}` : '–',
    },
    {
      label: 'Starts in succession by heat, from cold and from hot',
      print: ({ start: { heatBalance } }) =>
        heatBalance?.inSuccession ? `${heatBalance.inSuccession.cold}, ${heatBalance.inSuccession.hot ?? '–'}` : '–',
    },
    {
      label: 'Standstill before the same start fits again',
      print: ({ start }) => orDash(start.heatBalance?.restBeforeNext, seconds),
    },
    { label: 'Starts an hour by heat', print: ({ start }) => orDash(start.heatBalance?.perHour, String) },
    {
      label: 'Starts an hour allowed',
      print: ({ motorId }) => {
        const found = allowed.find((one) => one.motorId === motorId)
        return found ? startsAllowedPhrase(found.allowed) : '–'
      },
    },
  ]
  return (
    <FigureTable
      caption="Heat and number of starts"
      items={itemsOf(document, result)}
      itemId={({ key }) => key}
      name={({ name }) => name}
      rows={heatRows}
    />
  )
}
