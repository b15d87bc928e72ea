import 'server-only'
import { promisify } from 'node:util'
import { gunzip, gzip } from 'node:zlib'
import type { CaseSeries } from '@/lib/engine/case-result'

const squeeze = promisify(gzip)
const expand = promisify(gunzip)

/** A case's curves as they are stored. */
export const packSeries = async (series: CaseSeries): Promise<Uint8Array<ArrayBuffer>> =>
  new Uint8Array(await squeeze(JSON.stringify(series)))

/** Stored curves as they were computed. Only the job writes them. */
export const unpackSeries = async (packed: Uint8Array): Promise<CaseSeries> =>
  JSON.parse((await expand(packed)).toString('utf8')) as CaseSeries
