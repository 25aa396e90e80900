import { useEffect, useRef } from 'preact/hooks'
import { type Polarization, paintEllipse } from '../../charts/ellipseGlyph.js'
import type { Theme } from '../../charts/theme.js'
import type { Pass } from '../../studies/itinerary.js'

const SIZE_PX = 28

interface EllipseGlyphProps {
  /** Undefined: light of the room, unpolarized. */
  readonly pass: Pass | undefined
  readonly goingIn: boolean
  readonly where: string
  readonly theme: Theme
}

/** The state of the light at one face, as the viewer sees it. */
export function EllipseGlyph({ pass, goingIn, where, theme }: EllipseGlyphProps) {
  const canvas = useRef<HTMLCanvasElement>(null)
  useEffect(() => {
    const pen = canvas.current?.getContext('2d')
    if (!pen) return
    const scale = devicePixelRatio
    pen.setTransform(scale, 0, 0, scale, 0, 0)
    pen.clearRect(0, 0, SIZE_PX, SIZE_PX)
    paintEllipse(pen, [SIZE_PX / 2, SIZE_PX / 2], SIZE_PX / 2 - 2.5, polarizationOf(pass), goingIn, theme)
  })
  const text = `${goingIn ? 'going in' : 'coming back'}, ${where}: ${stateText(pass)}`
  return (
    <canvas
      ref={canvas}
      class="glyph"
      width={SIZE_PX * devicePixelRatio}
      height={SIZE_PX * devicePixelRatio}
      role="img"
      aria-label={text}
      title={text}
    />
  )
}

function polarizationOf(pass: Pass | undefined): Polarization {
  if (pass === undefined) return { azimuthRad: 0, ellipticityRad: 0, degree: 0 }
  const rad = Math.PI / 180
  return {
    azimuthRad: pass.azimuth_deg * rad,
    ellipticityRad: pass.ellipticity_deg * rad,
    degree: pass.degree_of_polarization,
  }
}

function stateText(pass: Pass | undefined): string {
  if (pass === undefined) return '100 %, unpolarized'
  const { stokes, azimuth_deg, ellipticity_deg, degree_of_polarization } = pass
  const share = `${(100 * stokes[0]).toPrecision(3)} %`
  return `${share}, axis ${azimuth_deg.toFixed(1)}°, ellipticity ${ellipticity_deg.toFixed(1)}°, polarized ${(100 * degree_of_polarization).toFixed(0)} %`
}
