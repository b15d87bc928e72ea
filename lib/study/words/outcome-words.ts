import type { CaseOutcome, RunningOutcome, StartOutcome } from '../../engine/case-result'
import { printQuantity } from '../../quantity/print-quantity'
import { listed } from './list-words'

const speed = (value: number): string => printQuantity(value, 'speed', { decimals: 0 })
const torque = (value: number): string => printQuantity(value, 'torque', { digits: 3 })
const seconds = (value: number): string => printQuantity(value, 'time', { unit: 's', decimals: 2 })

/** How a start ended, in a few words for a table. */
export const startOutcomeWords: Record<StartOutcome['kind'], string> = {
  started: 'started',
  'not-transferred': 'not transferred',
  'below-criterion': 'below the speed criterion',
  stalled: 'stalled',
  'never-turned': 'never turned',
  'timed-out': 'timed out',
  tripped: 'tripped',
  abandoned: 'abandoned',
}

const tripCauses: Record<Extract<StartOutcome, { kind: 'tripped' }>['cause'], string> = {
  contactor: 'the voltage falls below what its contactor holds in at',
  undervoltage: 'the line voltage falls below the undervoltage level of its drive',
  protection: 'the relay of its feeder operates',
}

/** How a start ended, in one sentence about the motor. */
export const startOutcomeSentence = (outcome: StartOutcome, motor: string): string => {
  switch (outcome.kind) {
    case 'started':
      return `${motor} is at speed and in its running connection after ${seconds(outcome.at)}.`
    case 'not-transferred':
      return `${motor} hangs at ${speed(outcome.speed)} on its reduced voltage: the condition for the change-over is never met.`
    case 'below-criterion':
      return `${motor} settles at ${speed(outcome.speed)}, below the speed criterion.`
    case 'stalled':
      return `${motor} stalls at ${speed(outcome.speed)}; ${torque(outcome.missing)} are missing to go on.`
    case 'never-turned':
      return `${motor} does not turn; ${torque(outcome.missing)} are missing to break away.`
    case 'timed-out':
      return `${motor} is at ${speed(outcome.speed)} when the time limit ends the start.`
    case 'abandoned':
      return `${motor} is switched off ${seconds(outcome.at)} after its switching-on, at ${speed(outcome.speed)}, before it has started.`
    case 'tripped': {
      return `${motor} is switched off ${seconds(outcome.at)} after its switching-on, at ${speed(outcome.speed)}: ${tripCauses[outcome.cause]}.`
    }
  }
}

/** How a running machine came through, in one sentence. */
export const runningOutcomeSentence = (outcome: RunningOutcome, motor: string): string => {
  switch (outcome.kind) {
    case 'rode-through':
      return `${motor} rides through.`
    case 'pulled-out':
      return `${motor} pulls out ${seconds(outcome.at)} after the first switching-on.`
    case 'no-equilibrium':
      return `${motor} has no steady speed before the start.`
    case 'dropped-out':
      return `${motor} loses its contactor ${seconds(outcome.at)} into the run and stays off.`
    case 're-accelerated':
      return `${motor} loses its contactor at ${seconds(outcome.droppedAt)}, is back on at ${seconds(outcome.reclosedAt)} and re-accelerates.`
  }
}

const refusedCauses: Record<Extract<CaseOutcome, { kind: 'refused' }>['cause'], string> = {
  island: 'some buses have no way to the supply',
  'no-supply': 'the supply is at a bus that does not exist',
  'zero-impedance-loop': 'branches without impedance form a loop',
  'unlike-groups': 'transformers with unlike vector groups stand in parallel',
  'bad-value': 'a value cannot be computed with',
}

/** How a case as a whole ended; names turn bus identities into tags. */
export const caseOutcomeSentence = (outcome: CaseOutcome, busName: (id: string) => string): string => {
  switch (outcome.kind) {
    case 'complete':
      return 'The run is complete.'
    case 'collapsed':
      return `The voltage collapses at ${busName(outcome.busId)} ${seconds(outcome.at)} after the first switching-on: the network has no solution from then on.`
    case 'no-load-flow':
      return outcome.busId === null
        ? 'The network has no solution before the start.'
        : `The network has no solution before the start; ${busName(outcome.busId)} is the weakest place.`
    case 'refused': {
      const where = outcome.buses.length > 0 ? ` (${listed(outcome.buses.map(busName))})` : ''
      return `The case cannot be set up: ${refusedCauses[outcome.cause]}${where}. ${outcome.detail}`.trim()
    }
  }
}
