import { useEffect, useState } from 'react'

/** A value once it has stayed the same for so many milliseconds: what is typed is asked of the server when the typing pauses. */
export function useSettled<T>(value: T, milliseconds: number): T {
  const [settled, setSettled] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), milliseconds)
    return () => clearTimeout(timer)
  }, [value, milliseconds])
  return settled
}
