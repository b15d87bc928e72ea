import { type CaseInput, circuitOf } from '../engine/case-input'

/**
 * The speed case written out by hand for its one network, as the measure of what a general engine costs: numbers only,
 * no error control, nothing observed but the speed. Source, transformer and cable are reduced to the load's bus, where
 * the constant-power load leaves a quadratic; speed follows by classical Runge-Kutta steps of equal length.
 *
 * @returns instant at which 98 % of rated speed is passed, in s; NaN where it is not within `seconds`
 */
export function plainRunUp(input: CaseInput, steps: number, seconds: number): number {
  const motor = input.motors[0]!
  const transformer = input.transformers[0]!
  const cable = input.lines[0]!.impedance
  const load = input.loads[0]!.power
  const circuit = circuitOf(motor.circuit)
  const [inner, outer] = [circuit.cages[0]!, circuit.cages[1]!]
  if (motor.duty.kind !== 'starting' || motor.duty.load.kind !== 'power') throw new Error('the speed case has changed')
  const curve = motor.duty.load

  const toSecondary = 1 / transformer.ratio
  const emf = input.supply.hold.voltage * toSecondary
  const zr = input.supply.impedance.re * toSecondary ** 2 + transformer.impedance.re
  const zx = input.supply.impedance.im * toSecondary ** 2 + transformer.impedance.im
  const [cr, cx] = [cable.re, cable.im]
  const [p, q] = [load.re, load.im]
  const sizeSquared = p * p + q * q
  const [rs, xs] = [circuit.stator.re, circuit.stator.im]
  const bm = 1 / circuit.magnetising
  const [r1, x1, r2, x2] = [inner.resistance, inner.reactance, outer.resistance, outer.reactance]
  const synchronous = (4 * Math.PI * input.frequency) / motor.poles
  const constant = curve.constant
  const rise = (curve.atRated - curve.constant) / curve.ratedSpeed ** 2
  const perInertia = 1 / motor.inertia

  const acceleration = (speed: number): number => {
    const slip = 1 - speed / synchronous
    const d1 = r1 * r1 + slip * slip * x1 * x1
    const d2 = r2 * r2 + slip * slip * x2 * x2
    const g = slip * (r1 / d1 + r2 / d2)
    const b = -slip * slip * (x1 / d1 + x2 / d2) - bm
    const e = 1 / (g * g + b * b)
    // Motor and cable in series, seen from the load's bus.
    const mr = rs + g * e
    const mx = xs - b * e
    const br = mr + cr
    const bx = mx + cx
    // Source behind the series impedance with the motor branch across it.
    const sr = zr + br
    const sx = zx + bx
    const s2 = sr * sr + sx * sx
    const kr = (br * sr + bx * sx) / s2
    const kx = (bx * sr - br * sx) / s2
    const tr = kr * zr - kx * zx
    const tx = kr * zx + kx * zr
    const open = emf * emf * (kr * kr + kx * kx)
    const half = tr * p + tx * q - open / 2
    const root = half * half - (tr * tr + tx * tx) * sizeSquared
    const busSquared = -half + Math.sqrt(root)
    // Voltage behind the stator: bus voltage times what the rotor and magnetising branch have of the branch.
    const inside = (busSquared * e) / (br * br + bx * bx)
    const torque = (inside * g) / synchronous
    return (torque - constant - rise * speed * speed) * perInertia
  }

  const h = seconds / steps
  const goal = 0.98 * motor.ratedSpeed
  let speed = 0
  let passed = Number.NaN
  for (let i = 0; i < steps; i++) {
    const k1 = acceleration(speed)
    const k2 = acceleration(speed + 0.5 * h * k1)
    const k3 = acceleration(speed + 0.5 * h * k2)
    const k4 = acceleration(speed + h * k3)
    const next = speed + (h / 6) * (k1 + 2 * k2 + 2 * k3 + k4)
    if (speed < goal && next >= goal) passed = h * (i + (goal - speed) / (next - speed))
    speed = next
  }
  return passed
}
