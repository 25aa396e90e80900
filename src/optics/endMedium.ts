import { createMedium, type Medium, type PanelEnd } from './opticalLayer.js'

/** The medium at the end: the metal, or the immersion of a mirror; `known` again where it is the same. */
export function endMedium(panel: PanelEnd, known: Medium | undefined): Medium {
  if (panel.kind === 'metal') return panel.medium
  if (known !== undefined && hasIndex(known, panel.index)) return known
  const index = { n: panel.index, k: new Float64Array(panel.index.length) }
  return createMedium(index, index, index)
}

/** Same lossless index at every wavelength: a panel whose reflectance alone changed keeps its immersion medium. */
function hasIndex(medium: Medium, index: Float64Array): boolean {
  for (let i = 0; i < index.length; i++) if (medium.permittivity[i] !== index[i] * index[i]) return false
  return true
}
