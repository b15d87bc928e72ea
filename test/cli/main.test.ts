import { spawnSync } from 'node:child_process'
import fs from 'node:fs'
import path from 'node:path'
import { beforeAll, describe, expect, test } from 'vitest'
import { readArguments } from '@/lib/cli/arguments'
import { bundleOptions } from '@/lib/start/bundle.mjs'

const root = path.resolve(import.meta.dirname, '../..')
const folder = path.join(root, '.data/test/cli')
const programs = path.join(folder, 'programs')

beforeAll(async () => {
  const { build } = await import('esbuild')
  const entryPoints = {
    study: 'lib/cli/main.ts',
    compute: 'lib/compute/node.worker.ts',
    render: 'lib/compute/render.worker.ts',
  }
  await build({ ...bundleOptions(), entryPoints, outdir: programs, write: true })
}, 60_000)

const study = (...words: string[]) =>
  spawnSync(process.execPath, [path.join(programs, 'study.js'), ...words], { encoding: 'utf8', cwd: root })

describe('the command that computes a study file', () => {
  test('writes results, tables, plots and the report, prints the verdict, and ends with 0', () => {
    const out = path.join(folder, 'one-motor')
    fs.rmSync(out, { recursive: true, force: true })
    const { status, stdout, stderr } = study('lib/cli/examples/one-motor.json', '--out', out)
    expect(status, stderr).toBe(0)
    expect(stdout).toMatch(/^Verdict: \w/)
    const names = fs.readdirSync(out)
    for (const name of ['results.json', 'report.pdf', 'single-line-diagram.svg', 'limits.csv', 'starts.csv'])
      expect(names.join(' ')).toContain(name)
    expect(names.some((name) => name.endsWith('-speed.svg'))).toBe(true)
    expect(fs.readFileSync(path.join(out, 'report.pdf')).subarray(0, 5).toString()).toBe('%PDF-')
  }, 120_000)

  test('prints one JSON object for scripts', () => {
    const out = path.join(folder, 'json')
    const { stdout } = study('lib/cli/examples/one-motor.json', '--out', out, '--no-report', '--json')
    expect(JSON.parse(stdout)).toMatchObject({ engineVersion: expect.any(String), verdict: expect.any(String) })
    expect(fs.existsSync(path.join(out, 'report.pdf'))).toBe(false)
  }, 60_000)

  test('refuses a file that is no study with 1 and one sentence', () => {
    const file = path.join(folder, 'no-study.json')
    fs.writeFileSync(file, '{"format":"something"}')
    const { status, stderr, stdout } = study(file, '--out', path.join(folder, 'never'))
    expect(status).toBe(1)
    expect(stdout).toBe('')
    expect(stderr.trim().split('\n')).toHaveLength(1)
  }, 60_000)

  test('names a file that is not there', () => {
    const { status, stderr } = study('nowhere.json', '--out', path.join(folder, 'never'))
    expect(status).toBe(1)
    expect(stderr).toContain('nowhere.json')
  }, 60_000)
})

test.each([
  [[], 'Name the study file to compute.'],
  [['a.json'], 'Name the folder for the results with --out.'],
  [['a.json', 'b.json', '--out', 'x'], 'Name one study file; “b.json” is a second one.'],
  [['a.json', '--out', 'x', '--date', '12.5.2026'], 'Give --date as year-month-day, for example 2026-05-12.'],
])('the words %j are answered by how to say it', (words, message) => {
  expect(readArguments(words)).toEqual({ kind: 'usage', message })
})
