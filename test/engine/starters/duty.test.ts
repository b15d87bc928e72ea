import { describe, expect, it } from 'vitest'
import type { Starter } from '@/lib/engine/case-input'
import { runCase } from '@/lib/engine/run-case'
import type { StarterDuty } from '@/lib/engine/starter-input'
import { judgeDuty } from '@/lib/engine/starters/duty'
import { second } from '@/lib/units/si'
import { autotransformer, simpleMotor, simplePlant, squareLoad, started } from '../../support/simple-plant'

const tap = autotransformer(0.65, { rpm: 1400 })
const duty = (secondsPerStart: number | null, startsPerHour: number | null, plannedPerHour: number | null) =>
  ({
    secondsPerStart: secondsPerStart === null ? null : second(secondsPerStart),
    startsPerHour,
    plannedPerHour,
  }) satisfies StarterDuty
const verdict = (starter: Starter, one: StarterDuty | undefined, time: number) =>
  judgeDuty(starter, one, time)?.verdict ?? null

describe('the duty of a starting device', () => {
  it('holds the seconds on it and the starts planned an hour against what it allows', () => {
    expect(verdict(tap, duty(15, 3, 2), 10)).toBe('within')
    expect(verdict(tap, duty(15, 3, 2), 15.1)).toBe('exceeded')
    expect(verdict(tap, duty(15, 3, 4), 10)).toBe('exceeded')
    expect(verdict(tap, duty(null, 3, 3), 100)).toBe('within')
  })

  it('is not assessed where nothing is known, and does not exist for a direct start', () => {
    expect(verdict(tap, undefined, 10)).toBe('not-assessed')
    expect(verdict(tap, duty(null, 3, null), 10)).toBe('not-assessed')
    expect(verdict({ kind: 'direct' }, duty(1, 1, 5), 10)).toBeNull()
  })

  it('of a run counts from switching on to the running position, and is noticed when exceeded', () => {
    const run = (one: StarterDuty) => {
      const start = started(tap, squareLoad(300, 20))
      const motor = simpleMotor('M', start.kind === 'starting' ? { ...start, starterDuty: one } : start)
      return runCase(simplePlant([motor]))
    }
    const [within, beyond] = [run(duty(30, null, null)), run(duty(1, null, null))]
    const transfer = within.changeOvers.find(({ to }) => to === 'running')!
    expect(within.motors[0]!.start!.device).toMatchObject({ verdict: 'within', time: transfer.at })
    expect(within.notices.map(({ kind }) => kind)).not.toContain('starter-duty-exceeded')
    expect(beyond.motors[0]!.start!.device!.verdict).toBe('exceeded')
    expect(beyond.notices.map(({ kind }) => kind)).toContain('starter-duty-exceeded')
  })
})
