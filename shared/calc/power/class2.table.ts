/**
 * Class 2 supplies. Source: NEC chapter 9 table 11, public copy of its notes for 100 VA and 30 V; the rest from memory,
 * unverified. Local code decides.
 */
export const class2Limits = {
  /** Nameplate power, VA. */
  mostVa: 100,
  /** Nameplate current up to `fullCurrentV`, A: a 12 V supply is 60 VA. */
  mostA: 5,
  fullCurrentV: 20,
  /** Highest voltage, and where contact with wet parts is likely. */
  acMostV: 30,
  dcMostV: 60,
  wetAcMostV: 15,
  wetDcMostV: 30,
  /** A DC supply from 30 to 60 V that limits itself gives at most 150/V ampere into a short circuit. */
  inherentVa: 150,
} as const
