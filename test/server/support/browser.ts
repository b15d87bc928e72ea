import { auth } from '@/lib/server/auth'

const base = 'http://127.0.0.1:3000'

interface Answer {
  status: number
  body: Record<string, unknown>
}

/** A browser at the account library's own addresses: it keeps cookies and says where it comes from, as browsers do. */
export class Browser {
  readonly cookies = new Map<string, string>()
  private readonly origin: string | null

  constructor(origin: string | null = base) {
    this.origin = origin
  }

  get headers(): Headers {
    const headers = new Headers({ 'content-type': 'application/json', 'user-agent': 'Firefox/1 (Linux)' })
    if (this.origin) headers.set('origin', this.origin)
    const cookie = [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
    if (cookie) headers.set('cookie', cookie)
    return headers
  }

  async post(path: string, body: Record<string, unknown>, more: Record<string, string> = {}): Promise<Answer> {
    const headers = this.headers
    for (const [name, value] of Object.entries(more)) headers.set(name, value)
    const init = { method: 'POST', headers, body: JSON.stringify(body) }
    const request = new Request(`${base}/api/auth${path}`, init)
    const response = await auth().handler(request)
    for (const line of response.headers.getSetCookie()) {
      const [pair = '', ...attributes] = line.split(';')
      const at = pair.indexOf('=')
      const gone = attributes.some((one) => /max-age=0/i.test(one))
      if (gone) this.cookies.delete(pair.slice(0, at))
      else this.cookies.set(pair.slice(0, at), pair.slice(at + 1))
    }
    const text = await response.text()
    return { status: response.status, body: text.startsWith('{') ? JSON.parse(text) : {} }
  }

  /** The session's secret as the cookie holds it, without its seal; null when signed out. */
  get sessionToken(): string | null {
    const value = this.cookies.get('better-auth.session_token')
    return value ? decodeURIComponent(value).split('.')[0]! : null
  }

  async person(): Promise<string | null> {
    const session = await auth().api.getSession({ headers: this.headers })
    return session?.user.email ?? null
  }
}
