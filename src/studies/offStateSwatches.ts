/**
 * The color of the switched-off screen as another screen can show it. The eye is taken to be adapted to a white of the
 * scene; that white is mapped to the white of sRGB (Bradford), and the off-state keeps its luminance relative to it:
 *
 *   L_off = L_dark + E R/π,  white of a diffuser: E/π,  white of the lit screen: L_on + E R/π
 *
 * (E uniform ambient illuminance). Both whites are taken to have the color of the illuminant, as has L_dark.
 */
import { Scene } from '../appearance/scene.js'
import { linearRgbToSrgb, srgbToHex, xyzToLinearRgb } from '../color/srgb.js'
import type { Direction, Stack } from '../stack/stack.js'

/** lx, cd/m². */
export interface OffStateSwatch {
  readonly illuminance_lx: number
  readonly relative_to: 'white_diffuser' | 'lit_screen'
  readonly white_luminance: number
  readonly off_luminance: number
  /** L_off over that of the white. */
  readonly relative_luminance: number
  /** `#rrggbb`. */
  readonly srgb: string
  /** Whether a channel had to be cut: the color lies outside sRGB. */
  readonly clipped: boolean
}

/** Where the file names no illuminance: what offices are lit with (500 lx for reading and writing, EN 12464-1, from memory). */
const OFFICE_LX = 500

/**
 * For each illuminance of the file, against a white diffuser and the lit screen; from the first direction of the file unless
 * another is given.
 */
export function offStateSwatches(
  stack: Stack,
  { theta, phi }: Direction = stack.conditions.directions[0],
  scene: Scene = new Scene(stack),
): OffStateSwatch[] {
  const look = scene.look(stack, theta, phi)
  const share = scene.emissionShare(stack, look)
  const { whiteXyz } = scene.weights
  const levels = stack.ambient.length > 0 ? stack.ambient : [OFFICE_LX]
  const litLuminance = look.luminousEmissionTransmittance === undefined ? 0 : stack.emission.luminance * share
  const darkLuminance = stack.emission.dark_luminance * share
  return levels.flatMap((illuminance_lx) => {
    const diffuser = illuminance_lx / Math.PI
    const reflected = diffuser * look.luminousReflectance
    // X, Y, Z of the off-state in cd/m².
    const off = look.xyz.map((value, k) => (value * diffuser + whiteXyz[k] * darkLuminance) / 100)
    const swatch = (relative_to: OffStateSwatch['relative_to'], white_luminance: number): OffStateSwatch => {
      const relative = off.map((value) => (100 * value) / white_luminance) as [number, number, number]
      return {
        illuminance_lx,
        relative_to,
        white_luminance,
        off_luminance: off[1],
        relative_luminance: off[1] / white_luminance,
        ...onScreen(relative, whiteXyz),
      }
    }
    const lit = litLuminance > 0 ? [swatch('lit_screen', litLuminance + reflected)] : []
    return [swatch('white_diffuser', diffuser), ...lit]
  })
}

function onScreen(xyz: readonly [number, number, number], white: readonly [number, number, number]) {
  const linear = xyzToLinearRgb(xyz, white)
  // A thousandth of the white is below the last bit a screen shows of a channel.
  const clipped = linear.some((channel) => channel < -0.001 || channel > 1.001)
  return { srgb: srgbToHex(linearRgbToSrgb(linear)), clipped }
}
