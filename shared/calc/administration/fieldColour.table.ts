/**
 * Colours of termination fields. Source: TIA-606-B, two or more summaries that agree; others swap purple, white and
 * gray, so that the colour is advice.
 */
export const fieldColours = {
  demarcation: 'orange',
  'network connection': 'green',
  'common equipment': 'purple',
  'first-level backbone': 'white',
  'second-level backbone': 'gray',
  horizontal: 'blue',
  'inter-building backbone': 'brown',
  'auxiliary or alarm': 'yellow',
  'key telephone': 'red',
} as const
export type TerminationField = keyof typeof fieldColours
