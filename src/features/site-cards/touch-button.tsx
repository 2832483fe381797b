import type { ButtonHTMLAttributes } from 'react'

/** A button for two pairs of gloves: at least 64 px high, black on white or white on black. */
export function TouchButton({
  strong = false,
  className = '',
  type = 'button',
  ...rest
}: ButtonHTMLAttributes<HTMLButtonElement> & { strong?: boolean }) {
  return (
    <button
      {...rest}
      type={type}
      className={`min-h-[64px] rounded-touch border-2 border-ink px-4 text-site font-semibold disabled:opacity-40 ${strong ? 'bg-ink text-white' : 'bg-card text-ink'} ${className}`}
    />
  )
}
