import fs from 'node:fs'
import path from 'node:path'
import { describe, expect, test } from 'vitest'

const root = path.resolve(import.meta.dirname, '..')

/** What a room may import: other rooms (folders under lib, or named folders) and packages; a trailing * takes every name with that beginning. */
interface Room {
  rooms: readonly string[]
  /** Rooms whose types may be named, and nothing that runs. */
  types?: readonly string[]
  packages: readonly string[]
  /** Why the line is drawn here. */
  because: string
}

const rooms: Record<string, Room> = {
  units: { rooms: [], packages: [], because: 'every part reads SI numbers, so this part may need nobody' },
  engine: {
    rooms: ['units'],
    packages: [],
    because:
      'the same pure calculation runs in Node, in a thread and in the browser, and can be trusted because it has no way out',
  },
  quantity: {
    rooms: ['units'],
    packages: ['mathjs'],
    because: 'cells are read in the browser while typing: it must stay small',
  },
  study: {
    rooms: ['units', 'quantity', 'engine'],
    packages: ['zod', 'mathjs/number'],
    because: 'the one document knows records and calculation, and neither screen, paper nor storage',
  },
  policy: {
    rooms: ['study/states'],
    packages: [],
    because: 'who may do what must be readable on its own and asked from server and screen alike',
  },
  drawing: {
    rooms: ['units', 'quantity', 'study', 'engine'],
    packages: ['d3-scale', 'd3-shape', 'react'],
    because: 'one scene serves screen and paper, so it may depend on neither',
  },
  report: {
    rooms: ['units', 'quantity', 'study', 'engine', 'drawing'],
    packages: [
      '@react-pdf/*',
      'pdfkit',
      'fontkit',
      'mathjax-full/*',
      '@cantoo/pdf-lib',
      'source-sans',
      'dejavu-fonts-ttf',
      'react',
      'react/jsx-runtime',
      'node:module',
      'node:fs',
      'node:path',
      'node:url',
    ],
    because: 'the printed study depends on the study alone: no database, no clock, no request',
  },
  seal: {
    rooms: [],
    packages: [
      'pkijs',
      'asn1js',
      'pvutils',
      '@peculiar/x509',
      'reflect-metadata',
      '@signpdf/*',
      '@cantoo/pdf-lib',
      'fontkit',
      'node:*',
    ],
    because: 'bytes in, bytes or verdict out: signatures can be judged without the application',
  },
  exchange: {
    rooms: ['units', 'quantity', 'study', 'engine'],
    packages: ['papaparse', 'fflate', 'zod'],
    because: 'files of other people are read at the edge and handed over as study documents',
  },
  compute: {
    rooms: ['engine', 'study', 'units'],
    packages: ['node:worker_threads', 'node:path', 'node:url', 'piscina'],
    because: 'threads carry the calculation and know nothing of what is done with it',
  },
  ui: {
    rooms: ['units', 'quantity'],
    packages: ['react', 'react-dom', '@base-ui/*', 'lucide-react', '@tanstack/*', 'react-hook-form'],
    because: 'a field or a table knows no noun of the trade',
  },
  cli: {
    rooms: ['units', 'engine', 'quantity', 'study', 'drawing', 'report', 'seal', 'exchange', 'compute'],
    packages: ['node:*'],
    because: 'a study file is computed and printed without database or server',
  },
  server: {
    rooms: ['units', 'quantity', 'study', 'policy', 'drawing', 'seal', 'exchange', 'compute', 'prisma/generated'],
    types: ['engine', 'report'],
    packages: [
      'server-only',
      '@prisma/adapter-pg',
      'pg',
      'pg-boss',
      'better-auth',
      'better-auth/*',
      '@node-rs/argon2',
      'next/headers',
      'next/navigation',
      'react',
      'zod',
      'node:*',
    ],
    because:
      'everything with input and output stands here; jobs ask compute and never the engine or the report themselves',
  },
}

/** Single files that may import more than their room, with the reason. */
const exceptions: Record<string, { rooms: readonly string[]; because: string }> = {
  'lib/compute/render.worker.ts': { rooms: ['report'], because: 'the only thread that prints' },
  'lib/compute/render.ts': { rooms: ['report'], because: 'names the type of what is printed' },
  'lib/server/studies/request-run.ts': { rooms: ['engine'], because: 'a result is kept for one version of the engine' },
}

const serverFiles = ['server', 'policy', 'study', 'quantity', 'units', 'drawing', 'ui', 'errors', 'engine', 'compute']
const clientFiles = ['policy', 'study', 'quantity', 'units', 'drawing', 'exchange', 'ui', 'compute', 'errors', 'engine']

/** Inside the engine each part may import those before it, and the types at its top. */
const engineOrder: Record<string, readonly string[]> = {
  numeric: [],
  network: ['numeric'],
  machines: ['numeric'],
  driven: ['numeric'],
  starters: ['numeric', 'network', 'machines', 'driven'],
  runup: ['numeric', 'network', 'machines', 'driven', 'starters'],
  criteria: ['numeric', 'network', 'machines', 'driven', 'starters', 'runup'],
  estimate: ['numeric', 'machines'],
  transient: ['numeric', 'network', 'machines', 'driven', 'starters'],
  flicker: ['numeric'],
  dynamic: ['numeric', 'network', 'machines', 'driven', 'starters', 'runup', 'transient', 'criteria'],
}

const filesIn = (folder: string): string[] =>
  fs.existsSync(folder)
    ? fs.readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
        const file = path.join(folder, entry.name)
        if (entry.isDirectory()) return entry.name === 'generated' ? [] : filesIn(file)
        return /\.tsx?$/.test(entry.name) ? [file] : []
      })
    : []

const read = (file: string) => fs.readFileSync(file, 'utf8')
const inProject = (file: string) => path.relative(root, file).split(path.sep).join('/')

/** Statements that bring something in: static imports and exports from elsewhere, with or without `type`. */
const statement = /^\s*(?:import|export)\s+(type\s)?(?:[^'"();]*?\sfrom\s+)?['"]([^'"\n]+)['"]/gm
const call = /\b(?:import|require|new URL)\s*\(\s*['"]([^'"\n]+)['"]/g

interface Import {
  name: string
  /** Types are gone when the code runs. */
  typesOnly: boolean
}

const importsIn = (file: string): Import[] => {
  const text = read(file)
  const statements = [...text.matchAll(statement)].map(([, type, name = '']) => ({
    name,
    typesOnly: type !== undefined,
  }))
  const calls = [...text.matchAll(call)].map(([, name = '']) => ({ name, typesOnly: false }))
  return [...statements, ...calls].filter(({ name }) => !name.endsWith('.json'))
}

const importsOf = (file: string): string[] => importsIn(file).map(({ name }) => name)

/** The room a project file stands in: `engine`, `errors`, `prisma/generated`, `app`, … */
const roomOf = (file: string): string => {
  const [top = '', second = ''] = inProject(file).split('/')
  if (top === 'lib') return second.replace(/\.ts$/, '')
  return top === 'prisma' ? `${top}/${second}` : top
}

const resolve = (from: string, name: string): string | null => {
  if (name.startsWith('@/')) return path.join(root, name.slice(2))
  return name.startsWith('.') ? path.resolve(path.dirname(from), name) : null
}

const takes = (allowed: readonly string[], name: string) =>
  allowed.some((one) => (one.endsWith('*') ? name.startsWith(one.slice(0, -1)) : name === one))

/** Imports of a file that the rule does not allow, as `file → import`. */
const breaches = (file: string, own: string, rule: Room) =>
  importsIn(file).flatMap(({ name, typesOnly }) => {
    const target = resolve(file, name)
    const more = [...(exceptions[inProject(file)]?.rooms ?? []), ...(typesOnly ? (rule.types ?? []) : []), 'errors']
    const allowed = target
      ? roomOf(target) === own ||
        [...rule.rooms, ...more].some((room) => room === roomOf(target) || inProject(target) === `lib/${room}`)
      : takes(rule.packages, name)
    return allowed ? [] : [`${inProject(file)} → ${name}`]
  })

describe('each room imports only what its row in the table allows', () => {
  for (const [name, rule] of Object.entries(rooms)) {
    test(`${name}: ${rule.because}`, () => {
      const files = filesIn(path.join(root, 'lib', name))
      expect(files.length).toBeGreaterThan(0)
      expect(files.flatMap((file) => breaches(file, name, rule))).toEqual([])
    })
  }

  test('app: pages ask the server, and what runs in the browser never holds server, report or seal', () => {
    const bad = filesIn(path.join(root, 'app')).flatMap((file) => {
      const client = /^\s*['"]use client['"]/.test(read(file))
      const allowed = client ? clientFiles : serverFiles
      return importsOf(file).flatMap((name) => {
        const target = resolve(file, name)
        if (!target)
          return /^(next|react|react-dom|server-only|lucide-react|better-auth|@tanstack|@base-ui|node:|zod)/.test(name)
            ? []
            : [`${inProject(file)} → ${name}`]
        return roomOf(target) === 'app' || allowed.includes(roomOf(target)) ? [] : [`${inProject(file)} → ${name}`]
      })
    })
    expect(bad).toEqual([])
  })

  test('app: the engine lends its types and nothing else, so that no calculation runs in a page', () => {
    const bad = filesIn(path.join(root, 'app')).flatMap((file) =>
      [...read(file).matchAll(/^import\s+(?!type\b)([^'"]*)from\s+['"]@\/lib\/engine\/[^'"]+['"]/gm)]
        .filter((match) => !/^\{(\s*type\s+\w+\s*,?)+\s*\}\s*$/.test(match[1] ?? ''))
        .map((match) => `${inProject(file)}: ${match[0]}`),
    )
    expect(bad).toEqual([])
  })

  test('nobody imports app', () => {
    const bad = filesIn(path.join(root, 'lib')).flatMap((file) =>
      importsOf(file)
        .filter((name) => name.startsWith('@/app/'))
        .map((name) => `${inProject(file)} → ${name}`),
    )
    expect(bad).toEqual([])
  })
})

test('inside the engine numbers come before the network, machines before starters, the run-up before its limits', () => {
  const bad = Object.entries(engineOrder).flatMap(([part, before]) =>
    filesIn(path.join(root, 'lib/engine', part)).flatMap((file) =>
      importsOf(file).flatMap((name) => {
        const [, , folder = '', inner] = inProject(resolve(file, name) ?? '').split('/')
        const free = inner === undefined || folder === part || before.includes(folder)
        return free || roomOf(resolve(file, name) ?? '') !== 'engine' ? [] : [`${inProject(file)} → ${name}`]
      }),
    ),
  )
  expect(bad).toEqual([])
})

test('no clock and no chance in the engine', () => {
  const bad = filesIn(path.join(root, 'lib/engine'))
    .filter((file) =>
      /\bMath\.random\b|\bDate\b|\bperformance\b|\bprocess\./.test(read(file).replace(/\/\*[\s\S]*?\*\/|\/\/.*/g, '')),
    )
    .map(inProject)
  expect(bad).toEqual([])
})

describe('files stay small and say what they are', () => {
  const sources = ['app', 'lib', 'prisma', 'test', 'e2e'].flatMap((top) => filesIn(path.join(root, top)))

  test('no file is longer than 400 lines', () => {
    expect(sources.filter((file) => read(file).split('\n').length > 401).map(inProject)).toEqual([])
  })

  test('half of the files have fewer than 80 lines, nine of ten fewer than 250', () => {
    const lengths = sources.map((file) => read(file).split('\n').length).sort((a, b) => a - b)
    expect(lengths[Math.floor(lengths.length * 0.5)]).toBeLessThan(80)
    expect(lengths[Math.floor(lengths.length * 0.9)]).toBeLessThan(250)
  })

  test('there are no barrels and no drawers for odds and ends', () => {
    expect(
      sources
        .filter((file) => /(^|\/)(index|utils?|helpers?|misc|common)(\.tsx?$|\/)/.test(inProject(file)))
        .map(inProject),
    ).toEqual([])
  })

  test('nothing is typed as any, and no rule is silenced', () => {
    const silenced = /(:|<|\bas)\s+any\b|@ts-(ignore|nocheck|expect-error)|biome-ignore|eslint-disable/
    const own = path.resolve(import.meta.filename)
    expect(sources.filter((file) => file !== own && silenced.test(read(file))).map(inProject)).toEqual([])
  })

  test('the top level holds what the house allows', () => {
    const allowed = [
      'README.md',
      'DEVELOPERS.md',
      'package.json',
      'package-lock.json',
      'next.config.js',
      'tsconfig.json',
      'proxy.ts',
      'instrumentation.ts',
      'app',
      'lib',
      'prisma',
      'test',
      'e2e',
      'node_modules',
      'next-env.d.ts',
    ]
    expect(
      fs
        .readdirSync(root)
        .filter((name) => !name.startsWith('.') && !allowed.includes(name) && !name.endsWith('.tsbuildinfo')),
    ).toEqual([])
  })
})
