import { createRequire } from 'node:module'
import { abs, add, type Complex, complex, divide, inv, multiply } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { speedCase } from '@/lib/cli/speed-case'
import { runCase } from '@/lib/engine/run-case'

/** What is used of the package, whose own types do not pass this project's rules. */
interface Extrapolation {
  absoluteTolerance: number
  relativeTolerance: number
  maxSteps: number
  solve(f: (t: number, y: number[]) => number[], t0: number, y0: number[], t1: number): { y: number[] }
}
const { Solver } = createRequire(import.meta.url)('odex') as { Solver: new (unknowns: number) => Extrapolation }

const c = (real: number, imaginary: number) => complex(real, imaginary)
const scaled = (z: Complex, factor: number) => multiply(z, factor) as Complex
const byRatio = (size: number, xOverR: number) => scaled(c(1, xOverR), size / Math.hypot(1, xOverR))
const parallel = (a: Complex, b: Complex) => inv(add(inv(a), inv(b)) as Complex)

/**
 * The timing case put into closed form: supply, transformer, cable and motor are one Thevenin equivalent at the
 * intermediate bus, where the constant-power load leaves a quadratic in the square of the voltage.
 */
function accelerationOfSpeedCase(): (speed: number) => number {
  const synchronous = (2 * Math.PI * 50) / 2
  const ratio = 6.6 / 11
  const grid = scaled(byRatio(11e3 ** 2 / 90e6, 9), ratio ** 2)
  const transformer = byRatio((0.07 * 6600 ** 2) / 6e6, 13)
  const source = add(grid, transformer) as Complex
  const cable = c(0.06, 0.04)
  const base = 6600 ** 2 / 1.75e6
  const [p, q] = [2e6, 0.9e6]
  return (speed) => {
    const slip = 1 - speed / synchronous
    const cage = (r: number, x: number) => c((r * base) / slip, x * base)
    const rotor = parallel(cage(0.01, 0.16), cage(0.055, 0.095))
    const airgap = parallel(rotor, c(0, 3.5 * base))
    const stator = c(0.01 * base, 0.1 * base)
    const motor = add(stator, airgap) as Complex
    const branch = add(cable, motor) as Complex
    const share = divide(branch, add(source, branch)) as Complex
    const emf = 6600 * Number(abs(share))
    const inner = parallel(source, branch)
    const z = Number(abs(inner))
    const b = 2 * (inner.re * p + inner.im * q) - emf ** 2
    const square = (-b + Math.sqrt(b ** 2 - 4 * z ** 2 * (p ** 2 + q ** 2))) / 2
    const gap = Math.sqrt(square) * Number(abs(divide(airgap, branch) as Complex))
    const torque = (gap ** 2 * inv(rotor).re) / synchronous
    const load = 200 + 8400 * (speed / ((1487 * Math.PI) / 30)) ** 2
    return (torque - load) / 220
  }
}

// General-purpose libraries instead of this project's own arithmetic: mathjs for complex numbers, odex for the
// integration (extrapolation method of Hairer, Nørsett, Wanner, Solving Ordinary Differential Equations I, II.9).
describe('a second opinion on the run-up by a general integrator', () => {
  it('comes to the same speed after the same time, to a millionth', () => {
    const until = runCase(speedCase()).motors[0]!.start!.timeToCriterion!
    const acceleration = accelerationOfSpeedCase()
    const solver = new Solver(1)
    solver.relativeTolerance = 1e-10
    solver.absoluteTolerance = 1e-10
    solver.maxSteps = 10_000
    const { y } = solver.solve((_, [speed]) => [acceleration(speed!)], 0, [0], until)
    const goal = (0.98 * 1487 * Math.PI) / 30
    expect(Math.abs(y[0]! / goal - 1)).toBeLessThan(1e-6)
  })

  it('is not passed by a motor of other inertia', () => {
    const until = runCase(speedCase()).motors[0]!.start!.timeToCriterion!
    const acceleration = accelerationOfSpeedCase()
    const solver = new Solver(1)
    const { y } = solver.solve((_, [speed]) => [(acceleration(speed!) * 220) / 221], 0, [0], until)
    expect(Math.abs(y[0]! / ((0.98 * 1487 * Math.PI) / 30) - 1)).toBeGreaterThan(1e-4)
  })
})
