import { NextResponse } from 'next/server'
import { DomainError, httpStatus } from '@/lib/errors'
import { read } from '@/lib/server/read'
import { currentActor } from '@/lib/server/session'
import { runProgress } from '@/lib/server/studies/queries'

/** How far the computation has come; asked every second while it runs. */
export async function GET(_request: Request, { params }: RouteContext<'/studies/[studyId]/run'>) {
  const { studyId } = await params
  const actor = await currentActor()
  if (!actor) return NextResponse.json({ message: 'Sign in again.' }, { status: httpStatus['not-signed-in'] })
  try {
    return NextResponse.json(await read(runProgress, actor, { studyId }), { headers: { 'cache-control': 'no-store' } })
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    return NextResponse.json({ message: error.message }, { status: httpStatus[error.code] })
  }
}
