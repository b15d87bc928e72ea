import { spawnSync } from 'node:child_process'

/** Runs a tool on a PDF and returns what it prints; a missing tool fails with the package that brings it. */
export function pdfTool(tool: string, args: readonly string[], debianPackage = 'poppler-utils'): string {
  const { error, stdout, stderr, status } = spawnSync(tool, args, { encoding: 'utf8', maxBuffer: 1 << 28 })
  if (error) throw new Error(`${tool} is missing: install the package ${debianPackage}.`)
  if (status !== 0) throw new Error(`${tool} ${args.join(' ')}: ${stdout}${stderr}`)
  return stdout
}
