import { describe, expect, it } from 'vitest'
import type { Verdict } from '@/lib/engine/criteria/rule'
import { judgeStudy, runStudy } from '@/lib/engine/run-study'
import { ENGINE_VERSION } from '@/lib/engine/version'
import { velmoorCases } from '../support/velmoor'
import { velmoorEnvelope, velmoorMargins, velmoorRules, velmoorStarts } from '../support/velmoor-limits'

const cases = Object.values(velmoorCases)
const told: [number, number][] = []
const study = {
  cases,
  rules: [...velmoorRules, velmoorEnvelope],
  starts: velmoorStarts,
  margins: velmoorMargins,
}
const result = runStudy(study, (done, of) => told.push([done, of]))

const verdict = (caseId: string, ruleId: string): Verdict | undefined =>
  result.verdicts.find((each) => each.caseId === caseId && each.ruleId === ruleId)
const words = (caseId: string): string =>
  velmoorRules.map(({ id }) => `${id}:${verdict(caseId, id)?.word ?? '-'}`).join(' ')

describe('the limits sheet of Velmoor', () => {
  it('is failed by the direct start on change at the PCC and met elsewhere, closely at R5', () => {
    expect(words('C1')).toBe(
      'R1:fails R2:fails R3:fails R4:meets R5:close R6:meets R7:meets R8:meets R9:meets R10:meets R11:meets R12:meets R13:meets',
    )
  })

  it('is met by the 65 % tap in every row in use; R9 does not apply to it', () => {
    expect(words('C2')).toBe(
      'R1:meets R2:meets R3:fails R4:meets R5:meets R6:meets R7:meets R8:meets R9:- R10:meets R11:meets R12:meets R13:meets',
    )
    expect(verdict('C2', 'R1')!.inUse).toBe(true)
    expect(verdict('C2', 'R2')!.inUse).toBe(false)
    expect(verdict('C2', 'R3')!.inUse).toBe(false)
  })

  it('has the figures of the data sheet', () => {
    const figures: [string, string, number, number][] = [
      ['C1', 'R1', 0.0792, 4],
      ['C1', 'R4', 0.0138, 4],
      ['C1', 'R5', 0.904, 3],
      ['C1', 'R6', 0.85, 3],
      ['C1', 'R7', 0.83, 3],
      ['C1', 'R8', 0.82, 3],
      ['C1', 'R9', 0.861, 3],
      ['C1', 'R12', 0.204, 3],
      ['C1', 'R13', 1.007, 3],
      ['C2', 'R1', 0.0348, 4],
      ['C2', 'R5', 0.948, 3],
      ['C2', 'R8', 0.91, 3],
      ['C2', 'R10', 0.16, 3],
      ['C2', 'R11', 10.38, 2],
      ['C2', 'R12', 0.243, 3],
      ['C2', 'R13', 1.007, 3],
      ['C16', 'R8', 0.767, 3],
    ]
    for (const [caseId, ruleId, value, digits] of figures) {
      expect(verdict(caseId, ruleId)!.value, `${caseId} ${ruleId}`).toBeCloseTo(value, digits)
    }
  })

  it('names the place that governs: the booster among running motors, the switchboard for the highest voltage', () => {
    expect(verdict('C1', 'R8')).toMatchObject({ motorId: 'B1', busId: 'B1' })
    expect(verdict('C1', 'R13')!.at).toBe(0)
    expect(['MV', 'M4']).toContain(verdict('C1', 'R13')!.busId)
  })

  it('fails C5 by 0.07 although it is met at standstill', () => {
    const row = verdict('C5', 'R1')!
    expect(row.word).toBe('fails')
    expect(row.margin).toBeCloseTo(-0.0007, 4)
    expect(result.cases[4]!.places[0]!.first / result.cases[4]!.places[0]!.before).toBeGreaterThan(0.96)
  })

  it('catches the built-in traps', () => {
    expect(verdict('C7', 'R11')).toMatchObject({ word: 'fails', value: null, motorId: 'M4' })
    expect(verdict('C7', 'R10')!.word).toBe('fails')
    expect(verdict('C7', 'R4')).toMatchObject({ word: 'not-assessed', reason: 'state-not-reached' })
    expect(verdict('C8', 'R1')!.word).toBe('fails')
    expect(verdict('C9', 'R1')!.word).toBe('close')
    expect(verdict('C12', 'R1')!.word).toBe('meets')
    expect(verdict('C12', 'R10')!.word).toBe('fails')
    expect(verdict('C13', 'R10')!.word).toBe('fails')
    expect(verdict('C13', 'R11')!.word).toBe('fails')
    expect(verdict('C14', 'R2')!.word).toBe('close')
    expect(verdict('C20', 'R1')!.margin).toBeCloseTo(-0.0008, 4)
    expect(verdict('C21', 'R10')!.margin).toBeCloseTo(-0.002, 3)
    expect(verdict('C23', 'R1')!.word).toBe('close')
  })

  it('fails C16 in R1, R2, R3, R5, R6, R7, R8 and R10, and in R4 with four valves open and no capacitor', () => {
    const failed = velmoorRules.map(({ id }) => id).filter((id) => verdict('C16', id)?.word === 'fails')
    expect(failed).toEqual(['R1', 'R2', 'R3', 'R4', 'R5', 'R6', 'R7', 'R8', 'R10'])
  })

  it('has a second sheet whose envelope C2 fails, by staying above 3 % for 8.2 s', () => {
    const row = verdict('C2', 'E1')!
    expect(row.word).toBe('fails')
    expect(row.value).toBeCloseTo(0.0346, 4)
    expect(row.at).toBeCloseTo(2, 6)
    expect(row.limit).toBe(0.03)
    const { time, busVoltage } = result.cases[1]!.series
    const { before } = result.cases[1]!.places[0]!
    const last = time.findLast((_, i) => 1 - busVoltage.PCC![i]! / before > 0.03)!
    expect(last).toBeCloseTo(8.2, 0)
  })

  it('as a whole fails, with the worst row named', () => {
    expect(result.overall.word).toBe('fails')
    expect(result.overall.governing).toMatchObject({ caseId: 'C7', ruleId: 'R11' })
    const counted = Object.values(result.overall.counts).reduce((sum, each) => sum + each, 0)
    expect(counted).toBe(result.verdicts.filter(({ inUse }) => inUse).length)
  })

  it('is met as a whole by the 65 % tap at every supply, first and last pump', () => {
    const chosen = ['C2', 'C4', 'C6', 'C15']
    const part = judgeStudy(
      { ...study, cases: chosen.map((id) => velmoorCases[id]!), rules: velmoorRules },
      chosen.map((id) => result.cases[Object.keys(velmoorCases).indexOf(id)]!),
    )
    expect(part.overall.word).toBe('meets')
    expect(part.overall.counts.fails).toBe(0)
    expect(part.overall.governing).toMatchObject({ ruleId: 'R1', caseId: 'C2' })
  })

  it('comes with the version of the engine and tells of each case', () => {
    expect(result.engineVersion).toBe(ENGINE_VERSION)
    expect(told).toEqual(cases.map((_, i) => [i + 1, cases.length]))
  })
})
