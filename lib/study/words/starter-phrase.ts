import type { StarterRecord } from '../document/case-records'

type ChangingOver = Exclude<StarterRecord, { kind: 'direct' }>

const changeOver = ({ changeOver }: ChangingOver, verb: string): string =>
  changeOver.kind === 'speed' ? `${verb} at ${changeOver.at.text}` : `${verb} after ${changeOver.at.text}`

/** How a motor is started, to go behind “started”: method, setting and change-over as typed. */
export const starterPhrase = (starter: StarterRecord): string => {
  switch (starter.kind) {
    case 'direct':
      return 'direct-on-line'
    case 'autotransformer':
      return `by autotransformer at ${starter.tap.text} (${changeOver(starter, 'transfer')})`
    case 'star-delta':
      return `by star-delta (${changeOver(starter, 'delta')})`
  }
}
