import type { CaseModel } from '../../engine/case-input'
import type { CaseResult } from '../../engine/case-result'
import { formatNumber } from '../../quantity/format-number'

/** Name of a model of the machines. */
export const modelWords: Record<CaseModel['kind'], string> = {
  'quasi-static': 'quasi-static',
  'third-order': 'third order',
  'fifth-order': 'fifth order',
}

/** Which model gave the numbers of a case, in one sentence. */
export const modelSentence = ({ model, transient }: Pick<CaseResult, 'model' | 'transient'>): string => {
  switch (model) {
    case 'quasi-static':
      return 'All figures are by the quasi-static model.'
    case 'third-order':
      return 'Voltages, currents and torques are by the third-order model: rotor fluxes of every machine with a circuit, stator and network steady. The state before the start and settled states are those of steady circuits.'
    case 'fifth-order': {
      const angle = transient?.switchingAngle ?? null
      const how =
        angle === null
          ? 'at the worst switching angle for each figure'
          : `switched on at ${formatNumber((angle * 180) / Math.PI, { decimals: 1 })}° of the voltage of phase a`
      return `The start is by the fifth-order model, ${how}: voltages are RMS over half a period in the lowest phase, currents in the highest. The state before the start, settled states and the speeds of running machines are quasi-static.`
    }
  }
}
