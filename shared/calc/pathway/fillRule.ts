export const fillCableKinds = [
  'communications', 'coaxial', 'fibre, non-conductive', 'fibre, conductive', 'class 2 or 3', 'power',
] as const
export type FillCableKind = (typeof fillCableKinds)[number]

/**
 * Whether the fill tables of NEC Chapters 3 and 9 bind a cable by code. False for communications (800.110(B)), coaxial
 * (820.110(B)) and non-conductive fibre (770.110(B)): there 40 % is a TIA and BICSI design rule. Null for Class 2 and
 * 3, where editions differ: treat it as advice and ask the local code. Source: ecmweb.com quizzes, codebookcity 770-3.
 */
export function doesCodeLimitFill(cable: FillCableKind): boolean | null {
  switch (cable) {
    case 'communications':
    case 'coaxial':
    case 'fibre, non-conductive':
      return false
    case 'class 2 or 3':
      return null
    case 'fibre, conductive':
    case 'power':
      return true
  }
}
