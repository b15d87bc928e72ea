import { commentsAnswer } from '@/app/(work)/_comments/comments-answer'
import { commentSheetFile } from '@/lib/server/reviews/sheet-file'

export async function GET(
  _request: Request,
  { params }: RouteContext<'/studies/[studyId]/revisions/[revisionId]/comments/sheet'>,
) {
  const { revisionId } = await params
  return commentsAnswer(revisionId, (view) => {
    const headers = {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': 'attachment; filename="comment-sheet.csv"',
      'cache-control': 'no-store',
    }
    return new Response(commentSheetFile(view), { headers })
  })
}
