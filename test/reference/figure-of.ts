import type { CaseInput } from '@/lib/engine/case-input'
import type { CaseResult, MotorResult, PlaceResult, StartResult } from '@/lib/engine/case-result'
import { synchronousSpeed, toRpm } from '@/lib/units/speed'

/** A quantity of a reference case, read from the result; a name after the dot is a bus or a motor, without one the only motor. */
export function figureOf(quantity: string, input: CaseInput, result: CaseResult): number | boolean {
  const [name, id] = quantity.split('.') as [string, string | undefined]
  const read = byPlace[name]
  if (read) {
    const place = result.places.find(({ busId }) => busId === id)
    if (!place) throw new Error(`no bus ${id}`)
    return read(place)
  }
  const motor = result.motors.find(({ motorId }) => id === undefined || motorId === id)!
  const reading = byMotor[name]
  if (!reading) throw new Error(`no reading for ${quantity}`)
  return reading({ motor, input, result })
}

const change = (place: PlaceResult, voltage: number): number => 100 * (1 - voltage / place.before)

const byPlace: Record<string, (place: PlaceResult) => number> = {
  voltage_pu: (place) => place.first / place.nominal,
  prestart_voltage_pu: (place) => place.before / place.nominal,
  dip_percent_of_prestart: (place) => change(place, place.first),
  min_voltage_pu: (place) => place.deepest.voltage / place.nominal,
  max_dip_percent_of_prestart: (place) => change(place, place.deepest.voltage),
}

interface Reading {
  motor: MotorResult
  input: CaseInput
  result: CaseResult
}

const start = ({ motor }: Reading): StartResult => motor.start!
const rated = ({ motor, input }: Reading) => input.motors.find(({ id }) => id === motor.motorId)!

/** Current of a motor just after the first switching-on: the later of two samples at that instant. */
const currentAtFirst = ({ motor, result }: Reading): number => {
  const { time, motors } = result.series
  return motors[motor.motorId]!.lineCurrent[time.lastIndexOf(time[0]!)]!
}

const byMotor: Record<string, (reading: Reading) => number | boolean> = {
  motor_line_current_a: currentAtFirst,
  motor_torque_nm: (reading) => start(reading).standstill.torque,
  motor_kva: (reading) => Math.hypot(start(reading).standstill.power.re, start(reading).standstill.power.im) / 1e3,
  source_bus_power_mw: ({ result }) => result.supply!.powerFirst!.re / 1e6,
  source_bus_reactive_mvar: ({ result }) => result.supply!.powerFirst!.im / 1e6,
  source_emf_kv: ({ result }) => result.supply!.emf / 1e3,
  prestart_slip: (reading) =>
    1 - reading.motor.running!.before.speed / synchronousSpeed(reading.input.frequency, rated(reading).poles),
  reaches_98_percent: (reading) => start(reading).timeToCriterion !== null,
  time_to_95_s: (reading) => start(reading).timeTo95!,
  time_to_98_s: (reading) => start(reading).timeToCriterion!,
  i2t_to_98_a2s: (reading) => start(reading).i2t,
  rotor_loss_energy_to_98_j: (reading) => start(reading).slipEnergy,
  min_motor_voltage_pu: (reading) =>
    (reading.motor.start?.lowestMotorVoltage ?? reading.motor.running!.lowestVoltage).voltage /
    rated(reading).ratedVoltage,
  peak_line_current_a: (reading) =>
    (reading.motor.start?.peakLineCurrent ?? reading.motor.running!.peakCurrent).current,
  settled_speed_rpm: (reading) => toRpm(start(reading).settledSpeed!),
  speed_at_end_rpm: ({ motor }) => toRpm(motor.speedAtEnd),
  min_speed_rpm: ({ motor }) => toRpm(motor.running!.lowestSpeed.speed),
  changeover_at_s: ({ result }) => result.changeOvers[0]!.at,
}
