import { databaseAnswers } from '@/lib/server/health'

export const dynamic = 'force-dynamic'

export async function GET(): Promise<Response> {
  const ok = await databaseAnswers()
  return Response.json({ ok }, { status: ok ? 200 : 503, headers: { 'cache-control': 'no-store' } })
}
