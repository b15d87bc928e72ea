/** Offers a text to the user as a file to save. */
export function saveFile(name: string, text: string): void {
  const address = URL.createObjectURL(new Blob([text], { type: 'application/json' }))
  const link = document.createElement('a')
  link.href = address
  link.download = name
  link.click()
  // The browser has taken the contents over by the next turn.
  setTimeout(() => URL.revokeObjectURL(address), 0)
}
