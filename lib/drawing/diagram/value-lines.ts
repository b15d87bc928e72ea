import type { CaseRecord } from '@/lib/study/document/case-records'
import type { GeneratorLevel } from '@/lib/study/document/generator-level'
import type { SupplyRecord } from '@/lib/study/document/network-records'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { levelText } from '@/lib/study/words/level-text'
import type { Branch, Device } from './network-tree'

/** The words of one value sheet: the tag, and the values a line each, the weightiest first. */
export interface ValueLines {
  tag: string
  lines: readonly string[]
}

/** `0.27 + j 0.36 Ω/km`: the unit once where both parts were typed in the same. */
export const complexText = (real: string, imaginary: string): string => {
  const unit = /[^\d.,\s].*$/
  const shared = unit.exec(real)?.[0] === unit.exec(imaginary)?.[0]
  return `${shared ? real.replace(unit, '').trim() : real} + j ${imaginary}`
}

const factor = (supply: SupplyRecord): string => {
  if (supply.voltageFactor.kind === 'other') return `c ${supply.voltageFactor.value.text}`
  return supply.voltageFactor.kind === 'unknown' ? 'c unknown' : `c ${supply.voltageFactor.kind}`
}

const generatorReactances = ({ subtransient, transient }: GeneratorLevel): string =>
  [...(subtransient ? [`X″ ${subtransient.reactance.text}`] : []), `X′ ${transient.text}`].join(', ')

export const supplyLines = (supply: SupplyRecord): ValueLines => {
  const { level } = supply
  const stated =
    level.form === 'impedance' ? complexText(level.resistance.text, level.reactance.text) : levelText(supply)
  const before = supply.before.voltage.text
  return {
    tag: `Supply, ${supply.tag}`,
    lines: [
      `${stated} at ${supply.statedAt.text}`,
      level.form === 'generator'
        ? generatorReactances(level)
        : [factor(supply), ...(supply.xOverR ? [`X/R ${supply.xOverR.text}`] : [])].join(', '),
      supply.before.kind === 'bus-voltage' ? `${before} before the start` : `open circuit ${before}`,
    ],
  }
}

export const branchLines = (branch: Branch): ValueLines => {
  if (branch.kind === 'transformer') {
    const { record } = branch
    return {
      tag: record.tag,
      lines: [
        [record.rating.text, record.vectorGroup].filter(Boolean).join(', '),
        `${record.fromVoltage.text} / ${record.toVoltage.text}`,
        `Z ${record.impedance.text}, X/R ${record.xOverR.text}`,
        ...(record.tap.si === 0 ? [] : [`tap ${record.tap.text}`]),
      ],
    }
  }
  const { record } = branch
  const parallel = record.parallel > 1 ? `, ${record.parallel} parallel` : ''
  return {
    tag: record.tag,
    lines: [
      `${record.length.text} ${record.kind}${parallel}`,
      complexText(record.resistance.text, record.reactance.text),
    ],
  }
}

/** What a case does with a device; empty when the diagram shows the records alone. */
const duty = (document: StudyDocument, device: Device, one: CaseRecord | undefined): readonly string[] => {
  if (!one) return []
  const condition = document.plant.plantConditions.find((each) => each.id === one.plantCondition)
  const { id } = device.record
  if (device.kind === 'capacitor') return [condition?.capacitors.includes(id) ? 'in service' : 'off']
  if (device.kind === 'load') return condition?.loadsOff.includes(id) ? ['off'] : []
  const start = document.schedules.find((each) => each.id === one.schedule)?.starts.find((each) => each.motor === id)
  const starter = document.plant.starters.find((each) => each.id === start?.starter)
  if (start) return [`starts: ${starter?.tag ?? ''}`]
  return [condition?.running.some((each) => each.motor === id) ? 'runs before the start' : 'at rest']
}

export const deviceLines = (document: StudyDocument, device: Device, one: CaseRecord | undefined): ValueLines => {
  const then = duty(document, device, one)
  switch (device.kind) {
    case 'motor': {
      const { record } = device
      const current = record.lockedRotorCurrent
      return {
        tag: record.tag,
        lines: [
          `${record.ratedPower.text}, ${record.ratedVoltage.text}`,
          ...(current ? [`locked rotor ${current.text}`] : []),
          record.ratedSpeed.text,
          ...then,
        ],
      }
    }
    case 'load': {
      const { record } = device
      return {
        tag: record.tag,
        lines: [complexText(record.active.text, record.reactive.text), `at ${record.ratedVoltage.text}`, ...then],
      }
    }
    case 'capacitor': {
      const { record } = device
      return { tag: record.tag, lines: [`${record.rating.text} at ${record.ratedVoltage.text}`, ...then] }
    }
  }
}
