import type { Actor } from '@/lib/access/actor'
import type { DemoSchedule } from './schedule'

export async function decideAsQualityWould(_: Actor, __: DemoSchedule): Promise<void> {}
