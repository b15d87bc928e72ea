import type { RelayElement } from '../protection-input'
import type { ElementCourse } from './element-course'

/** An element with a definite time: it operates when the current has been above its setting for the delay. */
export function definiteCourse({ pickUp, delay }: Extract<RelayElement, { kind: 'definite' }>): ElementCourse {
  let above = 0
  return {
    travelled: () => (delay > 0 ? Math.min(1, above / delay) : above > 0 ? 1 : 0),
    timeLeft: (current) => (current > pickUp ? Math.max(0, delay - above) : null),
    advance(step, from, to) {
      const crossing = from === to ? 1 : (pickUp - from) / (to - from)
      const [begin, end] = from > pickUp ? [0, to > pickUp ? 1 : crossing] : [to > pickUp ? crossing : 1, 1]
      if (begin === end) {
        above = 0
        return null
      }
      const before = from > pickUp ? above : 0
      const during = (end - begin) * step
      above = to > pickUp ? before + during : 0
      const left = delay - before
      return left >= 0 && during >= left ? begin * step + left : null
    },
  }
}
