import type { Prisma } from '@/prisma/generated/client'

/** A plain value as the database stores and gives it back: members that are undefined are gone. */
export const toJson = (value: object): Prisma.InputJsonObject => JSON.parse(JSON.stringify(value))
