import type { ChangeOverRecord, StarterRecord } from '../document/starter-record'

/** When a device goes on, behind a verb: “transfer at 980 r/min”. */
export const changeOverPhrase = (changeOver: ChangeOverRecord, verb: string): string => {
  switch (changeOver.kind) {
    case 'speed':
      return `${verb} at ${changeOver.at.text}`
    case 'time':
      return `${verb} after ${changeOver.at.text}`
    case 'current':
      return `${verb} when the current has fallen to ${changeOver.at.text}`
    case 'voltage':
      return `${verb} when the motor has ${changeOver.at.text}`
  }
}

const bypassPhrase = (bypass: ChangeOverRecord | null): string =>
  bypass === null ? '' : `, ${changeOverPhrase(bypass, 'bypass')}`

const method = (starter: StarterRecord): string => {
  switch (starter.kind) {
    case 'direct':
      return 'direct-on-line'
    case 'autotransformer':
      return `by autotransformer at ${starter.tap.text} (${changeOverPhrase(starter.changeOver, 'transfer')})`
    case 'star-delta':
      return `by star-delta (${changeOverPhrase(starter.changeOver, 'delta')})`
    case 'reactor':
      return `behind a reactor of ${starter.reactance.text} (${changeOverPhrase(starter.changeOver, 'bypass')})`
    case 'resistor':
      return `behind a resistor of ${starter.resistance.text} (${changeOverPhrase(starter.changeOver, 'bypass')})`
    case 'soft-starter': {
      const { ramp, rampTime, currentLimit, bypass } = starter
      const limit = currentLimit === null ? '' : `, at most ${currentLimit.text}`
      return `by soft starter (${ramp.kind} from ${ramp.from.text} to ${ramp.to.text} in ${rampTime.text}${limit}${bypassPhrase(bypass)})`
    }
    case 'part-winding':
      return `on part of the winding (${changeOverPhrase(starter.changeOver, 'the rest')})`
    case 'rotor-resistance':
      return `with ${starter.steps.length} ${starter.steps.length === 1 ? 'step' : 'steps'} of rotor resistance`
    case 'captive-transformer':
      return `together with its transformer of ${starter.rating.text}`
    case 'drive':
      return `by variable-speed drive (to ${starter.speed.text} in ${starter.rampTime.text}${bypassPhrase(starter.bypass)})`
  }
}

/** How a motor is started, to go behind “started”: method, setting and change-over as typed. */
export const starterPhrase = (starter: StarterRecord): string =>
  starter.capacitors.length === 0 ? method(starter) : `${method(starter)} with capacitors`
