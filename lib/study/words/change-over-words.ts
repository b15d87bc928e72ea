import type { ChangeOverTarget } from '../../engine/case-result'

/** Where a starting device or its capacitors went, in a word or two for a table. */
export const changeOverTargetWords: Record<ChangeOverTarget, string> = {
  off: 'off',
  open: 'open',
  tap: 'on the tap',
  star: 'in star',
  series: 'behind the impedance',
  middle: 'middle step',
  part: 'on part of the winding',
  rotor: 'next rotor step',
  kick: 'kick',
  ramp: 'ramp',
  drive: 'on the drive',
  running: 'running',
  'capacitor-in': 'capacitor in',
  'capacitor-out': 'capacitor out',
}
