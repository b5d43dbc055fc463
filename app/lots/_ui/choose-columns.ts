'use server'

import { cookies } from 'next/headers'
import { redirect } from 'next/navigation'
import { requireActor } from '@/app/_session'
import { valuesOf } from '@/app/_submit'
import { parseColumns, readLotAddress } from '@/lib/input/lot-list'
import { columnsCookie } from './columns-cookie'
import { lotsHref } from './lots-href'

const YEAR_S = 365 * 24 * 3600

/** Remembers the chosen columns for this browser and goes back to the list that was on the screen, in them. */
export async function chooseColumns(form: FormData): Promise<void> {
  await requireActor()
  const [address = ''] = valuesOf(form, 'address')
  const usual = valuesOf(form, 'usual').length > 0
  const columns = usual ? undefined : parseColumns(valuesOf(form, 'columns').join(','))
  const store = await cookies()
  if (columns)
    store.set(columnsCookie, columns.join(','), {
      path: '/',
      maxAge: YEAR_S,
      sameSite: 'lax',
      httpOnly: true,
    })
  else store.delete(columnsCookie)
  const { input } = readLotAddress(Object.fromEntries(new URLSearchParams(address)))
  redirect(lotsHref({ ...input, columns }))
}
