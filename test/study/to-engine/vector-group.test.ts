import { describe, expect, it } from 'vitest'
import { lagOfGroup } from '@/lib/study/to-engine/vector-group'

describe('the angle of a vector group', () => {
  it.each([
    ['Dyn11', 11],
    ['YNd1', 1],
    ['Dd0', 0],
    ['Yy6', 6],
    ['YN yn 0', 0],
    ['D-yn-5', 5],
  ])('of %s is its clock number of thirty degrees behind the high-voltage side', (group, clock) => {
    expect(lagOfGroup(group)).toBeCloseTo((clock * Math.PI) / 6, 12)
  })

  it.each(['', 'Dyn', 'Dyn12', 'delta star', 'YNyn0d1'])('is unstated for “%s”', (group) => {
    expect(lagOfGroup(group)).toBeNull()
  })
})
