import 'server-only'
import { PrismaPg } from '@prisma/adapter-pg'
import { type Prisma, PrismaClient } from '@/prisma/generated/client'
import { env } from './env'

/** A running transaction. */
export type Tx = Prisma.TransactionClient

/** Opens a client with its own pool; files and series are read only where a query asks for them. */
export function openDatabase(url: string, connections = 10) {
  return new PrismaClient({
    // the driver drops the offset of an instant, so every session speaks UTC
    adapter: new PrismaPg({ connectionString: url, max: connections, options: '-c timezone=UTC' }),
    transactionOptions: { maxWait: 10_000, timeout: 30_000 },
    omit: {
      caseRun: { series: true },
      revision: { document: true },
      report: { file: true },
      signatureRound: { file: true },
      authority: { wrappedKey: true },
    },
  })
}

export type Database = ReturnType<typeof openDatabase>

const shared = globalThis as typeof globalThis & { breakawayDatabase?: Database }

/** This process's client, opened at first use; it survives the reloading of modules in development. */
export function database(): Database {
  shared.breakawayDatabase ??= openDatabase(env().DATABASE_URL)
  return shared.breakawayDatabase
}
