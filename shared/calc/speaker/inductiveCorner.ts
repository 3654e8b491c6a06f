import { finite, usable } from '../usable.ts'

/** Inductance of ordinary loudspeaker pair, microhenry per metre: 0.21 µH per foot (audio article, public copy). */
export const usualInductanceUhPerM = 0.21 / 0.3048

/**
 * Frequency at which a line's own inductance takes 3 dB off, Hz: Z/(2 pi L). One-way length in metres, inductance of
 * the pair in microhenry per metre. Null unless all are more than nothing: without inductance there is no corner.
 */
export function inductiveCornerHz(
  loadOhm: number,
  lengthM: number,
  inductanceUhPerM: number = usualInductanceUhPerM,
): number | null {
  if (!usable(loadOhm, lengthM, inductanceUhPerM) || loadOhm <= 0 || lengthM <= 0 || inductanceUhPerM <= 0) return null
  return finite(loadOhm / (2 * Math.PI * lengthM * inductanceUhPerM * 1e-6))
}
