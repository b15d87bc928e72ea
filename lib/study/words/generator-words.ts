import type { GeneratorResult } from '../../engine/case-result'

/** How a generator came through a run, in a few words for a table. */
export const generatorOutcomeWords: Record<GeneratorResult['outcome'], string> = {
  recovered: 'recovered',
  'not-recovered': 'not recovered: excitation stays at its ceiling',
  hunting: 'hunts: voltage or speed never come to rest',
  failed: 'failed: voltage or frequency broke down',
}
