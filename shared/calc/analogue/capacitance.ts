import { finite, usable } from '../usable.ts'

/** Usual capacitance of audio cable, pF per metre (public copies). */
export const usualPfPerM = 100

const picofarad = 1e-12

/**
 * Frequency at which a source's resistance and its cable take 3 dB off, Hz: 1/(2 pi R C). Resistance in ohm, cable in
 * pF per metre and metres. Null unless all are more than nothing: without capacitance there is no corner.
 */
export const cornerHz = (sourceOhm: number, lengthM: number, pfPerM: number = usualPfPerM): number | null =>
  usable(sourceOhm, lengthM, pfPerM) && sourceOhm > 0 && lengthM > 0 && pfPerM > 0
    ? finite(1 / (2 * Math.PI * sourceOhm * pfPerM * lengthM * picofarad))
    : null

/**
 * What a source and its cable's capacitance lose at a frequency, dB: 10 log (1 + (2 pi f R C)²). Capacitance of the
 * whole cable in pF. Null for a negative figure.
 */
export const lowPassLossDb = (sourceOhm: number, capacitancePf: number, hz: number): number | null =>
  usable(sourceOhm, capacitancePf, hz) && sourceOhm >= 0 && capacitancePf >= 0 && hz >= 0
    ? finite(10 * Math.log10(1 + (2 * Math.PI * hz * sourceOhm * capacitancePf * picofarad) ** 2))
    : null

/**
 * Longest cable that loses at most so much at a frequency, m: root(10^(dB/10) - 1)/(2 pi f R C'). 1 dB is 0.509 of the
 * length for 3 dB. Null for a negative loss, or a source, cable or frequency of nothing.
 */
export function longestAtLossM(
  lossDb: number,
  sourceOhm: number,
  hz: number,
  pfPerM: number = usualPfPerM,
): number | null {
  if (!usable(lossDb, sourceOhm, hz, pfPerM) || lossDb < 0 || sourceOhm <= 0 || hz <= 0 || pfPerM <= 0) return null
  return finite(Math.sqrt(10 ** (lossDb / 10) - 1) / (2 * Math.PI * hz * sourceOhm * pfPerM * picofarad))
}

/**
 * Longest cable within a capacitance, m: 2500 pF is what RS-232 allows. Null for a negative limit or no capacitance.
 */
export const longestAtCapacitanceM = (mostPf: number, pfPerM: number): number | null =>
  usable(mostPf, pfPerM) && mostPf >= 0 && pfPerM > 0 ? finite(mostPf / pfPerM) : null
