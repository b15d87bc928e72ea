'use client'

import { useState } from 'react'
import { DomainError } from '@/lib/errors'
import { Labelled } from '@/lib/ui/labelled'
import { type KeyFile, readKeyFile } from './key-file'
import { keepKeyFile } from './key-store'
import { plainWords } from './plain-words'

interface KeyFileChooserProps {
  /** The public key that the file must belong to, base64. */
  spki: string
  onLoaded: (file: KeyFile) => void
}

/** Brings a key from its file into this browser. The file is read here and goes nowhere else. */
export function KeyFileChooser({ spki, onLoaded }: KeyFileChooserProps) {
  const [problem, setProblem] = useState('')
  const load = async (chosen: File | undefined) => {
    if (!chosen) return
    try {
      const file = readKeyFile(await chosen.text())
      if (file.spki !== spki)
        throw new DomainError('invalid', 'This key file belongs to another certificate: choose the one for yours.')
      await keepKeyFile(file)
      setProblem('')
      onLoaded(file)
    } catch (error) {
      setProblem(plainWords(error))
    }
  }
  return (
    <Labelled
      label="Key file"
      hint="Your signing key is not in this browser. Choose the key file that you downloaded when you made it."
      error={problem || undefined}
    >
      {(control) => (
        <input
          {...control}
          type="file"
          accept="application/json,.json"
          className="control"
          onChange={(event) => void load(event.target.files?.[0])}
        />
      )}
    </Labelled>
  )
}
