import { type ReactNode, createContext, useContext, useEffect, useState } from 'react'

export type UnitSystem = 'stated' | 'us' | 'si'
const order: UnitSystem[] = ['stated', 'us', 'si']
export const unitSystemNames: Record<UnitSystem, string> = { stated: 'Units as stated', us: 'US units', si: 'SI units' }
const kept = 'wearcourse.units'

const UnitSystemContext = createContext<{ system: UnitSystem; next: () => void }>({ system: 'stated', next: () => undefined })

/** The units a person wants to see; `u` goes round. Kept on this device. */
export function UnitSystemProvider({ children }: { children: ReactNode }) {
  const [system, setSystem] = useState<UnitSystem>(() => order.find((one) => one === localStorage.getItem(kept)) ?? 'stated')
  const next = () => setSystem((now) => order[(order.indexOf(now) + 1) % order.length] ?? 'stated')
  useEffect(() => localStorage.setItem(kept, system), [system])
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const target = event.target as HTMLElement
      const typing = target.closest('input, textarea, select, [contenteditable]')
      if (event.key === 'u' && !typing && !event.ctrlKey && !event.metaKey && !event.altKey) next()
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
  return <UnitSystemContext value={{ system, next }}>{children}</UnitSystemContext>
}

export function useUnitSystem() {
  return useContext(UnitSystemContext)
}
