export interface LabourUnit {
  task: string
  per: 'each' | 'run' | '1000 ft' | 'house'
  hours: number
}

/**
 * Hours for a task, for a company to replace by its own. Common practice, no source, except a box: published 0.10 to
 * 0.17 h.
 */
export const labourUnits = {
  layoutAndBox: { task: 'layout and box or bracket', per: 'each', hours: 0.15 },
  drillAndPull: { task: 'drill and pull, 4-pair or coax, open framing', per: 'run', hours: 0.45 },
  pullByLength: { task: 'drill and pull by length', per: '1000 ft', hours: 8 },
  extraCable: { task: 'each extra cable pulled with the first', per: 'run', hours: 0.15 },
  ceilingSpeakerRough: { task: 'in-ceiling speaker rough-in with bracket', per: 'each', hours: 0.6 },
  label: { task: 'label both ends and log', per: 'run', hours: 0.05 },
  terminateAndTest: { task: 'terminate and test jack and panel port', per: 'run', hours: 0.3 },
  coaxEnds: { task: 'coax compression ends, both, with test', per: 'run', hours: 0.2 },
  speakerTrim: { task: 'speaker trim and aim', per: 'each', hours: 0.5 },
  displayMount: { task: 'display mount, display not hung', per: 'each', hours: 1.5 },
  headEndPanel: { task: 'head-end panel build', per: 'house', hours: 2 },
  plate: { task: 'plate and dress', per: 'each', hours: 0.1 },
} as const satisfies Record<string, LabourUnit>

/**
 * Factors on hours. Published (residential cost-book page): upper floors 1.25, closed walls up to 4 times. The others
 * are common practice, no source. Above 14 ft a lift comes on top.
 */
export const labourFactors = {
  finishedWallsLeast: 2,
  finishedWallsMost: 4,
  upperFloor: 1.25,
  ceiling10To14Ft: 1.25,
  ceilingAbove14Ft: 1.5,
  atticInSummer: 1.3,
} as const

/** Hours of a crew's day, each. */
export const workdayHours = 8
