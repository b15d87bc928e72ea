import { redirect } from 'next/navigation'

export default async function PlantIndex({ params }: PageProps<'/projects/[projectId]/plant'>) {
  const { projectId } = await params
  redirect(`/projects/${projectId}/plant/bus`)
}
