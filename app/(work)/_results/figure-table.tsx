import { Anchored } from '@/app/(work)/_comments/anchored'
import { ScrollRegion } from '@/lib/ui/scroll-region'

export interface FigureRow<Item> {
  label: string
  /** By which a comment names this figure. */
  anchor?: (item: Item) => string | undefined
  print: (item: Item) => string
}

interface FigureTableProps<Item> {
  caption: string
  items: readonly Item[]
  itemId: (item: Item) => string
  name: (item: Item) => string
  rows: readonly FigureRow<Item>[]
}

/** Figures down the side, one column an item: each label says what its number refers to. */
export function FigureTable<Item>({ caption, items, itemId, name, rows }: FigureTableProps<Item>) {
  if (items.length === 0) return null
  return (
    <ScrollRegion label={`${caption}, table`} className="w-fit max-w-full border border-hair bg-sheet">
      <table className="dense">
        <caption className="px-2.5 pt-1.5 text-left font-semibold">{caption}</caption>
        <thead>
          <tr>
            <td />
            {items.map((item) => (
              <th key={itemId(item)} scope="col" className="number">
                {name(item)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ label, anchor, print }) => (
            <tr key={label}>
              <th scope="row" className="font-normal">
                {label}
              </th>
              {items.map((item) => (
                <td key={itemId(item)} className="number">
                  <Anchored on={anchor?.(item)}>{print(item)}</Anchored>
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollRegion>
  )
}
