import { reportResponse } from '@/app/(work)/_review/report-response'

export async function GET(
  _request: Request,
  { params }: RouteContext<'/studies/[studyId]/revisions/[revisionId]/report'>,
) {
  return reportResponse((await params).revisionId)
}
