import { useEffect, useRef } from 'react'
import { useBlocker } from 'react-router'

export interface LeaveGuard {
  /** A leave is held up until the person says what is to happen. */
  asking: boolean
  stay: () => void
  leave: () => void
  /** Lets the next leave pass: what was typed has been saved or kept. */
  pass: () => void
}

/** Holds up leaving a page while something typed on it is not saved. */
export function useLeaveGuard(dirty: boolean): LeaveGuard {
  const free = useRef(false)
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => dirty && !free.current && currentLocation.pathname !== nextLocation.pathname,
  )
  useEffect(() => {
    if (!dirty) return
    const warn = (event: BeforeUnloadEvent) => {
      if (!free.current) event.preventDefault()
    }
    window.addEventListener('beforeunload', warn)
    return () => window.removeEventListener('beforeunload', warn)
  }, [dirty])
  return {
    asking: blocker.state === 'blocked',
    stay: () => blocker.reset?.(),
    leave: () => blocker.proceed?.(),
    pass: () => {
      free.current = true
    },
  }
}
