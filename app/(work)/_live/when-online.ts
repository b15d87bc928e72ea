/** Runs at once, or as soon as the browser has a network again. The answer takes it back. */
export const whenOnline = (run: () => void): (() => void) => {
  if (navigator.onLine) {
    run()
    return () => {}
  }
  window.addEventListener('online', run, { once: true })
  return () => window.removeEventListener('online', run)
}
