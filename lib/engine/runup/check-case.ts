import { type CaseInput, isTabulated, type LoadCurve, type MotorInput } from '../case-input'
import { onGenerator } from '../generator-input'
import { circuitProblem, machineProblem } from '../machines/check-machine'
import { generatorProblem } from '../machines/generator'
import { type Refusal, refuse } from '../network/refusal'
import { couplings } from '../network/three-winding'
import { isZero } from '../numeric/complex'
import { capacitorsProblem, starterProblem } from '../starters/check-starter'
import { checkSchedule } from './check-schedule'

/** The first thing in a case that no calculation can be made of, or null. Values are SI. */
export function checkCase(input: CaseInput): Refusal | null {
  return (
    checkBuses(input) ??
    checkSupply(input) ??
    checkBranches(input) ??
    checkThreeWindings(input) ??
    checkShunts(input) ??
    checkMotors(input) ??
    checkSchedule(input)
  )
}

const bad = (buses: readonly string[], detail: string): Refusal => refuse('bad-value', buses, detail).outcome

const positive = (value: number): boolean => Number.isFinite(value) && value > 0
const notNegative = (value: number): boolean => Number.isFinite(value) && value >= 0
const finite = (value: { re: number; im: number }): boolean => Number.isFinite(value.re) && Number.isFinite(value.im)

function checkBuses(input: CaseInput): Refusal | null {
  const known = new Set<string>()
  for (const bus of input.buses) {
    if (known.has(bus.id)) return bad([bus.id], `Bus ${bus.id} is there twice.`)
    if (!positive(bus.nominal)) return bad([bus.id], `Bus ${bus.id} needs a nominal voltage above zero.`)
    known.add(bus.id)
  }
  if (!positive(input.frequency)) return bad([], 'The frequency must be above zero.')
  const { speedCriterion, timeLimit, tolerance } = input.settings
  if (!positive(speedCriterion) || speedCriterion >= 1.2)
    return bad([], 'The speed criterion must lie between 0 and 1.2 of rated speed.')
  if (!positive(timeLimit)) return bad([], 'The time limit of a start must be above zero.')
  if (input.model?.kind === 'fifth-order' && !Number.isFinite(input.model.switchingAngle ?? 0))
    return bad([], 'The switching angle must be a number.')
  if (!positive(tolerance) || tolerance > 1e-2)
    return bad([], 'The tolerance of the integration must lie between 0 and 0.01.')
  return null
}

function checkSupply(input: CaseInput): Refusal | null {
  const { supply } = input
  if (!input.buses.some((bus) => bus.id === supply.busId)) {
    return refuse('no-supply', [supply.busId], 'The supply stands at a bus that is not in the case.').outcome
  }
  if (!finite(supply.impedance) || isZero(supply.impedance) || supply.impedance.re < 0) {
    return bad([supply.busId], 'The source impedance must be above zero.')
  }
  if (supply.generator) {
    const problem = generatorProblem(supply.generator)
    if (problem !== null) return bad([supply.busId], `The generator ${problem}`)
    if (supply.hold.kind !== 'bus-voltage') return bad([supply.busId], 'A generator holds the voltage of its bus.')
  }
  if (onGenerator(input) && input.model?.kind === 'third-order')
    return bad([supply.busId], 'Rotor fluxes of motors are not computed on a generator; choose the steady circuits.')
  if (!positive(supply.hold.voltage)) return bad([supply.busId], 'The voltage of the supply must be above zero.')
  for (const motor of supply.motorsInLevel) {
    const problem = isTabulated(motor.circuit) ? null : circuitProblem(motor.circuit)
    if (problem !== null) return bad([motor.busId], `A motor in the stated level: ${problem}`)
    if (!input.buses.some((bus) => bus.id === motor.busId))
      return bad([motor.busId], 'A motor in the stated level stands at a bus that is not in the case.')
  }
  return null
}

function checkBranches(input: CaseInput): Refusal | null {
  const known = new Set(input.buses.map((bus) => bus.id))
  for (const branch of [...input.lines, ...input.transformers]) {
    const ends = [branch.fromBusId, branch.toBusId]
    if (ends.some((id) => !known.has(id)))
      return bad(ends, `Branch ${branch.id} ends at a bus that is not in the case.`)
    if (ends[0] === ends[1]) return bad(ends, `Branch ${branch.id} begins and ends at the same bus.`)
    if (!finite(branch.impedance) || branch.impedance.re < 0)
      return bad(ends, `Branch ${branch.id} needs an impedance with a resistance that is not negative.`)
  }
  for (const line of input.lines) {
    if (!notNegative(line.susceptance))
      return bad([line.fromBusId, line.toBusId], `Line ${line.id} needs a susceptance of zero or more.`)
  }
  for (const transformer of input.transformers) {
    const ends = [transformer.fromBusId, transformer.toBusId]
    if (isZero(transformer.impedance)) return bad(ends, `Transformer ${transformer.id} needs an impedance above zero.`)
    if (!positive(transformer.ratio)) return bad(ends, `Transformer ${transformer.id} needs a ratio above zero.`)
  }
  return null
}

function checkThreeWindings(input: CaseInput): Refusal | null {
  const known = new Set(input.buses.map((bus) => bus.id))
  for (const transformer of input.threeWindings ?? []) {
    const { id, windings, impedance } = transformer
    const ends = windings.map(({ busId }) => busId)
    if (ends.some((busId) => !known.has(busId)))
      return bad(ends, `Transformer ${id} ends at a bus that is not in the case.`)
    if (new Set(ends).size < 3) return bad(ends, `Transformer ${id} needs a bus of its own for each winding.`)
    if (!windings.every(({ ratio }) => positive(ratio))) return bad(ends, `Transformer ${id} needs ratios above zero.`)
    if (!impedance.every(finite) || couplings(transformer) === null)
      return bad(ends, `Transformer ${id} needs impedances between its windings that make a star.`)
  }
  return null
}

function checkShunts(input: CaseInput): Refusal | null {
  const known = new Set(input.buses.map((bus) => bus.id))
  for (const load of input.loads) {
    if (!known.has(load.busId)) return bad([load.busId], `Load ${load.id} stands at a bus that is not in the case.`)
    const mix = [load.mix.impedance, load.mix.current, load.mix.power]
    if (!finite(load.power) || !positive(load.ratedVoltage) || !notNegative(load.floor)) {
      return bad([load.busId], `Load ${load.id} needs a power, a rated voltage above zero and a floor of zero or more.`)
    }
    if (!mix.every(Number.isFinite))
      return bad([load.busId], `Load ${load.id} needs three shares of impedance, current and power.`)
  }
  for (const capacitor of input.capacitors) {
    if (!known.has(capacitor.busId))
      return bad([capacitor.busId], `Capacitor ${capacitor.id} stands at a bus that is not in the case.`)
    if (!notNegative(capacitor.susceptance))
      return bad([capacitor.busId], `Capacitor ${capacitor.id} needs a susceptance of zero or more.`)
  }
  return null
}

function checkMotors(input: CaseInput): Refusal | null {
  const known = new Set(input.buses.map((bus) => bus.id))
  const seen = new Set<string>()
  for (const motor of input.motors) {
    if (!known.has(motor.busId)) return bad([motor.busId], `Motor ${motor.id} stands at a bus that is not in the case.`)
    if (seen.has(motor.id)) return bad([motor.busId], `Motor ${motor.id} is there twice.`)
    seen.add(motor.id)
    const problem = motorProblem(motor, input)
    if (problem !== null) return bad([motor.busId], `Motor ${motor.id}: ${problem}`)
  }
  return null
}

function motorProblem(motor: MotorInput, input: CaseInput): string | null {
  if (!positive(motor.ratedVoltage) || !positive(motor.ratedSpeed) || !positive(motor.ratedTorque)) {
    return 'rated voltage, speed and torque must be above zero.'
  }
  if (!Number.isInteger(motor.poles) || motor.poles < 2 || motor.poles % 2 === 1)
    return 'the number of poles must be even.'
  if (motor.ratedSpeed >= (4 * Math.PI * input.frequency) / motor.poles)
    return 'the rated speed must lie below synchronous speed.'
  if (!positive(motor.inertia)) return 'the inertia must be above zero.'
  if (!positive(motor.torqueFactor)) return 'the torque factor must be above zero.'
  const machine = machineProblem(motor.circuit, (4 * Math.PI * input.frequency) / motor.poles)
  if (machine !== null) return machine
  if (motor.duty.kind === 'running') return curveProblem(motor.duty.load)
  const { at, starter, capacitors, load, processLoad } = motor.duty
  if (!notNegative(at)) return 'the start cannot lie before zero.'
  const device = starterProblem(starter, motor.circuit) ?? capacitorsProblem(capacitors ?? [])
  if (device !== null) return device
  const { initialSpeed } = motor.duty
  if (initialSpeed !== undefined && !(Math.abs(initialSpeed) < (8 * Math.PI * input.frequency) / motor.poles))
    return 'the speed before the start must lie below twice synchronous speed.'
  return curveProblem(load) ?? (processLoad === null ? null : curveProblem(processLoad))
}

function curveProblem(curve: LoadCurve): string | null {
  if (curve.kind === 'points') {
    if (curve.speeds.length < 1 || curve.speeds.length !== curve.torques.length)
      return 'the load curve needs a torque for each speed.'
    if (curve.active === true && !(curve.torques.every(Number.isFinite) && curve.speeds.every(Number.isFinite)))
      return 'the active load needs a torque for each speed.'
    if (curve.active !== true && !(curve.torques.every(notNegative) && curve.speeds.every(notNegative)))
      return 'the load curve needs speeds and torques of zero or more.'
    const rising = curve.speeds.every((speed, index) => index === 0 || speed > curve.speeds[index - 1]!)
    return rising ? null : 'the speeds of the load curve must rise.'
  }
  if (curve.kind === 'check-valve') return checkValveProblem(curve)
  if (!notNegative(curve.constant) || !notNegative(curve.atRated)) return 'the load needs torques of zero or more.'
  // A falling power (constant power: −1) has no value at standstill, where the breakaway line stands in.
  const falling = Number.isFinite(curve.exponent) && curve.exponent < 0 && curve.breakaway !== null
  if (!positive(curve.ratedSpeed) || !(notNegative(curve.exponent) || falling))
    return 'the load curve needs a rated speed above zero and an exponent of zero or more.'
  if (curve.breakaway !== null && (!notNegative(curve.breakaway.torque) || !positive(curve.breakaway.until))) {
    return 'the breakaway line needs a torque of zero or more and a speed above zero.'
  }
  return null
}

function checkValveProblem(curve: Extract<LoadCurve, { kind: 'check-valve' }>): string | null {
  const { friction, shut, ratedSpeed, breakaway, opensAt, speeds, torques } = curve
  if (![friction, shut, ...torques].every(notNegative)) return 'the load needs torques of zero or more.'
  if (!positive(ratedSpeed) || !positive(opensAt)) return 'the pump needs speeds above zero.'
  if (speeds.length < 1 || speeds.length !== torques.length) return 'the pump needs a torque for each speed.'
  if (breakaway !== null && !(notNegative(breakaway.torque) && positive(breakaway.until) && breakaway.until < opensAt))
    return 'the breakaway line must end below the speed at which the check valve opens.'
  const rising = [opensAt, ...speeds].every((speed, i, all) => i === 0 || speed > all[i - 1]!)
  return rising ? null : 'the speeds of the pump above the opening of its check valve must rise.'
}
