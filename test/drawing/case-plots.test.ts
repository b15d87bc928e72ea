import { describe, expect, test } from 'vitest'
import type { CaseFigure } from '@/lib/drawing/case-figure'
import { currentPlot } from '@/lib/drawing/current-plot'
import type { Scene } from '@/lib/drawing/scene'
import { sceneToSvg } from '@/lib/drawing/scene-to-svg'
import { speedPlot } from '@/lib/drawing/speed-plot'
import { torqueSpeedPlot } from '@/lib/drawing/torque-speed-plot'
import { limitedBuses, voltagePlot } from '@/lib/drawing/voltage-plot'
import { reportDocument } from '../support/report-document'
import { reportResult } from '../support/report-result'
import { overlappingTexts, texts, textsOutside } from './support/scene-geometry'

const figure = (caseId: string): CaseFigure => ({
  document: reportDocument,
  result: reportResult.cases.find((one) => one.caseId === caseId)!,
  verdicts: reportResult.verdicts,
})

const buses = ['pcc', 'mv', 'm1', 'm2', 'lv']

const plots: Record<string, (shown: CaseFigure) => Scene> = {
  'voltage-with-limits': (shown) => voltagePlot(shown, { busIds: ['pcc'] }),
  voltages: (shown) => voltagePlot(shown, { busIds: buses }),
  speed: (shown) => speedPlot(shown),
  current: (shown) => currentPlot(shown),
  'torque-speed': (shown) => torqueSpeedPlot(shown, { motorId: 'm2' }),
}

describe.each(['k-dol', 'k-at'])('plots of the case %s', (caseId) => {
  test.each(Object.keys(plots))('%s is drawn as it was', async (name) => {
    await expect(sceneToSvg(plots[name]!(figure(caseId)))).toMatchFileSnapshot(
      `../golden/drawing/${caseId}-${name}.svg`,
    )
  })

  test.each(Object.keys(plots))('%s has no label over another and none outside the sheet', (name) => {
    for (const size of [{}, { width: 120, height: 45 }]) {
      const shown = figure(caseId)
      const scene = name.startsWith('voltage')
        ? voltagePlot(shown, { ...size, busIds: name === 'voltages' ? buses : ['pcc'] })
        : plots[name]!(shown)
      expect(overlappingTexts(scene)).toEqual([])
      expect(textsOutside(scene)).toEqual([])
    }
  })
})

describe('the voltage plot of one place', () => {
  const words = texts(voltagePlot(figure('k-dol'), { busIds: ['pcc'] })).map((item) => item.text)

  test('names every limit in use there, on the plot or above it', () => {
    const all = words.join(' | ')
    for (const rule of ['R1 change 4.0 %', 'R4 settled change 3.0 %', 'R5 remaining 0.90', 'R13 highest 1.10'])
      expect(all).toContain(rule)
  })

  test('reads off the deepest point with its reference', () => {
    expect(words.some((text) => /^deepest 29\.83\u2009kV, change 7\.92\u2009% at /.test(text))).toBe(true)
  })

  test('draws the limit on change at its level of the voltage before', () => {
    const scene = voltagePlot(figure('k-dol'), { busIds: ['pcc'] })
    // 4.0 % of 32.4 kV before the start leaves 31.104 kV, 94.25 % of nominal: between the ticks 94 and 96.
    const tick = (label: string) => texts(scene).find((item) => item.text === label && item.anchor === 'end')!.y
    const perPercent = (tick('96') - tick('94')) / 2
    const expected = tick('94') - 0.33 * 2.4 + (94.2545 - 94) * perPercent
    const level = scene.items.find(
      (item) =>
        item.kind === 'path' &&
        item.stroke === 'ink' &&
        item.width === 0.22 &&
        Math.abs(Number(/M\S+ (\S+?)L/.exec(item.d)?.[1]) - expected) < 0.03,
    )
    expect(level).toBeDefined()
  })

  test('leaves out limits that do not count in this case', () => {
    const shown = figure('k-dol')
    const idle = { ...shown, verdicts: shown.verdicts.map((one) => ({ ...one, inUse: one.ruleId !== 'r1' })) }
    const all = texts(voltagePlot(idle, { busIds: ['pcc'] })).map((item) => item.text)
    expect(all.some((text) => text.startsWith('R1 '))).toBe(false)
  })

  test('lists the buses that a limit applies to', () => {
    expect(limitedBuses(figure('k-dol'))).toEqual(buses)
  })
})

describe('the current plot', () => {
  test('shows one curve where line and motor current are the same, two where they differ', () => {
    const names = (caseId: string) =>
      texts(currentPlot(figure(caseId)))
        .filter((item) => item.weight === 'semibold')
        .map((item) => item.text)
    expect(names('k-dol')).toEqual(['M2'])
    expect(names('k-at')).toEqual(['M2 line', 'M2 motor'])
  })
})
