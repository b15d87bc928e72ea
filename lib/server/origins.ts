import type { Environment } from './env'

const loopback = new Set(['localhost', '127.0.0.1', '[::1]'])

/** The origins from which a browser may send changes: our own address (on this machine under each of its names) and those configured. */
export function trustedOrigins({ BASE_URL, PORT, TRUSTED_ORIGINS }: Environment): string[] {
  const own = new URL(BASE_URL)
  const ports = [...new Set([own.port, PORT].filter((port): port is string => Boolean(port)))]
  const local = loopback.has(own.hostname)
    ? ports.flatMap((port) => [`http://localhost:${port}`, `http://127.0.0.1:${port}`])
    : []
  const further = (TRUSTED_ORIGINS ?? '')
    .split(',')
    .flatMap((text) => (text.trim() ? [new URL(text.trim()).origin] : []))
  return [...new Set([own.origin, ...local, ...further])]
}
