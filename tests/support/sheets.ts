import type { Role } from '@shared/api/accounts'
import type { NewSheet } from '@shared/api/sheets'
import { Account } from '../../server/features/accounts/account.entity'
import { Membership } from '../../server/features/accounts/membership.entity'
import type { TestServer } from './server'
import type { Who } from './sign-in'

export interface TestSheet {
  id: string
  number: string
  /** Its latest revision: 1, which holds its sheet face. */
  revision: number
}

export interface SheetOverrides extends Partial<NewSheet> {
  /** Roles of the demo people; each has their own unless others are given. */
  roles?: Partial<Record<Who, readonly Role[]>>
}

const ownRoles: Partial<Record<Who, readonly Role[]>> = {
  compiler: ['compiler'],
  editor: ['editor'],
  approver: ['approver'],
}

let made = 0

/** A sheet with nothing on it, 10 × 11 km in UTM zone 26, whose members are the demo people. */
export async function aSheet(server: TestServer, overrides: SheetOverrides = {}): Promise<TestSheet> {
  const { roles = {}, ...own } = overrides
  const { dataSource, services } = server
  const number = own.number ?? `T-${++made}`
  const sheet: NewSheet = {
    number,
    title: `Test sheet ${number}`,
    scale: 24_000,
    srid: 32626,
    area: { by: 'metres', west: 284_000, south: 5_278_000, east: 294_000, north: 5_289_000 },
    page: { width: 841, height: 594 },
    attitudeConvention: 'strike-dip',
    authors: 'Rosa Kelp and Tove Orr',
    ...own,
  }
  return dataSource.transaction(async (em) => {
    const accountId = async (who: string) =>
      (await em.findOneByOrFail(Account, { email: `${who}@merrow.example` })).id
    const id = await services.sheets.createWithin(em, sheet, await accountId('administrator'))
    for (const [who, theirs] of Object.entries({ ...ownRoles, ...roles })) {
      for (const role of theirs)
        await em.insert(Membership, { sheetId: id, accountId: await accountId(who), role })
    }
    return { id, number, revision: 1 }
  })
}
