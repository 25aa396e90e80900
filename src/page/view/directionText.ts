/** `θ 30°, φ 90°`; head-on has no azimuth. */
export function directionText({
  theta_deg,
  phi_deg,
}: {
  readonly theta_deg: number
  readonly phi_deg: number
}): string {
  const degrees = (value: number): string => `${Number(value.toFixed(1))}°`
  return theta_deg === 0 ? 'head-on' : `θ ${degrees(theta_deg)}, φ ${degrees(phi_deg)}`
}
