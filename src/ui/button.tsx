import type { ButtonHTMLAttributes, ReactNode } from 'react'

type Look = 'primary' | 'plain' | 'quiet' | 'stop'
const looks: Record<Look, string> = {
  primary: 'border-resin bg-resin text-white hover:bg-[#8f4914]',
  plain: 'border-ink bg-card text-ink hover:bg-resin-wash',
  quiet: 'border-transparent bg-transparent text-resin underline-offset-4 hover:underline',
  stop: 'border-stop bg-card text-stop hover:bg-stop hover:text-white',
}

/** The classes of a button, for links that look like one. */
export function buttonClass(look: Look = 'plain'): string {
  return `inline-flex min-h-9 items-center justify-center gap-2 border px-3 py-1 font-semibold disabled:opacity-50 ${looks[look]}`
}

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  look?: Look
  busy?: boolean
  children: ReactNode
}

export function Button({ look = 'plain', busy = false, disabled, children, className = '', type = 'button', ...rest }: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled === true || busy}
      aria-busy={busy || undefined}
      className={`${buttonClass(look)} ${className}`}
    >
      {children}
    </button>
  )
}
