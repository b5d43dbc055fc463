'use client'

import { type ReactNode, useId, useRef } from 'react'
import { ActionForm } from './ActionForm'
import type { FormAction } from './form-state'
import { Submit } from './Submit'

interface ConfirmFormProps {
  readonly action: FormAction
  /** On the button that asks. */
  readonly label: string
  readonly title: string
  /** Names what will happen; further fields may stand here, too. */
  readonly children: ReactNode
  /** On the button that does it: "Deactivate M-14". */
  readonly confirm: string
  readonly tone?: 'primary' | 'alarm'
}

/** A button that asks first, in a dialog that names what will happen. */
export function ConfirmForm({ action, label, title, children, confirm, tone = 'alarm' }: ConfirmFormProps) {
  const dialog = useRef<HTMLDialogElement>(null)
  const heading = useId()
  return (
    <>
      <button type="button" className="button" onClick={() => dialog.current?.showModal()}>
        {label}
      </button>
      <dialog ref={dialog} className="dialog" aria-labelledby={heading}>
        <h2 id={heading}>{title}</h2>
        <ActionForm action={action}>
          {children}
          <div className="actions">
            <Submit tone={tone}>{confirm}</Submit>
            <button type="button" className="button" onClick={() => dialog.current?.close()}>
              Leave it
            </button>
          </div>
        </ActionForm>
      </dialog>
    </>
  )
}
