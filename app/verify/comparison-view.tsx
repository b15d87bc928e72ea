import { Notice } from '@/lib/ui/notice'
import type { Comparison } from './compare-results'

/** Whether the recomputed study agrees with the report, and where it does not. */
export function ComparisonView({ comparison }: { comparison: Comparison }) {
  const { compared, differing, differences, engine } = comparison
  const agrees = differing === 0 && compared > 0
  return (
    <>
      <Notice tone={agrees ? 'good' : 'caution'}>
        {agrees
          ? `All ${compared} values of the report come out again at their printed digits.`
          : `${differing} of ${compared} values come out differently.`}
        {engine.attached === engine.here
          ? ` Computed with engine ${engine.here}, as the report was.`
          : ` Computed here with engine ${engine.here}; the report was computed with ${engine.attached ?? 'an unknown one'}, so numbers may move for reasons given in its list of changes.`}
      </Notice>
      {differences.length > 0 ? (
        <div className="overflow-x-auto">
          <table className="dense bg-sheet">
            <thead>
              <tr>
                <th scope="col">Value</th>
                <th scope="col">In the report</th>
                <th scope="col">Recomputed</th>
              </tr>
            </thead>
            <tbody>
              {differences.map(({ where, attached, here }) => (
                <tr key={where}>
                  <th scope="row">{where}</th>
                  <td className="number">{attached}</td>
                  <td className="number">{here}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
      {differing > differences.length ? (
        <p className="m-0 text-soft">The first {differences.length} are shown.</p>
      ) : null}
    </>
  )
}
