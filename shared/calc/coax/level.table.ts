/**
 * Levels at an outlet, dBmV. Analogue: 47 CFR 76.605(b)(3), public copies; after a 30 m drop 3. Digital: ANSI/SCTE 40,
 * from memory, unverified.
 */
export const outletLevelDbmv = {
  analogueLeast: 0,
  analogueAfterDropLeast: 3,
  qam64Least: -15,
  qam256Least: -12,
  qamMost: 15,
} as const
