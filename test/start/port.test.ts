import net from 'node:net'
import { expect, onTestFinished, test } from 'vitest'
import { anyFreePort, choosePort, tryPort } from '@/lib/start/port.mjs'

const host = '127.0.0.1'

async function occupy(): Promise<number> {
  const server = net.createServer()
  await new Promise<void>((resolve) => server.listen(0, host, resolve))
  onTestFinished(() => void server.close())
  const address = server.address()
  return typeof address === 'object' && address ? address.port : 0
}

test('without a wish the first free port from the given one on is taken', async () => {
  const taken = await occupy()
  const port = await choosePort({ host, first: taken })
  expect(port).toBeGreaterThan(taken)
  expect(await tryPort(port, host)).toBe(port)
})

test('a free port that was asked for is taken', async () => {
  const free = await anyFreePort()
  expect(await choosePort({ wanted: String(free), host })).toBe(free)
})

test('a taken port that was asked for is refused with what to do', async () => {
  const taken = await occupy()
  await expect(choosePort({ wanted: String(taken), host })).rejects.toThrow(
    `Port ${taken} on 127.0.0.1 is taken or not permitted: set PORT to another one.`,
  )
})

test.each(['http', '0', '70000', '80.5', '-1'])('"%s" is no port', async (wanted) => {
  await expect(choosePort({ wanted, host })).rejects.toThrow('set it to a whole number from 1 to 65535')
})

test('when all ports of the range are taken it is said', async () => {
  const taken = await occupy()
  await expect(choosePort({ host, first: taken, tries: 1 })).rejects.toThrow('set PORT to a free one')
})
