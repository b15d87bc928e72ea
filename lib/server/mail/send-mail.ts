import 'server-only'
import { spawn } from 'node:child_process'
import { now } from '../clock'
import { type Environment, env } from '../env'
import { type Mail, mailText } from './mail-text'

const patience = 20_000

const isLocal = (address: string): boolean => ['localhost', '127.0.0.1', '[::1]'].includes(new URL(address).hostname)

/**
 * Hands a message to the mail program that the environment names; it takes the message on its standard input and reads the recipient
 * from it, as mail programs have for decades. A local installation without one prints the message where the server prints.
 * @throws Error when the program cannot be run or refuses
 */
export async function sendMail(mail: Mail, environment: Environment = env()): Promise<void> {
  const { MAIL_COMMAND, MAIL_FROM, BASE_URL } = environment
  if (MAIL_COMMAND && MAIL_FROM) return hand(MAIL_COMMAND, mailText(mail, MAIL_FROM, now()))
  if (!isLocal(BASE_URL)) throw new Error('no mail was sent: set MAIL_COMMAND and MAIL_FROM')
  process.stdout.write(
    `\nMail to ${mail.to} (no mail program is set, so it is printed): ${mail.subject}\n${mail.text}\n\n`,
  )
}

function hand(commandLine: string, message: string): Promise<void> {
  const [command = '', ...given] = commandLine.trim().split(/\s+/)
  return new Promise((resolve, reject) => {
    const program = spawn(command, given, { stdio: ['pipe', 'ignore', 'ignore'], timeout: patience })
    program.on('error', reject)
    program.on('close', (code) => (code === 0 ? resolve() : reject(new Error(`the mail program ended with ${code}`))))
    // whoever ends before reading everything says so by its code
    program.stdin.on('error', () => {})
    program.stdin.end(message)
  })
}
