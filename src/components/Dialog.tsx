import { X } from 'lucide-react'
import type { ReactNode } from 'react'
import { Button as AriaButton, Dialog as AriaDialog, Heading, Modal, ModalOverlay } from 'react-aria-components'

export interface DialogProps {
  title: string
  isOpen: boolean
  onClose: () => void
  children: ReactNode
  /** Buttons, right-aligned; the primary one last. */
  footer?: ReactNode
  /** false: neither Esc nor a click beside it closes, so that typed work is never lost by a slip. */
  dismissable?: boolean
  wide?: boolean
}

/** A sheet laid over the page. Focus stays inside and returns where it was. */
export function Dialog({ title, isOpen, onClose, children, footer, dismissable = true, wide = false }: DialogProps) {
  return (
    <ModalOverlay isOpen={isOpen} onOpenChange={(open) => !open && onClose()} isDismissable={dismissable} isKeyboardDismissDisabled={!dismissable} className="no-print fixed inset-0 z-40 flex items-start justify-center overflow-y-auto bg-bar/60 p-4 sm:pt-[10vh]">
      <Modal className={`w-full border border-ink bg-sheet text-ink ${wide ? 'max-w-4xl' : 'max-w-lg'}`}>
        <AriaDialog className="outline-none">
          <header className="flex items-center justify-between gap-4 border-b border-ink px-4 py-2.5">
            <Heading slot="title" className="sheet-head">
              {title}
            </Heading>
            <AriaButton slot="close" aria-label="Close" className="-mr-1.5 flex size-8 items-center justify-center rounded hover:bg-paper">
              <X size={18} aria-hidden="true" />
            </AriaButton>
          </header>
          <div className="space-y-4 px-4 py-4">{children}</div>
          {footer && <footer className="flex flex-wrap justify-end gap-2 border-t border-rule px-4 py-3">{footer}</footer>}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  )
}
