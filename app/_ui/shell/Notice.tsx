import type { ReactNode } from 'react'

interface NoticeProps {
  readonly tone?: 'good' | 'alarm' | 'question'
  readonly children: ReactNode
}

/** A remark beside the work. Say the verdict in words: the colour only supports it. */
export function Notice({ tone, children }: NoticeProps) {
  return <div className={tone ? `notice ${tone}` : 'notice'}>{children}</div>
}
