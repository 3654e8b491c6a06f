import type { Severity } from '../../../../shared/checks/finding.ts'
import type { JacketColour } from '../../../../shared/model/cableType.ts'
import type { Device } from '../../../../shared/model/device.ts'
import type { Plate, Rack } from '../../../../shared/model/place.ts'

export interface XY {
  readonly x: number
  readonly y: number
}
export interface Box {
  readonly x: number
  readonly y: number
  readonly w: number
  readonly h: number
}

/** full: a level with bays. roof: an attic under the roof. crawl: a crawl space, without bays. */
export type StoreyKind = 'full' | 'roof' | 'crawl'

/** One band of the section: a level, or an outside level drawn beside the house together with it. */
export interface StoreyBox {
  readonly levelIds: readonly string[]
  readonly kind: StoreyKind
  /** Edges of the building on this level. */
  readonly x0: number
  readonly x1: number
  /** Top of the structure over its ceiling, lowest trunk lane, ceiling, floor. */
  readonly top: number
  readonly trunk: number
  readonly ceiling: number
  readonly floor: number
  readonly folded: boolean
}

export interface BayBox extends Box {
  readonly roomId: string
  readonly storey: number
  readonly outside: boolean
  /** Where its name and ring stand. */
  readonly name: XY & { readonly width: number; readonly place: 'foot' | 'head' }
}

export interface PlateSpot extends XY {
  readonly plate: Plate
  readonly code: string
  readonly storey: number
  readonly scale: number
  readonly w: number
  readonly h: number
  readonly codeAt: XY & { readonly anchor: 'middle' | 'start' | 'end' }
  readonly dense: boolean
  /** On the outside of the building, which way it faces. */
  readonly facing: 'left' | 'right' | null
}

export type Glyph = 'speaker' | 'box' | 'display' | 'subwoofer' | 'shade' | 'screen' | 'desk' | 'camera' | 'contact' | 'service' | 'mast' | 'drop' | 'keypad' | 'dome'

export interface DeviceSpot extends Box {
  readonly device: Device
  readonly glyph: Glyph
  readonly mirrored: boolean
  /** From the plate to the device, both y; null where it touches. */
  readonly cord: readonly [x: number, from: number, to: number] | null
}

export interface PortSpot extends XY {
  readonly key: string
}
export interface RackUnit extends Box {
  readonly device: Device
  readonly text: string
  readonly isPanel: boolean
  readonly ports: readonly PortSpot[]
}
export interface RackBox extends Box {
  readonly rack: Rack
  readonly storey: number
  readonly units: readonly RackUnit[]
}

export interface ChaseBox extends Box {
  readonly pathwayIds: readonly string[]
  readonly note: XY
  readonly runIds: readonly string[]
}

/** One run as drawn. The trunk is the part in the bundle, the drop what each cable does on its own. */
export interface RunLine {
  readonly runId: string
  readonly jacket: JacketColour
  readonly trunk: string
  readonly drop: string
  /** The whole way with round corners, for the selected run. */
  readonly whole: string
  /** Its corners, for finding what a pointer is on. */
  readonly points: readonly XY[]
  /** Where it leaves the trunk: order of the walk with the arrow keys. */
  readonly exit: XY
  readonly storey: number
  readonly dropped: boolean
  /** Where an end without a place hangs; null: both have one. */
  readonly loose: XY | null
  /** The longest level stretch of its trunk, where its own tag fits. */
  readonly stretch: { readonly x0: number; readonly x1: number; readonly y: number }
}

export interface TagBox extends Box {
  readonly runId: string
  readonly text: string
  readonly severity: Severity | null
  /** x of the cable it hangs on. */
  readonly cable: number
  readonly flip: boolean
  readonly scale: number
}

export interface FoldTag extends Box {
  readonly roomId: string
  readonly runIds: readonly string[]
  readonly severity: Severity | null
}

export interface TrunkCount extends XY {
  readonly runIds: readonly string[]
}

export interface LevelCaption {
  readonly levelId: string
  readonly x: number
  readonly y: number
  readonly small: boolean
  readonly datum: { readonly y: number; readonly x1: number; readonly elevationMm: number } | null
}

/** The structure as paths of SVG. */
export interface HouseDrawing {
  readonly ground: string
  readonly groundLine: string
  readonly earth: string
  readonly body: string
  readonly voids: readonly Box[]
  readonly slabs: string
  readonly posts: string
  readonly joists: string
}

export interface RiserLayout {
  readonly width: number
  readonly height: number
  /** Drawn to be looked at from farther away: names grow as one goes back. */
  readonly isLarge: boolean
  readonly house: HouseDrawing
  readonly storeys: readonly StoreyBox[]
  readonly captions: readonly LevelCaption[]
  readonly bays: readonly BayBox[]
  readonly plates: readonly PlateSpot[]
  readonly devices: readonly DeviceSpot[]
  readonly racks: readonly RackBox[]
  readonly chases: readonly ChaseBox[]
  readonly runs: readonly RunLine[]
  readonly tags: readonly TagBox[]
  /** Tags at half size, for folded levels once one looks closely. */
  readonly closeTags: readonly TagBox[]
  readonly folds: readonly FoldTag[]
  readonly counts: readonly TrunkCount[]
  /** Runs with no end anywhere yet. */
  readonly tray: readonly string[]
}

/** What is written on a run's tag. */
export interface RunMark {
  readonly text: string
  readonly severity: Severity | null
}

export interface LayoutOptions {
  readonly mark: (runId: string) => RunMark | undefined
  readonly apart: boolean
}
