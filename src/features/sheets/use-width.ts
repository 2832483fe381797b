import { useCallback, useState } from 'react'

/** Width of an element in CSS pixels, kept up to date; 0 until it is known. */
export function useWidth(): { ref: (element: HTMLElement | null) => (() => void) | undefined; width: number } {
  const [width, setWidth] = useState(0)
  const ref = useCallback((element: HTMLElement | null) => {
    if (!element) return undefined
    const watcher = new ResizeObserver(([entry]) => entry && setWidth(Math.floor(entry.contentRect.width)))
    watcher.observe(element)
    return () => watcher.disconnect()
  }, [])
  return { ref, width }
}
