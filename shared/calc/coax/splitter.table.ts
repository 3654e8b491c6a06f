/**
 * Usual through loss of splitters, dB by port (public copies; two manuals use 4.5 for 2 ways and 8.5 for 4). The 3-way
 * is unbalanced: one port of 3.5, two of 7. Ports without a cable are closed with a terminator.
 */
export const splitterLossDb = { '2-way': [3.5], '3-way': [3.5, 7, 7], '4-way': [7], '8-way': [10.5] } as const
export type Splitter = keyof typeof splitterLossDb
