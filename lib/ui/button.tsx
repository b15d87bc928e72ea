import type { ComponentProps } from 'react'

export type ButtonTone = 'main' | 'plain' | 'quiet' | 'danger'

const tones: Record<ButtonTone, string> = {
  main: 'border-accent bg-accent text-on-accent hover:brightness-110',
  plain: 'border-rule bg-sheet text-ink hover:bg-tint',
  quiet: 'border-transparent bg-transparent text-accent hover:bg-tint',
  danger: 'border-fails bg-sheet text-fails hover:bg-tint',
}

/** The look of a button, for a link that acts like one. */
export const buttonLook = (tone: ButtonTone = 'plain'): string =>
  `inline-flex min-h-7.5 items-center justify-center gap-1.5 rounded-[2px] border px-3 py-0.5 text-body font-semibold no-underline disabled:border-hair disabled:bg-paper disabled:text-soft disabled:brightness-100 ${tones[tone]}`

interface ButtonProps extends ComponentProps<'button'> {
  tone?: ButtonTone
  /** Work is under way: the button stays in place and takes no second press. */
  busy?: boolean
}

/** A verb and its object. */
export function Button({
  tone = 'plain',
  busy = false,
  className = '',
  type = 'button',
  disabled,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      className={`${buttonLook(tone)} ${className}`}
    />
  )
}
