import { database } from '@/lib/data/database'
import { getWorks } from '@/lib/data/works'

/** Whether the works still has no name and place. Asked before anybody may do anything, so without an actor. */
export const isWorksMissing = async (): Promise<boolean> => (await getWorks(database().read)) === undefined
