import { TabLinks } from '@/app/(work)/_frame/tab-links'

export default async function CasesLayout({ params, children }: LayoutProps<'/studies/[studyId]/cases'>) {
  const { studyId } = await params
  const base = `/studies/${studyId}/cases`
  return (
    <div className="flex flex-col gap-4">
      <TabLinks
        label="Parts of the study"
        links={[
          { label: 'Cases', href: base },
          { label: 'Start schedules', href: `${base}/schedules` },
          { label: 'Limits sheet', href: `${base}/limits` },
          { label: 'Settings and texts', href: `${base}/settings` },
        ]}
      />
      {children}
    </div>
  )
}
