import * as z from 'zod'

const kept = z.object({
  checks: z.array(
    z.object({
      id: z.string(),
      sentence: z.string(),
      passed: z.boolean(),
      issues: z.array(z.object({ message: z.string() })).default([]),
    }),
  ),
})

export type KeptCheck = z.output<typeof kept>['checks'][number]

/** The pre-issue checks as they were kept with a revision; none where they have another form. */
export const keptChecks = (value: unknown): readonly KeptCheck[] => kept.safeParse(value).data?.checks ?? []
