import fs from 'node:fs'
import path from 'node:path'
import { type KeyFile, keyFileName } from '@/app/(account)/_signing/key-file'
import { makePassword } from '@/lib/server/people/password'
import { type CastMember, cast } from './cast'

/** How one demo person gets in. */
export interface DemoPerson {
  name: string
  role: string
  email: string
  password: string
  /** Opens the signing key in the file. */
  passphrase?: string
  /** The signing key, to be chosen in the browser. */
  keyFile?: string
}

/** Random for each installation: a demo that is reachable by others must not have known passwords. */
export const makeDemoPeople = (secretsFile: string): (DemoPerson & { member: CastMember })[] =>
  cast.map((member) => ({
    member,
    name: member.name,
    role: member.words,
    email: member.email,
    password: makePassword(),
    ...(member.signs
      ? { passphrase: makePassword(), keyFile: path.join(path.dirname(secretsFile), keyFileName(member.name)) }
      : {}),
  }))

/** Writes a file that only its owner may read, whole or not at all. */
export function writePrivate(file: string, value: object): void {
  fs.mkdirSync(path.dirname(file), { recursive: true, mode: 0o700 })
  const unfinished = `${file}.${process.pid}`
  fs.writeFileSync(unfinished, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600 })
  fs.renameSync(unfinished, file)
}

export function writeDemoSecrets(secretsFile: string, people: readonly (DemoPerson & { key?: KeyFile })[]): void {
  for (const { keyFile, key } of people) if (keyFile && key) writePrivate(keyFile, key)
  const shown = people.map(({ name, role, email, password, passphrase, keyFile }) => ({
    name,
    role,
    email,
    password,
    ...(passphrase ? { passphrase } : {}),
    ...(keyFile ? { keyFile } : {}),
  }))
  writePrivate(secretsFile, { people: shown })
}
