import fs from 'node:fs'
import { expect, test } from 'vitest'
import { findBinaries, packageFolder, programIn } from '@/lib/start/embedded/binaries.mjs'

test.each([
  ['freebsd', 'x64'],
  ['linux', 'riscv64'],
  ['win32', 'arm64'],
])('on %s %s the person is told to bring a database server', (platform, architecture) => {
  expect(() => packageFolder(platform, architecture)).toThrow(
    /^No PostgreSQL binaries for this platform \(.+\): set DATABASE_URL to a PostgreSQL 15 or later\.$/,
  )
})

test('on this machine the server and the maker of clusters are found and can be run', () => {
  const native = findBinaries({})
  for (const name of ['postgres', 'initdb']) fs.accessSync(programIn(native, name), fs.constants.X_OK)
})
