import type { PlantRows, Row, StudyRows } from '@/lib/server/row'
import type { Option, Options } from '@/lib/ui/form/field'

const byTag = (rows: readonly Row[]): Option[] => rows.map((row) => ({ value: row.id, label: row.values.tag }))

/** What records may point at, by kind; a load curve is offered with the motor whose load it belongs to. */
export const recordOptions = (plant: PlantRows, study?: StudyRows): Options => ({
  ...Object.fromEntries(Object.entries({ ...plant, ...study }).map(([kind, rows]) => [kind, byTag(rows)])),
  bus: plant.bus.map(({ id, values }) => ({
    value: id,
    label: values.name === '' ? values.tag : `${values.tag}, ${values.name}`,
  })),
  curve: plant['driven-load'].flatMap(({ values }) =>
    values.curves.map((curve) => ({ value: curve.id, label: curve.name, within: values.motor })),
  ),
})

/** The same with tags alone, for tables. */
export const recordTags = (plant: PlantRows, study?: StudyRows): Options => ({
  ...recordOptions(plant, study),
  bus: byTag(plant.bus),
})
