import type { Tx } from './database'

/** A person as the record knows them; never deleted. */
export interface PersonRow {
  readonly id: number
  readonly name: string
  readonly username: string
  readonly active: boolean
  readonly version: number
  readonly createdAt: number
  readonly userId: string | undefined
  readonly roles: readonly string[]
}

const select = {
  id: true,
  name: true,
  username: true,
  active: true,
  version: true,
  createdAt: true,
  userId: true,
  roles: { select: { role: true } },
} as const

interface Selected {
  id: number
  name: string
  username: string
  active: boolean
  version: number
  createdAt: Date
  userId: string | null
  roles: { role: string }[]
}

const rowOf = ({ createdAt, userId, roles, ...rest }: Selected): PersonRow => ({
  ...rest,
  createdAt: createdAt.getTime(),
  userId: userId ?? undefined,
  roles: roles.map(({ role }) => role),
})

export const countPeople = (tx: Tx): Promise<number> => tx.person.count()

export const listPeople = async (tx: Tx): Promise<readonly PersonRow[]> =>
  (await tx.person.findMany({ select, orderBy: [{ searchKey: 'asc' }, { id: 'asc' }] })).map(rowOf)

const found = (row: Selected | null): PersonRow | undefined => (row ? rowOf(row) : undefined)

export const getPerson = async (tx: Tx, id: number): Promise<PersonRow | undefined> =>
  found(await tx.person.findUnique({ where: { id }, select }))

export const findPersonByUserId = async (tx: Tx, userId: string): Promise<PersonRow | undefined> =>
  found(await tx.person.findUnique({ where: { userId }, select }))

export const findPersonByUsername = async (tx: Tx, username: string): Promise<PersonRow | undefined> =>
  found(await tx.person.findUnique({ where: { username }, select }))

/** Active people who hold a role, apart from one. */
export const countOthersWithRole = (tx: Tx, role: string, exceptId: number): Promise<number> =>
  tx.person.count({ where: { active: true, id: { not: exceptId }, roles: { some: { role } } } })

interface NewPerson {
  readonly name: string
  readonly username: string
  readonly searchKey: string
  readonly roles: readonly string[]
  readonly userId: string
  readonly at: number
}

export const insertPerson = async (
  tx: Tx,
  { name, username, searchKey, roles, userId, at }: NewPerson,
): Promise<PersonRow> =>
  rowOf(
    await tx.person.create({
      data: {
        name,
        username,
        searchKey,
        userId,
        createdAt: new Date(at),
        roles: { create: roles.map((role) => ({ role })) },
      },
      select,
    }),
  )

interface PersonChange {
  readonly name: string
  readonly searchKey: string
  readonly active: boolean
  readonly roles: readonly string[]
}

/** @returns false when the row has another version by now, or is not there */
export const updatePerson = async (
  tx: Tx,
  id: number,
  version: number,
  { roles, ...change }: PersonChange,
): Promise<boolean> => {
  const { count } = await tx.person.updateMany({
    where: { id, version },
    data: { ...change, version: { increment: 1 } },
  })
  if (count === 0) return false
  await tx.personRole.deleteMany({ where: { personId: id, role: { notIn: [...roles] } } })
  for (const role of roles) {
    await tx.personRole.upsert({
      where: { personId_role: { personId: id, role } },
      create: { personId: id, role },
      update: {},
    })
  }
  return true
}
