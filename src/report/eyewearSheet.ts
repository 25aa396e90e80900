import { eyewearRoll } from '../charts/eyewearRoll.js'
import { PERCENT, type Quantity } from '../charts/quantity.js'
import { PAPER } from '../charts/theme.js'
import type { Eyewear, EyewearRoll } from '../studies/eyewear.js'
import { given } from './decimals.js'
import type { Sheet } from './sheet.js'

const LUMINANCE: Quantity = { label: 'luminance', unit: 'cd/m²', factor: 1 }
const TRANSMITTANCE: Quantity = { label: 'transmittance', ...PERCENT }

/** Brightness and color over half a turn of the lens. */
export function eyewearSheet({ title, theta_deg, phi_deg, rolls, summary }: Eyewear): Sheet {
  // The last roll is the first again, half a turn on.
  const closed = [...rolls, { ...rolls[0], roll_deg: 180 }]
  const lit = rolls[0].luminance !== undefined
  const brightest = summary.brightest.xyz[1]
  const data = {
    title: `${title}: through polarized eyewear`,
    notes: [`seen from θ ${given(theta_deg)}° φ ${given(phi_deg)}°`],
    rollRad: closed.map(({ roll_deg }) => (roll_deg * Math.PI) / 180),
    brightness: lit ? LUMINANCE : TRANSMITTANCE,
    screens: [
      {
        name: 'screen',
        through: closed.map(({ luminance, transmittance }: EyewearRoll) => luminance ?? transmittance),
        colorShift: closed.map(({ delta_uv }: EyewearRoll) => delta_uv ?? Number.NaN),
        xyz: closed.map(({ xyz: [x, y, z] }) => [x / brightest, y / brightest, z / brightest] as const),
      },
    ],
  }
  return { name: 'eyewear', chart: eyewearRoll(data, PAPER), width: 900, height: 640 }
}
