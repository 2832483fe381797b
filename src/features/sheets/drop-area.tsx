import { type DragEvent, useRef, useState } from 'react'
import { Button } from '../../ui/button.tsx'

interface DropAreaProps {
  label: string
  help: string
  multiple?: boolean
  onFiles: (files: File[]) => void
}

/** Takes PDFs by drop or from a picker. */
export function DropArea({ label, help, multiple = true, onFiles }: DropAreaProps) {
  const picker = useRef<HTMLInputElement>(null)
  const [over, setOver] = useState(false)
  const drop = (event: DragEvent) => {
    event.preventDefault()
    setOver(false)
    const files = [...event.dataTransfer.files]
    if (files.length > 0) onFiles(multiple ? files : files.slice(0, 1))
  }
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault()
        setOver(true)
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={`flex flex-wrap items-center gap-x-4 gap-y-2 border border-dashed px-4 py-4 ${over ? 'border-resin bg-resin-wash' : 'border-pencil bg-card'}`}
    >
      <Button look="primary" onClick={() => picker.current?.click()}>
        {label}
      </Button>
      <span className="text-pencil">{help}</span>
      <input
        ref={picker}
        type="file"
        accept=".pdf,application/pdf"
        multiple={multiple}
        aria-label={label}
        className="sr-only"
        tabIndex={-1}
        onChange={(event) => {
          onFiles([...(event.target.files ?? [])])
          event.target.value = ''
        }}
      />
    </div>
  )
}
