/**
 * Places for labels at the wanted heights, moved apart so that neighbours stand `gap` from one another inside [from, to];
 * the order is kept and each group of touching labels stands as near to its wishes as it can. Throws a RangeError when there is no room.
 */
export const spreadLabels = (wanted: readonly number[], gap: number, from: number, to: number): readonly number[] => {
  if ((wanted.length - 1) * gap > to - from + 1e-9) throw new RangeError('There is no room for so many labels.')
  const order = wanted.map((_, i) => i).sort((a, b) => wanted[a]! - wanted[b]! || a - b)
  /** Groups of labels at the spacing `gap`, by the wish for the first of them. */
  const groups: { members: number[]; start: number }[] = []
  const clamp = (start: number, count: number) => Math.min(Math.max(start, from), to - (count - 1) * gap)
  for (const index of order) {
    groups.push({ members: [index], start: clamp(wanted[index]!, 1) })
    while (groups.length > 1) {
      const last = groups.at(-1)!
      const above = groups.at(-2)!
      if (above.start + above.members.length * gap <= last.start + 1e-9) break
      groups.pop()
      above.members.push(...last.members)
      const wish = above.members.reduce((sum, i, k) => sum + wanted[i]! - k * gap, 0) / above.members.length
      above.start = clamp(wish, above.members.length)
    }
  }
  const placed = new Array<number>(wanted.length)
  for (const { members, start } of groups) for (const [k, index] of members.entries()) placed[index] = start + k * gap
  return placed
}
