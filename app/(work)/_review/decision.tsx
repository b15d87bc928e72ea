'use client'

import { useRouter } from 'next/navigation'
import { useId, useState } from 'react'
import { answered, type Outcome } from '@/app/_action/outcome'
import type { ButtonTone } from '@/lib/ui/button'
import { Confirm } from '@/lib/ui/confirm'
import { Labelled } from '@/lib/ui/labelled'

export interface DecisionWords {
  /** A verb and its object; on both buttons. */
  verb: string
  title: string
  /** What follows from it. */
  explain: string
  /** Label of the text that goes with it. */
  text: string
  textNeeded?: boolean
  /** Offered while typing the text. */
  offers?: readonly string[]
  oneLine?: boolean
  tone?: ButtonTone
}

interface DecisionProps extends DecisionWords {
  decide: (text: string) => Promise<Outcome<unknown>>
}

/** A decision on a revision, with its note or reason. */
export function Decision({ decide, verb, title, explain, text, textNeeded, offers, oneLine, tone }: DecisionProps) {
  const router = useRouter()
  const list = useId()
  const [typed, setTyped] = useState('')
  const confirm = async (): Promise<string | null> => {
    if (textNeeded && typed.trim() === '') return `Fill in “${text}” first.`
    const outcome = await answered(() => decide(typed))
    if (!outcome.ok) return outcome.issues[0]?.message ?? outcome.message
    setTyped('')
    router.refresh()
    return null
  }
  return (
    <Confirm trigger={verb} tone={tone} title={title} confirm={verb} onConfirm={confirm}>
      <p className="m-0">{explain}</p>
      <Labelled label={text} aside={textNeeded ? undefined : 'may stay empty'}>
        {(control) =>
          oneLine ? (
            <>
              <input
                {...control}
                className="control"
                list={list}
                value={typed}
                onChange={(event) => setTyped(event.target.value)}
              />
              <datalist id={list}>
                {offers?.map((offer) => (
                  <option key={offer} value={offer} />
                ))}
              </datalist>
            </>
          ) : (
            <textarea
              {...control}
              className="control"
              rows={4}
              value={typed}
              onChange={(event) => setTyped(event.target.value)}
            />
          )
        }
      </Labelled>
    </Confirm>
  )
}
