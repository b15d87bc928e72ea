import type { StudyDocument } from '../document/study-document'
import { listedTags } from './list-words'

/** A caution that goes with a study; `about` names what in the study's own data it is printed for. */
export interface Caution {
  key: string
  sentence: string
  about: string
}

/** Cautions of every study. */
const always: readonly Caution[] = [
  {
    key: 'judgement',
    about: '',
    sentence:
      'This study supports the judgement of a licensed engineer and does not take its place. Where local codes, the written acceptance of the utility or the data of the makers say something else, they prevail.',
  },
  {
    key: 'model',
    about: '',
    sentence:
      'Voltages and currents are balanced RMS values at fundamental frequency. Switching surges, torsional stress, harmonics and arc flash are not assessed. A weak source can lengthen clearing times, so these levels are not to be used in a hazard study.',
  },
  {
    key: 'protection',
    about: '',
    sentence: 'A start curve that passes below a trip curve shows that a start is possible; it is not a relay setting.',
  },
  {
    key: 'recommendation',
    about: '',
    sentence:
      'Findings and conditions come from the calculation. The recommendation is the text of the engineer who prepared the study.',
  },
  {
    key: 'starts',
    about: '',
    sentence:
      'The number of starts allowed is the least that the utility, the maker of the motor, the starting device and the process allow. The heat balance of this study can lower that number and never raises it.',
  },
]

type Rule = (document: StudyDocument) => { about: readonly string[]; sentence: string }

const shortCircuitPower = ({ level, statedAt }: StudyDocument['plant']['supplies'][number]): number => {
  if (level.form === 'power') return level.power.si
  if (level.form === 'current') return Math.sqrt(3) * statedAt.si * level.current.si
  if (level.form === 'generator') return level.rating.si / (level.subtransient?.reactance ?? level.transient).si
  return statedAt.si ** 2 / Math.hypot(level.resistance.si, level.reactance.si)
}

/** A transformer above this part of the short-circuit level makes a dip of its own when it is energised. */
const noticeableTransformer = 0.05

const energisation: Rule = ({ plant }) => {
  const weakest = Math.min(...plant.supplies.map(shortCircuitPower))
  const large = plant.transformers.filter(({ rating }) => rating.si > noticeableTransformer * weakest)
  return {
    about: large.map(({ tag }) => tag),
    sentence:
      'Energising a transformer of this size on so weak a supply makes a dip of its own, which is not assessed here. Regulators on the line act after their delay and are taken as standing still during a start.',
  }
}

const gaps: Rule = ({ plant }) => ({
  about: plant.starters.filter((starter) => 'gap' in starter && starter.gap.si > 0).map(({ tag }) => tag),
  sentence:
    'After a gap without voltage the motor still holds a residual voltage. Closing against it can draw more current and torque than a direct start; the change-over must be made by a device meant for it.',
})

const storedEnergy: Rule = ({ plant }) => ({
  about: [
    ...plant.capacitors.map(({ tag }) => tag),
    ...plant.drivenLoads
      .filter(({ motor, inertias }) => {
        const own = plant.motors.find(({ id }) => id === motor)?.inertia.si ?? 0
        return inertias.reduce((sum, { inertia, speedRatio }) => sum + inertia.si * speedRatio.si ** 2, 0) > 2 * own
      })
      .map(({ tag }) => tag),
  ],
  sentence:
    'Capacitors stay charged and heavy rotors keep turning after they are switched off. Isolate, discharge and wait for standstill before work.',
})

const capacitors: Rule = ({ plant }) => ({
  about: plant.capacitors.map(({ tag }) => tag),
  sentence:
    'A capacitor that stays in when the load goes raises the voltage, and one at the terminals of a motor can excite it. Check its switching and its step against the highest voltage allowed.',
})

const surge: Rule = ({ plant }) => ({
  about: plant.drivenLoads.filter(({ machine }) => machine.endsWith('pump')).map(({ tag }) => tag),
  sentence:
    'Starting and tripping of pumps changes flow and pressure in the pipes. The surge of the process is not assessed here and may ask for a slower valve, or for another order of starting.',
})

const repeated: Rule = ({ plant, settings }) => ({
  about:
    settings.startsPerDay.si > 1
      ? plant.motors.filter(({ permissibleHot }) => permissibleHot !== null).map(({ tag }) => tag)
      : [],
  sentence:
    'Heat of one start is still in the rotor at the next. Keep to the number of starts in succession and to the pause that the maker of the motor states.',
})

const estimated: Rule = ({ plant }) => ({
  about: plant.motors.filter(({ circuit }) => circuit.kind === 'estimated').map(({ tag }) => tag),
  sentence:
    'The circuit is estimated from the nameplate, and a nameplate does not fix the run-up: circuits that meet the same plate differ in run-up time by a fifth and more. Ask the maker for the torque-speed curve before relying on the run-up.',
})

const generators: Rule = ({ plant }) => ({
  about: plant.supplies.filter(({ level }) => level.form === 'generator').map(({ tag }) => tag),
  sentence:
    'The generator is computed from its data sheet without saturation, its regulator and governor as first-order lags. Ask its maker for the voltage and frequency dip at this load step before relying on it, and look after its protection against undervoltage, underfrequency and overload.',
})

const transfers: Rule = ({ schedules }) => ({
  about: schedules
    .filter(({ disturbance }) => disturbance !== null && disturbance.remaining.si === 0)
    .map(({ tag }) => tag),
  sentence:
    'Motors that still turn hold a residual voltage while the plant is without supply. Closing another supply on it out of phase can break shafts and windings: transfer after it has decayed, or by a scheme that watches the angle, and have the makers confirm it.',
})

const touched: readonly (readonly [string, Rule])[] = [
  ['energisation', energisation],
  ['residual-voltage', gaps],
  ['generator', generators],
  ['supply-transfer', transfers],
  ['stored-energy', storedEnergy],
  ['capacitor', capacitors],
  ['process-surge', surge],
  ['repeated-starts', repeated],
  ['estimated-circuit', estimated],
]

/** The cautions that go with a study: the general ones, and those that its own records touch, with what touches them. */
export const cautionsFor = (document: StudyDocument): readonly Caution[] => [
  ...always,
  ...touched.flatMap(([key, rule]) => {
    const { about, sentence } = rule(document)
    return about.length === 0 ? [] : [{ key, about: listedTags([...new Set(about)]), sentence }]
  }),
]
