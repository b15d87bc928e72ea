import { randomUUID } from 'node:crypto'
import * as z from 'zod'

/** Identity of a row that the server makes. */
export const newId = (): string => randomUUID()

/** An identity as it comes in from an address or a form. */
export const idInput = z.string().min(1, 'Say which one.').max(64, 'This is no identity of ours.')
