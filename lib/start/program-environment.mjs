// @ts-check
import { inRoot } from './root.mjs'

/**
 * What every program of the application finds in its environment, whoever starts it.
 * @param {{ databaseUrl: string, secrets: import('./secrets.mjs').Secrets, development?: boolean }} of
 * @returns {Record<string, string>}
 */
export const programEnvironment = ({ databaseUrl, secrets, development = false }) => ({
  ...secrets,
  DATABASE_URL: databaseUrl,
  // the web process runs in the folder of its build: the bundles of threads are named absolutely
  JOBS_DIR: inRoot('.jobs'),
  NODE_ENV: development ? 'development' : 'production',
  NEXT_TELEMETRY_DISABLED: '1',
})
