'use client'

import { AlertDialog } from '@base-ui/react/alert-dialog'
import { type ReactNode, useState } from 'react'
import { Button, type ButtonTone, buttonLook } from './button'
import { Notice } from './notice'

interface ConfirmProps {
  /** On the button that opens the question. */
  trigger: string
  tone?: ButtonTone
  title: string
  children: ReactNode
  confirm: string
  disabled?: boolean
  /** Returns the sentence to show when it was refused; null closes the question. */
  onConfirm: () => Promise<string | null>
}

/** A question before something that others will see or that cannot be taken back. */
export function Confirm({ trigger, tone = 'plain', title, children, confirm, disabled, onConfirm }: ConfirmProps) {
  const [open, setOpen] = useState(false)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)

  const run = async () => {
    setBusy(true)
    const answer = await onConfirm()
    setBusy(false)
    setRefusal(answer)
    if (answer === null) setOpen(false)
  }

  return (
    <AlertDialog.Root
      open={open}
      onOpenChange={(next) => {
        setOpen(next)
        setRefusal(null)
      }}
    >
      <AlertDialog.Trigger className={buttonLook(tone)} disabled={disabled}>
        {trigger}
      </AlertDialog.Trigger>
      <AlertDialog.Portal>
        <AlertDialog.Backdrop className="fixed inset-0 z-40 bg-ink/30" />
        <AlertDialog.Popup className="fixed top-1/2 left-1/2 z-50 flex max-h-[90dvh] w-[min(34rem,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2 flex-col gap-3 overflow-y-auto border border-rule bg-sheet p-4 text-ink">
          <AlertDialog.Title className="m-0 text-title font-semibold">{title}</AlertDialog.Title>
          <AlertDialog.Description render={<div />} className="flex flex-col gap-3 text-body">
            {children}
          </AlertDialog.Description>
          {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
          <div className="flex flex-wrap justify-end gap-2">
            <AlertDialog.Close className={buttonLook('plain')}>Go back</AlertDialog.Close>
            <Button tone={tone === 'danger' ? 'danger' : 'main'} busy={busy} onClick={run}>
              {confirm}
            </Button>
          </div>
        </AlertDialog.Popup>
      </AlertDialog.Portal>
    </AlertDialog.Root>
  )
}
