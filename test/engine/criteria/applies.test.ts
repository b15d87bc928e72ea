import { describe, expect, it } from 'vitest'
import { appliesTo, classInUse, runningUnder, startsUnder } from '@/lib/engine/criteria/applies'
import type { StartClass } from '@/lib/engine/criteria/rule'
import { limitOn, tried } from '../../support/made-result'
import { simpleMotor, simplePlant } from '../../support/simple-plant'

const bounds = (changes: Partial<StartClass>): StartClass => ({
  moreThanPerDay: null,
  atMostPerDay: null,
  moreThanPerHour: null,
  atMostPerHour: null,
  ...changes,
})

const only = (changes: Partial<ReturnType<typeof limitOn>['appliesTo']>) =>
  limitOn({ appliesTo: { caseIds: null, methods: null, motorIds: null, ...changes } })

describe('a class of starts', () => {
  const starts = { perDay: 6, perHour: 1 }

  it('is in use when the declared frequency lies inside every bound', () => {
    expect(classInUse(bounds({ moreThanPerDay: 4, atMostPerHour: 2 }), starts)).toBe(true)
    expect(classInUse(bounds({ atMostPerDay: 4 }), starts)).toBe(false)
    expect(classInUse(bounds({ moreThanPerHour: 2 }), starts)).toBe(false)
    expect(classInUse(bounds({ moreThanPerDay: 4, moreThanPerHour: 2 }), starts)).toBe(false)
  })

  it('counts its upper bound in and its lower bound out', () => {
    expect(classInUse(bounds({ atMostPerDay: 6 }), starts)).toBe(true)
    expect(classInUse(bounds({ moreThanPerDay: 6 }), starts)).toBe(false)
    expect(classInUse(bounds({ moreThanPerHour: 1 }), starts)).toBe(false)
    expect(classInUse(bounds({ atMostPerHour: 1 }), starts)).toBe(true)
  })

  it('is always in use when there is none', () => {
    expect(classInUse(null, starts)).toBe(true)
    expect(classInUse(bounds({}), starts)).toBe(true)
  })
})

describe('a limit applies', () => {
  it('to every case unless it lists some', () => {
    expect(appliesTo(limitOn(), tried)).toBe(true)
    expect(appliesTo(only({ caseIds: ['simple'] }), tried)).toBe(true)
    expect(appliesTo(only({ caseIds: ['other'] }), tried)).toBe(false)
  })

  it('to cases with a start by one of its methods', () => {
    expect(appliesTo(only({ methods: ['direct'] }), tried)).toBe(true)
    expect(appliesTo(only({ methods: ['autotransformer', 'star-delta'] }), tried)).toBe(false)
  })

  it('to cases that start one of its motors', () => {
    expect(appliesTo(only({ motorIds: ['M'] }), tried)).toBe(true)
    expect(appliesTo(only({ motorIds: ['R'] }), tried)).toBe(false)
  })

  it('at starting motors only where one is started, at running motors only where one runs', () => {
    const none = simplePlant([])
    expect(appliesTo(limitOn({ place: { kind: 'starting-motors' } }), none)).toBe(false)
    expect(appliesTo(limitOn({ place: { kind: 'running-motors' } }), none)).toBe(false)
    expect(appliesTo(limitOn({ place: { kind: 'running-motors' } }), tried)).toBe(true)
    const alone = simplePlant([simpleMotor('M', tried.motors[1]!.duty)])
    expect(appliesTo(limitOn({ place: { kind: 'running-motors' } }), alone)).toBe(false)
  })

  it('at running motors picks them by its own list, and the case by its methods', () => {
    const rule = { ...only({ motorIds: ['R'], methods: ['direct'] }), place: { kind: 'running-motors' as const } }
    expect(appliesTo(rule, tried)).toBe(true)
    expect(runningUnder(rule, tried).map(({ id }) => id)).toEqual(['R'])
    expect(appliesTo({ ...rule, appliesTo: { ...rule.appliesTo, methods: ['star-delta'] } }, tried)).toBe(false)
    expect(appliesTo({ ...rule, appliesTo: { ...rule.appliesTo, motorIds: ['Q'] } }, tried)).toBe(false)
  })

  it('to the started motors that method and list leave in', () => {
    expect(startsUnder(limitOn(), tried).map(({ id }) => id)).toEqual(['M'])
    expect(startsUnder(only({ methods: ['star-delta'] }), tried)).toEqual([])
    expect(startsUnder(only({ motorIds: ['R'] }), tried)).toEqual([])
  })
})
