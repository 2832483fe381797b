import { type ReactNode, useEffect, useRef } from 'react'

interface DialogProps {
  title: string
  open: boolean
  onClose: () => void
  children: ReactNode
  wide?: boolean
}

/** A modal dialog on the browser's own element: focus stays in, Escape closes, focus returns. */
export function Dialog({ title, open, onClose, children, wide = false }: DialogProps) {
  const element = useRef<HTMLDialogElement>(null)
  useEffect(() => {
    const dialog = element.current
    if (!dialog) return
    if (open && !dialog.open) dialog.showModal()
    if (!open && dialog.open) dialog.close()
  }, [open])
  return (
    <dialog
      ref={element}
      onClose={onClose}
      aria-label={title}
      className={`m-auto w-[calc(100%-32px)] border border-ink bg-card p-0 text-ink backdrop:bg-ink/40 ${wide ? 'max-w-4xl' : 'max-w-xl'}`}
    >
      {open && (
        <div className="p-5">
          <div className="mb-3 flex items-start justify-between gap-4">
            <h2 className="text-section">{title}</h2>
            <button type="button" onClick={onClose} className="min-h-9 min-w-9 text-pencil hover:text-ink" aria-label="Close">
              ✕
            </button>
          </div>
          {children}
        </div>
      )}
    </dialog>
  )
}
