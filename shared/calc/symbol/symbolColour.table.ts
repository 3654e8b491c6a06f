/**
 * Colour of a symbol's category. Source: hiddenwires.co.uk on ANSI-J-STD-710 (January 2015), whose list was cut off
 * after these three; the other categories are not known and no conformance is claimed.
 */
export const symbolColours = {
  'audio video': 'orange',
  communications: 'green',
  'safety and security': 'pink',
} as const
export type SymbolCategory = keyof typeof symbolColours
