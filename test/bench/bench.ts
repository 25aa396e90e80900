/**
 * Points (wavelength × direction) per second of the optics, one thread: `npm run bench`. Each figure is a median of eleven
 * rounds; each stands between two rounds of a chain of complex 2×2 products, whose time on a quiet machine is known (10 ns), so that
 * what else the machine does divides out. Beside them the plain solver of test/oracle (complex numbers as objects,
 * eigenvalues by iteration, dense sums), and the 236,000 points per second that a C++ program of the same formulas makes of
 * eleven layers on a quiet machine of this kind.
 */
import { Sensitivity } from '../../src/optics/sensitivity.js'
import { Solver } from '../../src/optics/solver.js'
import { solvePoint } from '../oracle/solvePoint.js'
import { type BenchStack, benchStacks, retarderMedium } from './benchStacks.js'
import { bytesPerCall, type Measurement, measure } from './measure.js'

const band = (count: number) => Float64Array.from({ length: count }, (_, i) => 380 + (400 * i) / Math.max(1, count - 1))
const WAVELENGTHS = band(81)
const DEGREE = Math.PI / 180
const CPP_POINTS_PER_SECOND = 236_000

function line(name: string, { secondsPerCall, spread }: Measurement, pointsPerCall: number, plain: number): void {
  const rate = pointsPerCall / secondsPerCall
  const toCpp = rate / CPP_POINTS_PER_SECOND
  console.log(
    `${name.padEnd(52)} ${Math.round(rate).toLocaleString('en').padStart(10)}  ±${(100 * spread).toFixed(0).padStart(2)} %` +
      `  ${toCpp.toFixed(2).padStart(6)} × C++  ${Number.isNaN(plain) ? '' : `${Math.round(rate / plain)} × plain`}`,
  )
}

function unrelated({ layers, panel }: BenchStack, wavelengths: Float64Array): (k: number) => void {
  const solver = new Solver(wavelengths)
  return (k) => {
    // Every thickness and the direction differ: nothing can be kept.
    const changed = layers.map((layer) => ({ ...layer, thicknessNm: layer.thicknessNm + 1e-6 * (k + 1) }))
    solver.solve(changed, panel, ((k % 40) + 0.5) * 2 * DEGREE, ((k * 7) % 180) * DEGREE)
  }
}

function coneRow({ layers, panel }: BenchStack): (k: number) => void {
  const solver = new Solver(WAVELENGTHS)
  return (k) => solver.solve(layers, panel, (1 + (Math.floor(k / 90) % 41)) * 2 * DEGREE, (k % 90) * 2 * DEGREE)
}

function withFilm({ layers, film }: BenchStack, change: object) {
  return layers.map((layer, at) => (at === film ? { ...layer, ...change } : layer))
}

function turning(stack: BenchStack): (k: number) => void {
  const solver = new Solver(WAVELENGTHS)
  return (k) => solver.solve(withFilm(stack, { azimuthRad: 0.001 * k }), stack.panel, 0.3, 0.2)
}

function retarding(stack: BenchStack): (k: number) => void {
  const solver = new Solver(WAVELENGTHS)
  const media = Array.from({ length: 64 }, (_, k) => retarderMedium(WAVELENGTHS, 0.005 + 1e-5 * k))
  return (k) => solver.solve(withFilm(stack, { medium: media[k % 64] }), stack.panel, 0.3, 0.2)
}

function gradient(stack: BenchStack, parameters: number): (k: number) => void {
  const solver = new Solver(WAVELENGTHS)
  const sensitivity = new Sensitivity(solver)
  const out = new Float64Array(WAVELENGTHS.length)
  return (k) => {
    const layers = withFilm(stack, { azimuthRad: 0.001 * k })
    solver.solve(layers, stack.panel, 0.3, 0.2)
    sensitivity.prepare('reflectance')
    for (let p = 0; p < parameters; p++) {
      const shifted = (h: number) => ({
        layers: layers.map((layer, at) => (at === stack.film ? { ...layer, azimuthRad: layer.azimuthRad + h } : layer)),
        panel: stack.panel,
      })
      sensitivity.derivative(shifted(1e-5), shifted(-1e-5), 2e-5, out)
    }
  }
}

function plainSolver(stack: BenchStack): Measurement {
  const layers = stack.layers.map(({ medium, ...rest }) => ({
    ...rest,
    principal: [0, 1, 2].map((axis) => principal(medium, axis)),
  }))
  const panel = { kind: 'mirror', index: 1.7, reflectance: 0.45, depolarized: 0.01 } as const
  return measure((k) => {
    solvePoint({
      wavelengthNm: 400 + (k % 300),
      thetaRad: ((k % 40) + 0.5) * 2 * DEGREE,
      phiRad: ((k * 7) % 180) * DEGREE,
      layers: layers as unknown as Parameters<typeof solvePoint>[0]['layers'],
      panel,
    })
  })
}

function principal({ permittivity }: { permittivity: Float64Array }, axis: number) {
  const re = permittivity[2 * axis * 81]
  const im = permittivity[(2 * axis + 1) * 81]
  const modulus = Math.hypot(re, im)
  return { re: Math.sqrt((modulus + re) / 2), im: Math.sqrt(Math.max(0, (modulus - re) / 2)) }
}

console.log('points per second on a quiet machine, one thread, 81 wavelengths\n')
const [two, eleven, twenty] = benchStacks(WAVELENGTHS)
const slow = plainSolver(eleven)
const plain = 1 / slow.secondsPerCall
line('plain solver, eleven layers', slow, 1, plain)
for (const stack of [two, eleven, twenty])
  line(
    `unrelated points, ${stack.name}`,
    measure(unrelated(stack, WAVELENGTHS)),
    81,
    stack === eleven ? plain : Number.NaN,
  )
line('cone, eleven layers (computed half)', measure(coneRow(eleven)), 81, plain)
line('cone, eleven layers (with the half by symmetry)', measure(coneRow(eleven)), 162, plain)
line('search that turns one film, eleven layers', measure(turning(eleven)), 81, plain)
line('search that changes a retardance, eleven layers', measure(retarding(eleven)), 81, plain)
line('Monte Carlo, all parameters moving, eleven layers', measure(unrelated(eleven, WAVELENGTHS)), 81, plain)
line('value and gradient by 4 parameters, eleven layers', measure(gradient(eleven, 4)), 81, plain)
for (const count of [1, 11, 21, 401]) {
  const wavelengths = band(count)
  const [, stack] = benchStacks(wavelengths)
  line(
    `unrelated points, eleven layers, ${count} wavelengths`,
    measure(unrelated(stack, wavelengths)),
    count,
    Number.NaN,
  )
}
const solver = new Solver(WAVELENGTHS)
const kernel = (k: number) => solver.solve(eleven.layers, eleven.panel, 0.3, 0.001 * k)
console.log(`\ntaken from the heap by the kernel: ${(bytesPerCall(kernel, 300) / 81).toFixed(2)} bytes per point`)
