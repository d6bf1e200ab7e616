import type { DataSource } from 'typeorm'
import type { DemoAccount } from '@shared/api/accounts'
import { Account } from './account.entity'
import { toInitials } from './initials'
import { hashPassword } from './passwords'

const demoPerson = (role: string, name: string): DemoAccount => ({
  email: `${role}@merrow.example`,
  password: `merrow-${role}`,
  role,
  name,
})

/** The people of the invented Merrow Island Survey. Their passwords are published: they sign in on loopback only. */
export const demoAccounts: readonly DemoAccount[] = [
  demoPerson('compiler', 'Rosa Kelp'),
  demoPerson('editor', 'Tove Orr'),
  demoPerson('approver', 'Edda Marr'),
  demoPerson('administrator', 'Ivo Skerry'),
]

/** Makes the demo accounts that are not there yet. */
export async function loadDemoAccounts(dataSource: DataSource): Promise<void> {
  for (const { email, name, password, role } of demoAccounts) {
    if (await dataSource.manager.existsBy(Account, { email })) continue
    await dataSource.manager
      .createQueryBuilder()
      .insert()
      .into(Account)
      .values({
        email,
        name,
        initials: toInitials(name),
        administrator: role === 'administrator',
        demo: true,
        passwordHash: await hashPassword(password),
      })
      .orIgnore()
      .execute()
  }
}
