import type { ImportListItem } from '@/lib/services/list-imports'

export const importStateWords: Readonly<Record<ImportListItem['state'], string>> = {
  draft: 'not begun',
  queued: 'waits its turn',
  running: 'under way',
  done: 'done',
  cancelled: 'ended by hand',
  failed: 'failed',
}
