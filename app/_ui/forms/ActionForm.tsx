'use client'

import { createContext, type ReactNode, use, useActionState } from 'react'
import { ErrorSummary } from './ErrorSummary'
import { type FormAction, type FormState, freshForm } from './form-state'

interface FormContextValue {
  readonly state: FormState
  readonly pending: boolean
}

const FormContext = createContext<FormContextValue>({ state: freshForm, pending: false })

/** For fields: the answer to the last sending, and whether one is under way. */
export const useForm = (): FormContextValue => use(FormContext)

interface ActionFormProps {
  readonly action: FormAction
  readonly children: ReactNode
  /** Accessible name, where no heading names the form. */
  readonly label?: string
  readonly className?: string
}

/**
 * A form for a server action: lists what is wrong over the form and under each field, gives back what was
 * typed, says when it is done. Works without script, too.
 */
export function ActionForm({ action, children, label, className = 'form' }: ActionFormProps) {
  const [state, send, pending] = useActionState(action, freshForm)
  return (
    <FormContext value={{ state, pending }}>
      <form action={send} className={className} aria-label={label} noValidate>
        <ErrorSummary key={state.stamp} problems={state.problems} />
        {children}
        <p role="status" className="saved">
          {state.status === 'done' && !pending ? state.message : null}
        </p>
      </form>
    </FormContext>
  )
}
