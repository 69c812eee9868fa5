import { Toaster, toast } from 'sonner'
import { asProblem } from '@/lib/problem.ts'

/** Where short news appears; once, in the shell. */
export function Toasts() {
  return (
    <Toaster
      position="bottom-right"
      duration={6000}
      toastOptions={{
        unstyled: true,
        classNames: {
          toast: 'flex w-88 font-sans max-w-[calc(100vw-2rem)] items-start gap-3 border border-ink border-l-[6px] bg-sheet px-3 py-2.5 text-base text-ink',
          success: 'border-l-jade!',
          error: 'border-l-oxide!',
          content: 'min-w-0 grow',
          title: 'font-medium',
          description: 'text-sm text-soft',
          icon: 'hidden',
          actionButton: 'shrink-0 border-b border-ink font-semibold',
          cancelButton: 'shrink-0 border-b border-ink font-semibold',
        },
      }}
    />
  )
}

/** Says that something was done; `undo` offers the way back. */
export const say = (message: string, options: { detail?: string; undo?: () => void } = {}) =>
  toast.success(message, { description: options.detail, ...(options.undo ? { action: { label: 'Undo', onClick: options.undo } } : {}) })

/** Says what failed and that nothing was lost; stays until read. */
export const sayProblem = (error: unknown) => {
  const problem = asProblem(error)
  return toast.error(problem.message, { description: problem.requestId ? `Request ${problem.requestId}` : undefined, duration: 20_000, closeButton: true })
}
