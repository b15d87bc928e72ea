import { randomUUID } from 'node:crypto'

/** A message in plain text to one person. */
export interface Mail {
  to: string
  subject: string
  text: string
}

const folded = (base64: string): string => base64.replace(/.{1,76}/g, '$&\r\n').trimEnd()

/** A header's text in words of at most 75 characters, so that any alphabet passes and no line is added by what is in it. */
const headerText = (text: string): string => {
  const words: string[] = []
  let word = ''
  for (const character of text) {
    if (Buffer.byteLength(word + character) > 42) {
      words.push(word)
      word = ''
    }
    word += character
  }
  return [...words, word].map((part) => `=?UTF-8?B?${Buffer.from(part).toString('base64')}?=`).join('\r\n ')
}

/**
 * The message as a mail program takes it from its standard input (RFC 5322, MIME).
 * @throws RangeError for an address that would add a line to the header
 */
export function mailText({ to, subject, text }: Mail, from: string, at: Date): string {
  if (/[\r\n<>,]/.test(to) || /[\r\n]/.test(from)) throw new RangeError('an address that is more than one address')
  const domain = from.match(/@([\w.-]+)/)?.[1] ?? 'localhost'
  return [
    `From: ${from}`,
    `To: <${to}>`,
    `Subject: ${headerText(subject)}`,
    `Date: ${at.toUTCString().replace('GMT', '+0000')}`,
    `Message-ID: <${randomUUID()}@${domain}>`,
    'Auto-Submitted: auto-generated',
    'MIME-Version: 1.0',
    'Content-Type: text/plain; charset=utf-8',
    'Content-Transfer-Encoding: base64',
    '',
    folded(Buffer.from(text.replace(/\r?\n/g, '\r\n')).toString('base64')),
    '',
  ].join('\r\n')
}
