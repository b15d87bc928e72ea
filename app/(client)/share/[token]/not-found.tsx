/** One answer for every link that is not in force. */
export default function ShareGone() {
  return (
    <main className="mx-auto flex min-h-dvh max-w-md flex-col justify-center gap-3 px-4 py-10">
      <h1 className="m-0 text-title font-semibold">This link leads nowhere</h1>
      <p className="m-0">
        It has run out or was ended, or it was not copied whole. Ask whoever sent it for another one.
      </p>
    </main>
  )
}
