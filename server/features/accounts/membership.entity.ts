import { Check, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import { SheetRow } from '../sheets/sheet.entity'
import { Account } from './account.entity'

/** One role of one person on one sheet; a person may have several. */
@Entity('membership')
@Index('membership_sheet', ['sheetId'])
@Check('membership_role_known', `"role" IN ('compiler', 'editor', 'approver')`)
export class Membership {
  @PrimaryColumn({ name: 'account_id', type: 'uuid', primaryKeyConstraintName: 'membership_pkey' })
  @ForeignKey(() => Account, { name: 'membership_account_fkey' })
  accountId: string

  @PrimaryColumn({ name: 'sheet_id', type: 'uuid', primaryKeyConstraintName: 'membership_pkey' })
  @ForeignKey(() => SheetRow, { name: 'membership_sheet_fkey' })
  sheetId: string

  @PrimaryColumn({ name: 'role', type: 'text', primaryKeyConstraintName: 'membership_pkey' })
  role: Role
}
