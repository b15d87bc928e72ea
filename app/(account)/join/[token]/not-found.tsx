/** One answer for every invitation that cannot be used. */
export default function InvitationGone() {
  return (
    <main className="mx-auto flex min-h-dvh max-w-sm flex-col justify-center gap-3 px-4 py-10">
      <h1 className="m-0 text-title font-semibold">This invitation leads nowhere</h1>
      <p className="m-0">
        It was used, has run out or was withdrawn, or the link was not copied whole. Ask whoever sent it for another
        one.
      </p>
    </main>
  )
}
