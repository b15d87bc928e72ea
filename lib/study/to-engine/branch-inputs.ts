import type { LineInput, TransformerInput } from '../../engine/case-input'
import { ohm, siemens } from '../../units/si'
import type { CaseRecord, PlantConditionRecord } from '../document/case-records'
import type { LineRecord, TransformerRecord } from '../document/network-records'
import { changesOf } from './case-changes'
import { impedanceByAngle } from './impedance-by-angle'
import { lagOfGroup } from './vector-group'

/** Ratio and impedance in ohm on the to side, with the tap of the plant condition and the changes of the case. */
export const transformerInput = (
  transformer: TransformerRecord,
  condition: PlantConditionRecord,
  record: CaseRecord,
): TransformerInput => {
  const { id, from, to, fromVoltage, toVoltage, rating } = transformer
  const mine = ({ transformer }: { transformer: string }) => transformer === id
  const tap = condition.taps.find(mine)?.tap ?? transformer.tap
  const impedance = changesOf(record, 'transformer-impedance').findLast(mine)?.impedance ?? transformer.impedance
  const lag = lagOfGroup(transformer.vectorGroup)
  return {
    id,
    name: transformer.tag,
    fromBusId: from,
    toBusId: to,
    ratio: (fromVoltage.si * (1 + tap.si)) / toVoltage.si,
    impedance: impedanceByAngle((impedance.si * toVoltage.si ** 2) / rating.si, transformer.xOverR.si),
    // The group is named from the side of the higher voltage.
    ...(lag === null ? {} : { lag: fromVoltage.si >= toVoltage.si ? lag : -lag }),
  }
}

/** A line with its parallel conductors put together. */
export const lineInput = (line: LineRecord): LineInput => {
  const { id, from, to, resistance, reactance, susceptance, length, parallel } = line
  return {
    id,
    fromBusId: from,
    toBusId: to,
    impedance: { re: ohm((resistance.si * length.si) / parallel), im: ohm((reactance.si * length.si) / parallel) },
    susceptance: siemens((susceptance?.si ?? 0) * length.si * parallel),
  }
}
