/** Tells password managers that this passphrase is another secret than the one for signing in, so that they do not overwrite that. */
export function KeyUserName() {
  return <input type="text" name="username" autoComplete="username" value="signing key" readOnly hidden />
}
