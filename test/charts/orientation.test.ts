import { createCanvas, loadImage } from '@napi-rs/canvas'
import { converter } from 'culori'
import { describe, expect, it } from 'vitest'
import { type Polarization, paintEllipse } from '../../src/charts/ellipseGlyph.js'
import { METRIC_QUANTITIES } from '../../src/charts/quantity.js'
import { PAPER, type Theme } from '../../src/charts/theme.js'
import { viewingCone } from '../../src/charts/viewingCone.js'
import { drawChart } from '../../src/cli/drawChart.js'
import { DEGREE, steps } from './steps.js'

describe('viewing cone', () => {
  it('turns counter-clockwise from three o’clock as the viewer sees it', async () => {
    const thetaRad = steps(0, 60, 10).map((deg) => deg * DEGREE)
    const phiRad = steps(0, 330, 30).map((deg) => deg * DEGREE)
    const values = thetaRad.map((t) => phiRad.map((p) => 0.05 + 0.04 * Math.sin(t) * Math.sin(p)))
    const config = viewingCone(
      { title: 'bright above', quantity: METRIC_QUANTITIES.luminous_reflectance, field: { thetaRad, phiRad, values } },
      PAPER,
    )
    const [width, height] = [700, 700]
    const png = await loadImage(await drawChart(config, { width, height, scale: 1, format: 'png' }))
    const pen = createCanvas(width, height).getContext('2d')
    pen.drawImage(png, 0, 0)
    const lightness = (x: number, y: number): number => {
      const [r, g, b] = pen.getImageData(x, y, 1, 1).data
      return converter('lab65')({ mode: 'rgb', r: r / 255, g: g / 255, b: b / 255 }).l
    }
    // Off the spokes and the iso-lines: the disc is centered near (300, 380) with a radius near 250.
    expect(lightness(330, 190)).toBeGreaterThan(lightness(330, 560) + 40)
    expect(config.options?.plugins?.subtitle?.text).toEqual(['worst 8.46 % at θ\u00a060°, φ\u00a090° (✕)'])
  })
})

describe('ellipse', () => {
  /** What the glyph draws: its longest outline, and the way of the arrow along it. */
  function drawn(state: Polarization, goingIn: boolean) {
    const paths: [number, number][][] = []
    const pen = createCanvas(10, 10).getContext('2d')
    pen.beginPath = () => void paths.push([])
    pen.moveTo = (x: number, y: number) => void paths[paths.length - 1].push([x, y])
    pen.lineTo = (x: number, y: number) => void paths[paths.length - 1].push([x, y])
    paintEllipse(
      pen as unknown as Parameters<typeof paintEllipse>[0],
      [0, 0],
      100,
      state,
      goingIn,
      PAPER satisfies Theme,
    )
    const outline = paths.find((path) => path.length > 20) ?? []
    const [tip, ...wings] = paths[paths.length - 1]
    const foot = [(wings[0][0] + wings[1][0]) / 2, (wings[0][1] + wings[1][1]) / 2]
    // Pixels have y down: a positive turn of the arrow about the center is clockwise to the eye.
    const clockwise = foot[0] * tip[1] - foot[1] * tip[0] > 0
    return { outline, clockwise }
  }
  const circular = (ellipticityRad: number): Polarization => ({ azimuthRad: 0, ellipticityRad, degree: 1 })

  // Right hand, thumb along the light, seen from the source: clockwise; the viewer is the source of what goes in only.
  it.each([
    ['right-handed going in', 40, true, true],
    ['left-handed going in', -40, true, false],
    ['right-handed coming back', 40, false, false],
    ['left-handed coming back', -40, false, true],
  ] as const)('%s turns as the viewer sees it', (_, ellipticityDeg, goingIn, clockwise) => {
    expect(drawn(circular(ellipticityDeg * DEGREE), goingIn).clockwise).toBe(clockwise)
  })

  it('has its long axis at its azimuth, counter-clockwise', () => {
    const { outline } = drawn({ azimuthRad: 30 * DEGREE, ellipticityRad: 10 * DEGREE, degree: 1 }, true)
    const [far] = [...outline].sort((a, b) => Math.hypot(...b) - Math.hypot(...a))
    const azimuthRad = Math.atan2(-far[1], far[0])
    expect(Math.sin(azimuthRad - 30 * DEGREE)).toBeCloseTo(0)
    expect(Math.hypot(...far)).toBeCloseTo(100 * Math.cos(10 * DEGREE))
  })
})
