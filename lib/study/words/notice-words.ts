import type { Notice } from '../../engine/case-result'
import { printQuantity } from '../../quantity/print-quantity'
import type { StudyDocument } from '../document/study-document'
import { loadTag, motorTag } from './tags'

/** What the calculation noticed in a case and a reader must know, in one sentence. */
export const noticeSentence = (notice: Notice, document: StudyDocument): string => {
  switch (notice.kind) {
    case 'reduced-voltage-torque':
      return `${motorTag(document, notice.motorId)} starts at ${printQuantity(notice.voltage, 'ratio', { unit: '%', digits: 3 })} of its rated voltage: torque taken as the square of voltage is optimistic there; the start was computed again with the exponent 2.25.`
    case 'change-over-too-early':
      return `${motorTag(document, notice.motorId)} changes over while its slip is above breakdown: the current and the dip after the change-over are near those of a direct start.`
    case 'not-switched-on':
      return `${motorTag(document, notice.motorId)} is not switched on: it waits for ${motorTag(document, notice.waitsFor)}, which does not start.`
    case 'residual-voltage-not-modelled':
      return 'The supply is away for a time. Motors that still turn hold a voltage of their own when it comes back; closing on it is not in this model and can draw more current and torque than a start.'
    case 'starter-duty-exceeded':
      return `${motorTag(document, notice.motorId)} asks more of its starting device than its duty allows: ${printQuantity(notice.time, 'time', { unit: 's', decimals: 1 })} outside the running position, or more starts an hour.`
    case 'open-transition-without-transient':
      return `${motorTag(document, notice.motorId)} changes over with a gap; the transient on reclosing is not in this model.`
    case 'levels-motors-taken-out':
      return `The stated short-circuit level contains the plant's motors; without them it is ${printQuantity(notice.level, 'apparent-power', { digits: 4 })}, which was computed with.`
    case 'load-below-floor':
      return `Load ${loadTag(document, notice.loadId)} is below its voltage floor from ${printQuantity(notice.at, 'time', { unit: 's', decimals: 2 })} on and counts as constant impedance there.`
  }
}
