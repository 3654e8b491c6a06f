import type { NodeTypesObject } from '@vue-flow/core'
import { markRaw } from 'vue'
import BayNode from '../nodes/BayNode.vue'
import DeviceNode from '../nodes/DeviceNode.vue'
import LevelNode from '../nodes/LevelNode.vue'
import PathwayNode from '../nodes/PathwayNode.vue'
import PlateNode from '../nodes/PlateNode.vue'
import RackNode from '../nodes/RackNode.vue'

/** Vue Flow wants its own component type; ours take only the data they use. */
export const riserNodeTypes = {
  level: markRaw(LevelNode), bay: markRaw(BayNode), plate: markRaw(PlateNode), device: markRaw(DeviceNode), rack: markRaw(RackNode), pathway: markRaw(PathwayNode),
} as unknown as NodeTypesObject
