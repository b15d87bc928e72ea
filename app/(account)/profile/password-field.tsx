import { Labelled } from '@/lib/ui/labelled'

/** The password once more, before something that a browser left open must not do. */
export function PasswordField() {
  return (
    <Labelled label="Your password">
      {(control) => (
        <input
          {...control}
          className="control"
          name="password"
          type="password"
          autoComplete="current-password"
          required
        />
      )}
    </Labelled>
  )
}
