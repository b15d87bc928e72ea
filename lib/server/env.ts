import 'server-only'
import * as z from 'zod'

const secret = z.string('is missing').min(32, 'is shorter than 32 characters')

const environment = z.object({
  DATABASE_URL: z.string('is missing').regex(/^postgres(ql)?:\/\//, 'is no address of a PostgreSQL database'),
  BETTER_AUTH_SECRET: secret,
  CA_WRAP_SECRET: secret,
  BASE_URL: z.url('is no address').default('http://127.0.0.1:3000'),
  PORT: z.string().regex(/^\d+$/, 'is no port number').optional(),
  /** Folder of the programs that were bundled for threads; the web process runs in a folder of its own. */
  JOBS_DIR: z.string().min(1).default('.jobs'),
  /** Header in which the reverse proxy writes the visitor's address, overwriting whatever came in. */
  TRUSTED_IP_HEADER: z.string().min(1).optional(),
  /** Further addresses, separated by commas, under which people reach the application. */
  TRUSTED_ORIGINS: z.string().optional(),
  /** Program that sends what comes in on its standard input, with its options. */
  MAIL_COMMAND: z.string().min(1).optional(),
  /** Sender of those messages. */
  MAIL_FROM: z.string().min(3).optional(),
})

export type Environment = z.infer<typeof environment>

/** What the process was started with. A missing or unusable variable stops it with one sentence that names it. */
export function readEnvironment(variables: Record<string, string | undefined> = process.env): Environment {
  // an empty variable counts as absent, as everywhere
  const given = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ''))
  const read = environment.safeParse(given)
  if (read.success) return read.data
  const first = read.error.issues[0]!
  throw new Error(`The environment variable ${first.path.join('.')} ${first.message}: set it and start again.`)
}

let known: Environment | undefined

/** The environment of this process, read once. */
export const env = (): Environment => {
  known ??= readEnvironment()
  return known
}
