import { command, perform } from '@/lib/server/perform'
import { changeRecord } from '@/lib/server/plants/commands'
import { plantRecords } from '@/lib/server/plants/queries'
import { read } from '@/lib/server/read'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from './cast-actor'

/** A process that saves and is killed by its test: over and over, or once, halting when half of the save is written. */
const how = process.argv[2]
const engineer = actorAs('engineer')
const { projectId } = demo

const say = (words: string) => process.stdout.write(`${words}\n`)

/** The same command, but its transaction never comes to the audit event, nor to its end. */
const halfway = command({
  ...changeRecord,
  run: async (context, input, before) => {
    await changeRecord.run(context, input, before)
    say('half written')
    return new Promise<never>(() => {})
  },
})

const { rows } = await read(plantRecords, engineer, { projectId })
const first = rows.capacitor[0]!
const change = (version: number) => ({
  projectId,
  kind: 'capacitor' as const,
  id: first.id,
  version,
  values: { ...first.values, note: `Saved on version ${version}.` },
})

if (how === 'once') await perform(halfway, engineer, change(first.version))
for (let { version } = first; ; ) {
  ;({ version } = await perform(changeRecord, engineer, change(version)))
  say(`kept ${version}`)
}
