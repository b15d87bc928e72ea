import { describe, expect, test } from 'vitest'
import { clipPolyline } from '@/lib/drawing/plot/clip-polyline'

const box = { x: 0, y: 0, width: 10, height: 10 }

describe('cutting a polyline to the plot', () => {
  test('a line inside stays as it is', () => {
    expect(
      clipPolyline(
        [
          [1, 1],
          [5, 2],
          [9, 9],
        ],
        box,
      ),
    ).toEqual([
      [
        [1, 1],
        [5, 2],
        [9, 9],
      ],
    ])
  })

  test('a line that leaves and comes back is two parts that end on the edge', () => {
    expect(
      clipPolyline(
        [
          [2, 5],
          [2, 15],
          [8, 15],
          [8, 5],
        ],
        box,
      ),
    ).toEqual([
      [
        [2, 5],
        [2, 10],
      ],
      [
        [8, 10],
        [8, 5],
      ],
    ])
  })

  test('a line that runs past a corner leaves nothing', () => {
    expect(
      clipPolyline(
        [
          [-5, 8],
          [5, 18],
        ],
        box,
      ),
    ).toEqual([])
  })

  test('a line across the whole plot is cut at both edges', () => {
    expect(
      clipPolyline(
        [
          [-10, 5],
          [20, 5],
        ],
        box,
      ),
    ).toEqual([
      [
        [0, 5],
        [10, 5],
      ],
    ])
  })
})
