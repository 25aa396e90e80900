import type { LayerFacts } from '../../studies/laminateFacts.js'
import { fixed, given } from '../decimals.js'
import { thicknessText } from './sheetHeight.js'

/** What is told beside a sheet, one or two lines; figures that differ from those before stand behind an arrow. */
export function layerTexts(layer: LayerFacts, before: LayerFacts | undefined): string[] {
  const told = (of: (facts: LayerFacts) => number | undefined, shown: (value: number) => string): string => {
    const [now, then] = [of(layer), before && of(before)]
    if (now === undefined) return ''
    const text = shown(now)
    return then === undefined || shown(then) === text ? text : `${shown(then)} → ${text}`
  }
  const body = [
    told((facts) => facts.thickness_nm, thicknessText),
    `n ${told(
      (facts) => facts.index,
      (n) => fixed(n, 3),
    )}`,
    ...(layer.film === undefined ? [] : [layer.film]),
  ]
  const optics = [
    ...(layer.axis_deg === undefined
      ? []
      : [`${AXIS_NAMES[layer.kind]} ${told((facts) => facts.axis_deg, degreesText)}`]),
    ...(layer.tilt_deg === undefined ? [] : [`tilt ${told((facts) => facts.tilt_deg, degreesText)}`]),
    ...(layer.re_nm === undefined ? [] : [`Re ${told((facts) => facts.re_nm, nmText)} nm`]),
    ...(layer.rth_nm === undefined ? [] : [`Rth ${told((facts) => facts.rth_nm, nmText)} nm`]),
    ...Object.entries(layer.transmittances ?? {}).map(([name, value]) => `${SYMBOLS[name]} ${given(100 * value)} %`),
  ]
  return [body.join(' · '), ...(optics.length > 0 ? [optics.join(' · ')] : [])]
}

const AXIS_NAMES: Readonly<Record<LayerFacts['kind'], string>> = {
  isotropic: '',
  retarder: 'slow axis',
  polarizer: 'absorbs along',
  crystal: 'first axis',
}

/** Trade symbols; the list of assumptions spells them out. */
const SYMBOLS: Readonly<Record<string, string>> = {
  single_transmittance: 'Ts',
  polarization_efficiency: 'P',
  k1: 'K1',
  k2: 'K2',
  transmission_axis_transmittance: 'T1',
  absorption_axis_transmittance: 'T2',
}

function degreesText(degrees: number): string {
  return `${given(Number(degrees.toFixed(2)))}°`
}

function nmText(nm: number): string {
  return given(Number(nm.toFixed(1)))
}
