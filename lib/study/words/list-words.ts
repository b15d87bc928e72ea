/** Words put together as in speech: `a`, `a and b`, `a, b and c`. */
export const listed = (words: readonly string[], joint = 'and'): string =>
  words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} ${joint} ${words.at(-1)}`

const numbered = (tag: string): { stem: string; number: number } | null => {
  const parts = /^(.*?)(\d+)$/.exec(tag)
  return parts ? { stem: parts[1] ?? '', number: Number(parts[2]) } : null
}

const follows = (before: string, after: string): boolean => {
  const [a, b] = [numbered(before), numbered(after)]
  return a !== null && b !== null && a.stem === b.stem && b.number === a.number + 1
}

/** Tags with three or more neighbours drawn together: M1, M2, M3 and B1 read `M1–M3 and B1`. */
export const listedTags = (tags: readonly string[]): string => {
  const runs: string[][] = []
  for (const tag of tags) {
    const run = runs.at(-1)
    const last = run?.at(-1)
    if (run && last !== undefined && follows(last, tag)) run.push(tag)
    else runs.push([tag])
  }
  return listed(runs.flatMap((run) => (run.length > 2 ? [`${run[0]}–${run.at(-1)}`] : run)))
}
