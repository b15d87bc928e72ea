import fs from 'node:fs'
import path from 'node:path'

export interface Person {
  name: string
  role: string
  email: string
  password: string
  passphrase?: string
  keyFile?: string
}

const file = path.resolve(import.meta.dirname, '../../.data/test/people.json')

/** The demo people of this run, with the passwords that its seed made. */
export function person(name: string): Person {
  const { people } = JSON.parse(fs.readFileSync(file, 'utf8')) as { people: Person[] }
  const found = people.find((p) => p.name.includes(name))
  if (!found) throw new Error(`The seed made nobody called ${name}.`)
  return found
}
