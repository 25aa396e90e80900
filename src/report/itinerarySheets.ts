import { ellipseRow } from '../charts/ellipseRow.js'
import { poincare } from '../charts/poincare.js'
import { PAPER } from '../charts/theme.js'
import type { Itinerary, Pass } from '../studies/itinerary.js'
import { given } from './decimals.js'
import type { Sheet } from './sheet.js'

/** Room the row of ellipses takes for each layer, and at its sides, px. */
const COLUMN_PX = 88
const MARGINS_PX = 110

/** For each wavelength: the ellipses layer by layer, and the way over the Poincaré sphere. */
export function itinerarySheets(itinerary: Itinerary): Sheet[] {
  const wavelengths = [...new Set(itinerary.passes.map(({ wavelength_nm }) => wavelength_nm))]
  return wavelengths.flatMap((nm) => {
    const passes = itinerary.passes.filter(({ wavelength_nm }) => wavelength_nm === nm)
    const title = `${itinerary.title}: ${given(nm)}\u00a0nm, θ ${given(itinerary.theta_deg)}° φ ${given(itinerary.phi_deg)}°`
    return [ellipseSheet(passes, title, nm), sphereSheet(passes, title, nm)]
  })
}

function ellipseSheet(passes: readonly Pass[], title: string, nm: number): Sheet {
  const [inward, outward] = ways(passes)
  const layers = inward.map((pass) => ({
    name: pass.layer,
    goingIn: stateOf(pass),
    comingBack: stateOf(outward.find(({ layer }) => layer === pass.layer) ?? pass),
  }))
  return {
    name: `ellipses-${given(nm)}nm`,
    chart: ellipseRow({ title, layers }, PAPER),
    width: Math.max(720, MARGINS_PX + COLUMN_PX * layers.length),
    height: 380,
  }
}

function stateOf({ stokes, azimuth_deg, ellipticity_deg, degree_of_polarization }: Pass) {
  return {
    share: stokes[0],
    azimuthRad: radians(azimuth_deg),
    ellipticityRad: radians(ellipticity_deg),
    degree: degree_of_polarization,
  }
}

function sphereSheet(passes: readonly Pass[], title: string, nm: number): Sheet {
  const [inward, outward] = ways(passes)
  const data = { title, ways: [wayOf('going in', inward), wayOf('coming back', outward)] }
  return { name: `sphere-${given(nm)}nm`, chart: poincare(data, PAPER), width: 720, height: 640 }
}

function ways(passes: readonly Pass[]): [Pass[], Pass[]] {
  return [passes.filter(({ direction }) => direction === 'in'), passes.filter(({ direction }) => direction === 'out')]
}

/** Light less polarized than this has no place on the sphere worth a mark. */
const POLARIZED = 0.05
/** Distance on the unit sphere below which a layer has not moved the state. */
const UNMOVED = 0.01

/** The states that a layer moved, with what lies inside the film that moved them. */
function wayOf(name: string, passes: readonly Pass[]) {
  const states: { label: string; stokes: Vector }[] = []
  const between: Vector[][] = []
  for (const pass of passes) {
    const stokes = onSphere(pass.stokes)
    const last = states.at(-1)
    if (pass.degree_of_polarization < POLARIZED || (last && distance(last.stokes, stokes) < UNMOVED)) continue
    if (last) between.push((pass.within ?? []).map(onSphere))
    states.push({ label: pass.layer, stokes })
  }
  return { name, states, between }
}

type Vector = readonly [number, number, number]

function onSphere([s0, s1, s2, s3]: Pass['stokes']): Vector {
  return [s1 / s0, s2 / s0, s3 / s0]
}

function distance(a: Vector, b: Vector): number {
  return Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2])
}

function radians(degrees: number): number {
  return (degrees * Math.PI) / 180
}
