import fs from 'node:fs'
import { database } from '@/lib/server/db'
import { type Chain, chains } from './chains'
import { contradictions, headLine, readHeads } from './heads'

const usage = `Follows the chains of events of this installation.
  verify                  says of each chain whether it holds, from the first event to the last
  verify --against FILE   and whether the heads in FILE, kept earlier, still stand in them
  heads                   writes the head of each chain, one a line, to be kept elsewhere`

const say = (line: string): void => {
  process.stdout.write(`${line}\n`)
}

/** @returns the exit status: 0 when everything holds, 1 when a chain is broken, 2 when the question was none */
async function answer([command, flag, file, ...rest]: readonly string[]): Promise<number> {
  const known = (command === 'verify' && (flag === undefined || (flag === '--against' && file))) || command === 'heads'
  if (!known || rest.length > 0) {
    say(usage)
    return 2
  }
  const kept = flag === '--against' && file ? readHeads(fs.readFileSync(file, 'utf8')) : []
  const found: Chain[] = []
  for await (const chain of chains(database())) {
    found.push(chain)
    if (command === 'heads') say(headLine(chain))
    else
      say(
        `${chain.brokenAt === null ? 'holds ' : 'BROKEN'}  ${chain.name}: ${chain.events} events, ${chain.brokenAt === null ? `head ${chain.head}` : `broken at event ${chain.brokenAt}`}`,
      )
  }
  if (command === 'heads') return 0
  const gone = contradictions(kept, found)
  for (const line of gone) say(`BROKEN  ${line}`)
  const broken = found.filter(({ brokenAt }) => brokenAt !== null).length + gone.length
  say(broken === 0 ? `All ${found.length} chains hold.` : `${broken} of ${found.length} chains do not hold.`)
  return broken === 0 ? 0 : 1
}

try {
  process.exitCode = await answer(process.argv.slice(2))
} catch (error) {
  say(error instanceof Error ? error.message : String(error))
  process.exitCode = 2
} finally {
  await database().$disconnect()
}
