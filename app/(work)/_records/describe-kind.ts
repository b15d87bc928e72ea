import type { RecordKind } from '@/lib/study/document/record-kinds'
import type { KindDescription } from './kind-description'
import { bus } from './kinds/bus'
import { capacitor } from './kinds/capacitor'
import { studyCase } from './kinds/case'
import { loadCondition, plantCondition } from './kinds/conditions'
import { drivenLoad } from './kinds/driven-load'
import { limit } from './kinds/limit'
import { line } from './kinds/line'
import { load } from './kinds/load'
import { motor } from './kinds/motor'
import { schedule } from './kinds/schedule'
import { starter } from './kinds/starter'
import { supply } from './kinds/supply'
import { transformer } from './kinds/transformer'

const descriptions: Record<RecordKind, KindDescription> = {
  bus,
  supply,
  transformer,
  line,
  load,
  capacitor,
  motor,
  'driven-load': drivenLoad,
  starter,
  'plant-condition': plantCondition,
  'load-condition': loadCondition,
  schedule,
  case: studyCase,
  limit,
}

export const describeKind = (kind: RecordKind): KindDescription => descriptions[kind]
