import type { Scene } from '@/lib/drawing/scene'
import { SceneSvg } from '@/lib/drawing/scene-svg'
import { ScrollRegion } from '@/lib/ui/scroll-region'
import type { SampledTable } from './sampled-table'

/** A plot, its words, and the same curves as a table. */
interface FigureProps {
  scene: Scene
  table: SampledTable
  /** By which a comment names the curve; the instant is asked for. */
  anchor?: string
}

export function Figure({ scene, table, anchor }: FigureProps) {
  return (
    <figure className="m-0 border border-hair bg-sheet p-2" data-anchor={anchor} data-words={scene.title}>
      <figcaption className="px-1 pb-1 font-semibold">{scene.title}</figcaption>
      <ScrollRegion label={`${scene.title}, drawn`}>
        <SceneSvg scene={scene} className="block min-w-116" />
      </ScrollRegion>
      <details className="px-1 pt-1 text-dense">
        <summary className="text-accent">Show as a table</summary>
        <ScrollRegion label={`${scene.title}, as a table`} className="max-h-80 overflow-y-auto">
          <table className="dense">
            <caption className="sr-only">{scene.title}</caption>
            <thead>
              <tr>
                {table.heads.map((head) => (
                  <th key={head} scope="col" className="number">
                    {head}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {table.rows.map(({ key, cells }) => (
                <tr key={key}>
                  {cells.map((cell, index) => (
                    <td key={table.heads[index]} className="number">
                      {cell}
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </ScrollRegion>
      </details>
    </figure>
  )
}
