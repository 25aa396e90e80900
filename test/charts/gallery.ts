import type { ChartConfiguration } from 'chart.js'
import { budgetBars } from '../../src/charts/budgetBars.js'
import { ellipseRow } from '../../src/charts/ellipseRow.js'
import { eyewearRoll } from '../../src/charts/eyewearRoll.js'
import { histogram } from '../../src/charts/histogram.js'
import { offStateColor } from '../../src/charts/offStateColor.js'
import { paretoFront } from '../../src/charts/paretoFront.js'
import { poincare } from '../../src/charts/poincare.js'
import { reflectanceSpectrum } from '../../src/charts/reflectanceSpectrum.js'
import { residuals } from '../../src/charts/residuals.js'
import { searchProgress } from '../../src/charts/searchProgress.js'
import { sensitivityBars } from '../../src/charts/sensitivityBars.js'
import { sweepLines } from '../../src/charts/sweepLines.js'
import { sweepMap } from '../../src/charts/sweepMap.js'
import type { Theme } from '../../src/charts/theme.js'
import { viewingCone } from '../../src/charts/viewingCone.js'
import * as design from './designSamples.js'
import * as study from './studySamples.js'

export interface Exhibit {
  readonly name: string
  readonly build: (theme: Theme) => ChartConfiguration
  /** CSS pixels. */
  readonly width: number
  readonly height: number
}

function exhibit<Data>(
  chart: (data: Data, theme: Theme) => ChartConfiguration,
  data: Data,
  [width, height]: readonly [number, number] = [900, 540],
): Exhibit {
  return { name: chart.name, build: (theme) => chart(data, theme), width, height }
}

/** Every chart once, with invented data. */
export const GALLERY: readonly Exhibit[] = [
  exhibit(reflectanceSpectrum, design.reflectanceSpectrumData),
  exhibit(offStateColor, design.offStateColorData, [720, 760]),
  exhibit(searchProgress, design.searchProgressData),
  exhibit(viewingCone, design.viewingConeData, [760, 720]),
  exhibit(sweepMap, study.sweepMapData, [820, 640]),
  exhibit(sweepLines, study.sweepLinesData, [900, 620]),
  exhibit(histogram, study.histogramData),
  exhibit(sensitivityBars, study.sensitivityBarsData, [900, 420]),
  exhibit(residuals, study.residualsData, [900, 640]),
  exhibit(paretoFront, study.paretoFrontData, [900, 600]),
  exhibit(budgetBars, study.budgetBarsData, [900, 520]),
  exhibit(poincare, study.poincareData, [720, 760]),
  exhibit(ellipseRow, study.ellipseRowData, [1000, 440]),
  exhibit(eyewearRoll, study.eyewearRollData, [900, 640]),
]
