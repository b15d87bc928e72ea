import { database } from '@/lib/server/db'
import { sendingBoss } from '@/lib/server/jobs/boss'
import { seedDemo } from './seed/seed-demo'

const secretsFile = process.env.DEMO_SECRETS_FILE
if (!secretsFile)
  throw new Error('DEMO_SECRETS_FILE is missing: say where the sign-ins of the demo people are written.')

const seeded = await seedDemo(secretsFile)
process.stdout.write(
  seeded ? `The demo people are in ${secretsFile}\n` : 'The database holds people already: left as it is.\n',
)
await database().$disconnect()
await (await sendingBoss()).stop({ graceful: false, wait: true })
process.exit()
