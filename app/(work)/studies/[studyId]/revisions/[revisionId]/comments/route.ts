import { commentsAnswer } from '@/app/(work)/_comments/comments-answer'

export async function GET(
  _request: Request,
  { params }: RouteContext<'/studies/[studyId]/revisions/[revisionId]/comments'>,
) {
  const { revisionId } = await params
  return commentsAnswer(revisionId, (view) => Response.json(view, { headers: { 'cache-control': 'no-store' } }))
}
