/** The colours of tokens.css that Naive UI needs as hexes, because it mixes tints of its own. */
export interface Palette {
  readonly gypsum: string
  readonly sheet: string
  readonly joint: string
  readonly stud1: string
  readonly stud2: string
  readonly stud3: string
  readonly graphite: string
  readonly graphite2: string
  readonly graphite3: string
  readonly onGraphite: string
  readonly lvFill: string
  readonly lvWash: string
  readonly onLv: string
  readonly chalk: string
  readonly tested: string
  readonly stop: string
  readonly cautionInk: string
}

export const paper: Palette = {
  gypsum: '#F6F2E9', sheet: '#FFFDF8', joint: '#EBE4D6', stud1: '#DDD4C4', stud2: '#BDB19D', stud3: '#857A68',
  graphite: '#22252A', graphite2: '#4A4946', graphite3: '#655F54', onGraphite: '#FFFDF8',
  lvFill: '#F5821F', lvWash: '#FCE7D3', onLv: '#22252A', chalk: '#1D5A96', tested: '#23703A', stop: '#B3221A', cautionInk: '#714C00',
}

export const attic: Palette = {
  gypsum: '#1A1816', sheet: '#24211E', joint: '#131110', stud1: '#38342F', stud2: '#575047', stud3: '#8A8172',
  graphite: '#F2EDE3', graphite2: '#CBC4B6', graphite3: '#A69D8D', onGraphite: '#1A1816',
  lvFill: '#FF8F3C', lvWash: '#46301C', onLv: '#1A1816', chalk: '#93C2F0', tested: '#74CB8C', stop: '#FF8A7A', cautionInk: '#F3B83A',
}
