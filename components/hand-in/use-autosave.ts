'use client'

import { useCallback, useEffect, useRef, useState } from 'react'
import type { UseFormReturn } from 'react-hook-form'
import { fetchJson, isProblem } from '../shell/fetch-json'
import { toDraftChange, type DraftField, type DraftForm } from './draft-form'

export type SaveState = { status: 'saved' | 'waiting' | 'saving' } | { status: 'failed'; reason: string }

const settles = 800

/** Saves what is typed a moment after one stops. `flush` saves at once and tells whether all of it is kept. */
export function useAutosave(manuscriptId: string, form: UseFormReturn<DraftForm>) {
  const [state, setState] = useState<SaveState>({ status: 'saved' })
  const touched = useRef(new Set<DraftField>())
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  const running = useRef<Promise<boolean>>(Promise.resolve(true))

  const save = useCallback(async (): Promise<boolean> => {
    const fields = [...touched.current]
    const body = toDraftChange(form.getValues(), fields)
    if (Object.keys(body).length === 0) return true
    touched.current.clear()
    setState({ status: 'saving' })
    try {
      await fetchJson(`/api/manuscripts/${manuscriptId}`, { method: 'PATCH', body })
      setState({ status: touched.current.size > 0 ? 'waiting' : 'saved' })
      return true
    } catch (error) {
      if (!isProblem(error)) throw error
      for (const field of fields) touched.current.add(field)
      setState({ status: 'failed', reason: error.message })
      return false
    }
  }, [form, manuscriptId])

  const flush = useCallback((): Promise<boolean> => {
    clearTimeout(timer.current)
    // One request after the other, so that an older text never lands on a newer one.
    running.current = running.current.then(save)
    return running.current
  }, [save])

  useEffect(() => {
    const unsubscribe = form.subscribe({
      formState: { values: true },
      callback: ({ name }) => {
        if (!name) return
        touched.current.add(name as DraftField)
        setState({ status: 'waiting' })
        clearTimeout(timer.current)
        timer.current = setTimeout(() => void flush(), settles)
      },
    })
    return () => {
      unsubscribe()
      clearTimeout(timer.current)
    }
  }, [form, flush])

  useEffect(() => {
    if (state.status === 'saved') return
    const warn = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', warn)
    return () => window.removeEventListener('beforeunload', warn)
  }, [state.status])

  return { state, flush }
}
