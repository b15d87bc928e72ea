import fs from 'node:fs'
import path from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { readEnvironment } from '@/lib/server/env'
import { mailText } from '@/lib/server/mail/mail-text'
import { sendMail } from '@/lib/server/mail/send-mail'
import { inRoot } from '@/lib/start/root.mjs'

const folder = inRoot('.data', 'test', `mail-${crypto.randomUUID()}`)
const kept = path.join(folder, 'message')
beforeAll(() => fs.mkdirSync(folder, { recursive: true }))
afterAll(() => fs.rmSync(folder, { recursive: true, force: true }))

const mail = {
  to: 'n@newcomers.example',
  subject: 'Nächster Schritt – choose',
  text: 'Line one\n\nhttps://x.example/ü\n',
}
const from = 'Breakaway <studies@office.example>'
const at = new Date('2026-03-02T08:09:10Z')

const environment = (more: Record<string, string>) =>
  readEnvironment({
    DATABASE_URL: 'postgresql://nobody@127.0.0.1/none',
    BETTER_AUTH_SECRET: 'a secret of the tests and of nothing else',
    CA_WRAP_SECRET: 'another secret of the tests, for the authority',
    ...more,
  })

const decoded = (base64: string) => Buffer.from(base64, 'base64').toString()

test('a message has one recipient, a date, and any alphabet in subject and text', () => {
  const [head = '', body = ''] = mailText(mail, from, at).split('\r\n\r\n')
  expect(head).toContain('To: <n@newcomers.example>')
  expect(head).toContain('Date: Mon, 02 Mar 2026 08:09:10 +0000')
  const words = [...head.matchAll(/=\?UTF-8\?B\?([^?]+)\?=/g)].map(([, word]) => decoded(word!))
  expect(words.join('')).toBe(mail.subject)
  expect(decoded(body).replaceAll('\r\n', '\n')).toBe(mail.text)
})

test('no line of a message is longer than the mail system takes', () => {
  const long = { ...mail, subject: 'ü'.repeat(300), text: 'x'.repeat(5000) }
  for (const line of mailText(long, from, at).split('\r\n')) expect(line.length).toBeLessThanOrEqual(78)
})

test('what is in a subject or an address adds no line to the header', () => {
  const [head = ''] = mailText({ ...mail, subject: 'a\r\nBcc: all@elsewhere.example' }, from, at).split('\r\n\r\n')
  expect(head).not.toMatch(/^Bcc:/m)
  for (const to of ['a@b.example\r\nBcc: c@d.example', 'a@b.example,c@d.example', '<a@b.example'])
    expect(() => mailText({ ...mail, to }, from, at)).toThrow(RangeError)
})

test('the mail program of the environment gets the whole message', async () => {
  const program = path.join(folder, 'program.mjs')
  fs.writeFileSync(program, `import fs from 'node:fs'; fs.writeFileSync(process.argv[2], fs.readFileSync(0))`)
  const MAIL_COMMAND = `${process.execPath} ${program} ${kept}`
  await sendMail(mail, environment({ MAIL_COMMAND, MAIL_FROM: from, BASE_URL: 'https://studies.example' }))
  expect(fs.readFileSync(kept, 'utf8')).toContain('To: <n@newcomers.example>')
})

test('a mail program that fails or is not there is an error, and so is none at all where others reach the server', async () => {
  const failing = { MAIL_COMMAND: `${process.execPath} -e process.exit(3)`, MAIL_FROM: from }
  await expect(sendMail(mail, environment(failing))).rejects.toThrow(/ended with 3/)
  await expect(sendMail(mail, environment({ MAIL_COMMAND: '/nowhere/at/all', MAIL_FROM: from }))).rejects.toThrow()
  await expect(sendMail(mail, environment({ BASE_URL: 'https://studies.example' }))).rejects.toThrow(/MAIL_COMMAND/)
})
