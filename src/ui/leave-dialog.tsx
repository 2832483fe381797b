import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'

/** Asks before something typed is lost. */
export function LeaveDialog({ guard }: { guard: { asking: boolean; stay: () => void; leave: () => void } }) {
  return (
    <Dialog title="Leave without saving" open={guard.asking} onClose={guard.stay}>
      <p className="mb-3">What you typed here is not saved. If you leave now it is lost.</p>
      <div className="flex gap-2">
        <Button look="primary" onClick={guard.stay}>
          Stay
        </Button>
        <Button look="stop" onClick={guard.leave}>
          Leave without saving
        </Button>
      </div>
    </Dialog>
  )
}
