import type { CapacitorInput, StaticLoadInput } from '../../engine/case-input'
import { perUnit, siemens, volt, voltAmpere } from '../../units/si'
import type { CapacitorRecord, LoadRecord } from '../document/network-records'

export const staticLoadInput = (load: LoadRecord): StaticLoadInput => ({
  id: load.id,
  busId: load.bus,
  power: { re: voltAmpere(load.active.si), im: voltAmpere(load.reactive.si) },
  ratedVoltage: volt(load.ratedVoltage.si),
  mix: load.mix,
  floor: perUnit(load.floor.si),
})

/** Susceptance Q/U² at the capacitor's own rated voltage. */
export const capacitorInput = (capacitor: CapacitorRecord): CapacitorInput => ({
  id: capacitor.id,
  busId: capacitor.bus,
  susceptance: siemens(capacitor.rating.si / capacitor.ratedVoltage.si ** 2),
})
