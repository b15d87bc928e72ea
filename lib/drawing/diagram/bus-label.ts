import type { BusRecord } from '@/lib/study/document/network-records'
import { type SceneItem, text } from '../scene'
import { textWidth } from '../text-width'
import { wrapText } from '../wrap-text'
import type { Detail } from './value-sheet'

const size = 2.6
const small = 2.3
const leading = 2.9
const widest = 36

export interface BusLabel {
  width: number
  height: number
  /** Items with the foot of the label at y. */
  items: (x: number, y: number) => readonly SceneItem[]
}

/** Tag and nominal voltage of a bus, and beneath them its name, where there is room for it, and a note. */
export const busLabel = (bus: BusRecord, detail: Detail, note = ''): BusLabel => {
  const tag = wrapText(bus.tag, widest, size, 'semibold')
  const last = tag.at(-1) ?? ''
  const offset = textWidth(last, size, 'semibold') + 1
  const below = [...(bus.name === '' || detail === 'brief' ? [] : [bus.name]), ...(note === '' ? [] : [note])]
  const name = below.flatMap((one) => wrapText(one, widest, small))
  const lines = tag.length + name.length
  return {
    width: Math.max(
      ...tag.map((one) => textWidth(one, size, 'semibold')),
      ...name.map((one) => textWidth(one, small)),
      offset + textWidth(bus.nominal.text, small),
    ),
    height: lines * leading,
    items: (x, y) => {
      const baseline = (i: number) => y - (lines - 1 - i) * leading - 0.7
      return [
        ...tag.map((one, i) => text(x, baseline(i), one, { size, weight: 'semibold' })),
        text(x + offset, baseline(tag.length - 1), bus.nominal.text, { size: small, ink: 'soft' }),
        ...name.map((one, i) => text(x, baseline(tag.length + i), one, { size: small, ink: 'soft' })),
      ]
    },
  }
}
