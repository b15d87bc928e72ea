'use client'

import { useRouter } from 'next/navigation'
import { useEffect, useRef, useState } from 'react'
import { follow, type Other } from './follow'
import { tellHappened } from './happened'
import { happenedSentence } from './happened-words'
import { whenOnline } from './when-online'

export interface LiveProps {
  projectId: string
  /** Place in the project's chain of events that the page was made at. */
  after: number
  /** `revision/…` or `study/…`: what others see that the person looks at. */
  where: string
}

/** Comments are asked for by those who show them; everything else shows the page anew. */
const refreshes = (action: string): boolean => !action.startsWith('comment-') && action !== 'input-ticked'

/** Gathers what arrives together. Milliseconds. */
const gather = 40

const placeWords = (other: Other, here: string): string => {
  if (other.where === here) return 'here too'
  return other.where.startsWith('revision/') ? 'at a revision' : 'in this project'
}

/** Keeps the page as it is on the server, and shows who else looks at the project. */
export function Live({ projectId, after, where }: LiveProps) {
  const router = useRouter()
  const [others, setOthers] = useState<readonly Other[]>([])
  const [said, setSaid] = useState('')
  const [connected, setConnected] = useState(false)
  const start = useRef(after)
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined
    const refresh = () => {
      clearTimeout(timer)
      timer = setTimeout(() => whenOnline(() => router.refresh()), gather)
    }
    const end = follow({
      projectId,
      after: start.current,
      where,
      onHappened: (happened) => {
        start.current = Math.max(start.current, happened.sequence)
        tellHappened(happened)
        const sentence = happenedSentence(happened)
        if (sentence) setSaid(sentence)
        if (refreshes(happened.action)) refresh()
      },
      onOthers: setOthers,
      onReload: refresh,
      onStanding: setConnected,
    })
    return () => {
      clearTimeout(timer)
      end()
    }
  }, [projectId, where, router])
  const names = [...new Map(others.filter(({ own }) => !own).map((other) => [other.name, other])).values()]
  return (
    <div className="flex min-w-0 items-center gap-2 text-label text-soft" data-live={connected ? 'on' : 'off'}>
      <p role="status" aria-live="polite" className="sr-only">
        {said}
      </p>
      {names.length > 0 ? (
        <ul aria-label="Also looking" className="m-0 hidden list-none gap-2 p-0 sm:flex">
          {names.slice(0, 4).map((other) => (
            <li key={other.name} className="whitespace-nowrap">
              <span className="font-semibold text-ink">{other.name}</span> {placeWords(other, where)}
            </li>
          ))}
          {names.length > 4 ? <li>and {names.length - 4} more</li> : null}
        </ul>
      ) : null}
    </div>
  )
}
