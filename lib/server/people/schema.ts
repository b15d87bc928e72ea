import * as z from 'zod'
import { roles } from '@/lib/policy/role'
import { now } from '../clock'
import { leastPasswordLength, mostPasswordLength } from './password'

const line = (what: string, most: number) =>
  z.string().trim().min(1, `Give the ${what}.`).max(most, `Keep the ${what} within ${most} characters.`)

export const projectName = line('name of the project', 160).refine(
  (name) => !/\p{Cc}/u.test(name),
  'Use one line of text.',
)
export const clientName = z.string().trim().max(160, 'Keep the client within 160 characters.').default('')

/** A person's name as it stands in the title block and in the certificate, which holds 64 characters. */
export const personName = line('name of the person', 64).refine(
  (name) => !/\p{C}/u.test(name),
  'Use printable characters only.',
)

export const emailAddress = z
  .email('Give one e-mail address, such as name@example.org.')
  .max(190, 'This address is too long.')
  .transform((address) => address.toLowerCase())

export const projectRoles = z
  .array(z.enum(roles).exclude(['administrator']))
  .min(1, 'Choose at least one role.')
  .transform((list) => [...new Set(list)])

/** A password that a person chooses; longer ones would only cost time to hash. */
export const newPassword = z
  .string()
  .min(leastPasswordLength, `Use ${leastPasswordLength} characters or more.`)
  .max(mostPasswordLength, `Use ${mostPasswordLength} characters or fewer.`)

/** A day as a form gives it; the part that ends then lasts through that day. */
export const lastDay = z.iso
  .date('Give a day.')
  .transform((day) => new Date(`${day}T23:59:59.000Z`))
  .refine((end) => end > now(), 'Choose a day that lies ahead.')
