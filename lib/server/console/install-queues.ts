import { installQueues } from './queues'

// The command: the database is the one in the environment.
await installQueues(process.env.DATABASE_URL ?? '')
process.exit()
