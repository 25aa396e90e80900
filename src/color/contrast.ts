export interface ContrastInput {
  /** Luminances at the eye, cd/m2, lit and switched off in the dark. */
  readonly onLuminance: number
  readonly darkLuminance: number
  /** Uniform ambient illuminance on the screen, lx. */
  readonly illuminanceLx: number
  readonly luminousReflectance: number
}

/** Ambient contrast (L_on + E R/π)/(L_off + E R/π): the screen adds the luminance it reflects, as a diffuser would. */
export function ambientContrast({
  onLuminance,
  darkLuminance,
  illuminanceLx,
  luminousReflectance,
}: ContrastInput): number {
  const reflected = (illuminanceLx * luminousReflectance) / Math.PI
  return (onLuminance + reflected) / (darkLuminance + reflected)
}
