import { spawnSync } from 'node:child_process'

/** The Debian package that holds each outside tool with which signatures are checked. */
const packages = {
  pdfsig: 'poppler-utils',
  pdftotext: 'poppler-utils',
  certutil: 'libnss3-tools',
  openssl: 'openssl',
  qpdf: 'qpdf',
} as const

/** Runs an outside tool and gives what it printed (both streams); a missing tool fails with the package to install. */
export function runTool(tool: keyof typeof packages, args: readonly string[]): { status: number; output: string } {
  const run = spawnSync(tool, args, { encoding: 'utf8' })
  if (run.error) throw new Error(`${tool} is not there: apt-get install ${packages[tool]} (${run.error.message})`)
  return { status: run.status ?? -1, output: run.stdout + run.stderr }
}

/** Writes DER as PEM under the given label. */
export function toPem(der: Uint8Array, label: 'CERTIFICATE' | 'X509 CRL'): string {
  const lines = Buffer.from(der).toString('base64').replace(/.{64}/g, '$&\n')
  return `-----BEGIN ${label}-----\n${lines}\n-----END ${label}-----\n`
}
