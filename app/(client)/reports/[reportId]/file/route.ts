import { reportResponse } from '@/app/(work)/_review/report-response'

export async function GET(_request: Request, { params }: RouteContext<'/reports/[reportId]/file'>) {
  return reportResponse((await params).reportId)
}
