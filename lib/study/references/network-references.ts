import type { FieldIssue } from '../../errors'
import type { StudyDocument } from '../document/study-document'
import { known, unless } from './issue'
import type { RecordIndex } from './record-index'

interface Branch {
  tag: string
  from: string
  to: string
}

const branches = (noun: string, list: string, records: readonly Branch[], index: RecordIndex): FieldIssue[] =>
  records.flatMap(({ tag, from, to }, i) => [
    ...known(index.buses, from, ['plant', list, i, 'from'], `${noun} ${tag}`, 'bus'),
    ...known(index.buses, to, ['plant', list, i, 'to'], `${noun} ${tag}`, 'bus'),
    ...unless(from !== to, ['plant', list, i, 'to'], `${noun} ${tag} begins and ends at the same bus; change one end.`),
  ])

const onBus = (
  noun: string,
  list: string,
  records: readonly { tag: string; bus: string }[],
  index: RecordIndex,
): FieldIssue[] =>
  records.flatMap(({ tag, bus }, i) => known(index.buses, bus, ['plant', list, i, 'bus'], `${noun} ${tag}`, 'bus'))

/** References between the records of the network. */
export const networkReferences = ({ plant }: StudyDocument, index: RecordIndex): FieldIssue[] => [
  ...onBus('Supply', 'supplies', plant.supplies, index),
  ...branches('Transformer', 'transformers', plant.transformers, index),
  ...branches('Line', 'lines', plant.lines, index),
  ...onBus('Load', 'loads', plant.loads, index),
  ...onBus('Capacitor', 'capacitors', plant.capacitors, index),
  ...onBus('Motor', 'motors', plant.motors, index),
  ...plant.drivenLoads.flatMap(({ tag, motor }, i) => [
    ...known(index.motors, motor, ['plant', 'drivenLoads', i, 'motor'], `Driven load ${tag}`, 'motor'),
    ...unless(
      plant.drivenLoads.findIndex((other) => other.motor === motor) === i,
      ['plant', 'drivenLoads', i, 'motor'],
      `The motor of driven load ${tag} already drives another one; put both into one driven load.`,
    ),
  ]),
]
