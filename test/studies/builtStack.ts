/** Checked stacks built in place, in the units of a stack file. */
import type { Layer, Limit, MirrorPanel, PolarizerLayer, RetarderLayer, Stack } from '../../src/stack/stack.js'

export const DEG = Math.PI / 180

/** Films of 10 mm and index 1 have faces of less than 1e-7: what remains is what Jones calculus says. */
const SHEET = { index: 1, thickness: 10e6, coherent: false } as const

/** An ideal polarizer unless internal principal transmittances are given. */
export function polarizer(transmissionAxisDeg: number, passed = 1, leaked = 1e-12): PolarizerLayer {
  return {
    ...SHEET,
    id: 'polarizer',
    kind: 'polarizer',
    absorption_axis: (transmissionAxisDeg + 90) * DEG,
    transmission_axis_transmittance: passed,
    absorption_axis_transmittance: leaked,
  }
}

export function retarder(
  id: string,
  slowAxisDeg: number,
  retardance: number,
  rest: Partial<Omit<RetarderLayer, 'kind'>> = {},
): RetarderLayer {
  return { ...SHEET, id, kind: 'retarder', slow_axis: slowAxisDeg * DEG, retardance, nz: 1, ...rest }
}

export function glass(id: string, index: number, thickness = 100e3): Layer {
  return { id, kind: 'isotropic', index, thickness, coherent: thickness < 5000 }
}

/** A mirror under index 1 with nothing depolarized, D65, 2°, head-on, unless given. */
export function stackOf(
  layers: readonly Layer[],
  { panel = {}, ...rest }: Partial<Omit<Stack, 'panel' | 'layers'>> & { readonly panel?: Partial<MirrorPanel> } = {},
): Stack {
  return {
    format: 1,
    title: 'invented',
    conditions: {
      wavelengths: { from: 380, to: 780, step: 5 },
      observer: 2,
      illuminant: 'D65',
      directions: [{ theta: 0, phi: 0 }],
      color_weights: [1, 1, 1],
    },
    layers,
    panel: { kind: 'mirror', index: 1, reflectance: 1, depolarized: 0, ...panel },
    emission: { luminance: 0, dark_luminance: 0, spectrum: 'D65', polarization: 'none' },
    ambient: [],
    limits: [],
    ...rest,
  }
}

/** Luminous reflectance, head-on unless a direction in degrees is given. */
export function darkerThan(max: number, thetaDeg = 0, phiDeg = 0): Limit {
  return { metric: 'luminous_reflectance', theta: thetaDeg * DEG, phi: phiDeg * DEG, max }
}
