import { type ReactNode, useId } from 'react'

/** What a control needs to be tied to its label, its hint and its error. */
interface ControlProps {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
}

interface LabelledProps {
  label: string
  hint?: ReactNode
  error?: string | undefined
  /** Beside the label, for example "may stay empty". */
  aside?: string | undefined
  children: (control: ControlProps) => ReactNode
}

/** Label above, control, then the error or the hint below: the text stays where it was typed. */
export function Labelled({ label, hint, error, aside, children }: LabelledProps) {
  const id = useId()
  const below = error || hint ? `${id}-below` : undefined
  return (
    <div className="min-w-0">
      <label htmlFor={id} className="mb-0.5 block text-label font-semibold text-ink">
        {label}
        {aside ? <span className="font-normal text-soft"> {aside}</span> : null}
      </label>
      {children({ id, 'aria-describedby': below, 'aria-invalid': error ? true : undefined })}
      {below ? (
        <p id={below} className={`m-0 mt-0.5 text-label ${error ? 'text-fails' : 'text-soft'}`}>
          {error ?? hint}
        </p>
      ) : null}
    </div>
  )
}
