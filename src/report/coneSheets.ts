import { rangeOf, type ScaleRange } from '../charts/colorScale.js'
import type { PolarField } from '../charts/polarField.js'
import { METRIC_QUANTITIES } from '../charts/quantity.js'
import { PAPER } from '../charts/theme.js'
import { viewingCone } from '../charts/viewingCone.js'
import type { Cone } from '../studies/cone.js'
import type { Sheet } from './sheet.js'

export interface NamedCone {
  /** Of the design, among those compared; empty where there is one only. */
  readonly name: string
  readonly cone: Cone
}

const METRICS = ['luminous_reflectance', 'chroma'] as const

/** Darkness and color over the viewing cone, a sheet each and design; all designs on one scale. */
export function coneSheets(designs: readonly NamedCone[]): Sheet[] {
  return METRICS.flatMap((metric) => {
    const range = rangeOf(designs.flatMap(({ cone }) => cone[metric].flat()))
    return designs.map((design) => coneSheet(design, metric, range))
  })
}

function coneSheet({ name, cone }: NamedCone, metric: (typeof METRICS)[number], range: ScaleRange): Sheet {
  const quantity = METRIC_QUANTITIES[metric]
  const field: PolarField = {
    thetaRad: cone.theta_deg.map(radians),
    phiRad: cone.phi_deg.map(radians),
    values: cone[metric],
  }
  const title = `${cone.title}: ${quantity.label}${name === '' ? '' : `, ${name}`}`
  return {
    name: ['cone', metric.replaceAll('_', '-'), ...(name === '' ? [] : [name])].join('-'),
    chart: viewingCone({ title, quantity, field, range }, PAPER),
    width: 720,
    height: 700,
  }
}

function radians(degrees: number): number {
  return (degrees * Math.PI) / 180
}
