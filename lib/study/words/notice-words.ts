import type { Notice } from '../../engine/case-result'
import type { UnfitCause } from '../../engine/dynamic/chosen-model'
import { printQuantity } from '../../quantity/print-quantity'
import type { StudyDocument } from '../document/study-document'
import { loadTag, motorTag } from './tags'

const unfitCauses: Record<UnfitCause, string> = {
  'several-starts': 'more than one motor starts',
  device: 'it takes direct starts without switched capacitors',
  machine:
    'the machine is known by curves, typed torque or exponents of saturation, or a reactance of its rotor is zero',
  network: 'to the motor the network is no resistance and inductance in series',
  schedule: 'a dip, repeated attempts or contactors are in the schedule',
  shaft: 'two motors turn one shaft',
  'no-start': 'no motor is switched on',
  trip: 'the start is switched off before it is over',
}

/** What the calculation noticed in a case and a reader must know, in one sentence. */
export const noticeSentence = (notice: Notice, document: StudyDocument): string => {
  switch (notice.kind) {
    case 'reduced-voltage-torque':
      return `${motorTag(document, notice.motorId)} starts at ${printQuantity(notice.voltage, 'ratio', { unit: '%', digits: 3 })} of its rated voltage: torque taken as the square of voltage is optimistic there; the start was computed again with the exponent 2.25.`
    case 'change-over-too-early':
      return `${motorTag(document, notice.motorId)} changes over while its slip is above breakdown: the current and the dip after the change-over are near those of a direct start.`
    case 'not-switched-on':
      return `${motorTag(document, notice.motorId)} is not switched on: it waits for ${motorTag(document, notice.waitsFor)}, which does not start.`
    case 'stage-below-offset':
      return `A stage of the relay of ${motorTag(document, notice.motorId)} without delay is set at ${printQuantity(notice.pickUp, 'current', { unit: 'A', digits: 3 })}; the first cycles bring up to ${printQuantity(notice.offset, 'current', { unit: 'A', digits: 3 })} with their direct-current part (peak over √2). A relay that does not filter it may trip on switching-on.`
    case 'residual-voltage-not-modelled':
      return 'The supply is away for a time. Motors that still turn hold a voltage of their own when it comes back; closing on it is not in this model and can draw more current and torque than a start.'
    case 'starter-duty-exceeded':
      return `${motorTag(document, notice.motorId)} asks more of its starting device than its duty allows: ${printQuantity(notice.time, 'time', { unit: 's', decimals: 1 })} outside the running position, or more starts an hour.`
    case 'open-transition-without-transient':
      return `${motorTag(document, notice.motorId)} changes over with a gap; the transient on reclosing is not in this model.`
    case 'levels-motors-taken-out':
      return `The stated short-circuit level contains the plant's motors; without them it is ${printQuantity(notice.level, 'apparent-power', { digits: 4 })}, which was computed with.`
    case 'cuts-in':
      return `${motorTag(document, notice.motorId)} is switched on while it turns near synchronous speed: its first periods are those of the transient model; steady circuits show only where they lead.`
    case 'transient-model-unfit':
      return `The fifth-order model does not fit this case (${unfitCauses[notice.cause]}): its numbers are quasi-static.`
    case 'prime-mover-overloaded':
      return `The generator is asked for ${printQuantity(notice.share, 'ratio', { unit: '%', digits: 3 })} of the largest power of its prime mover, at ${printQuantity(notice.at, 'time', { unit: 's', decimals: 2 })}: its speed falls as long as that lasts.`
    case 'excitation-at-ceiling':
      return `The excitation of the generator is at its ceiling for ${printQuantity(notice.time, 'time', { unit: 's', decimals: 2 })}: the regulator cannot raise the voltage further there.`
    case 'transfer-within-residual':
      return `The plant comes on the other supply after ${printQuantity(notice.deadTime, 'time', { unit: 's', decimals: 2 })}, before the residual voltage of its motors has decayed (${printQuantity(notice.decayTime, 'time', { unit: 's', decimals: 2 })}): current and torque of that closing are not assessed and can exceed those of a start.`
    case 'load-below-floor':
      return `Load ${loadTag(document, notice.loadId)} is below its voltage floor from ${printQuantity(notice.at, 'time', { unit: 's', decimals: 2 })} on and counts as constant impedance there.`
  }
}
