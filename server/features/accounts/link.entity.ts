import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import { Account } from './account.entity'

export type LinkPurpose = 'first-administrator' | 'invitation'

/** A one-time link by which a person sets name and password. Only a hash of its token is kept. */
@Entity('link')
@Index('link_token_hash_unique', ['tokenHash'], { unique: true })
@Check('link_purpose_known', `"purpose" IN ('first-administrator', 'invitation')`)
@Check('link_invitation_names_account', `("purpose" = 'invitation') = ("account_id" IS NOT NULL)`)
export class Link {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'link_pkey' })
  id: string

  /** SHA-256 of the token, hexadecimal. */
  @Column({ name: 'token_hash', type: 'text' })
  tokenHash: string

  @Column({ name: 'purpose', type: 'text' })
  purpose: LinkPurpose

  /** The invited account; null for the first administrator's link. */
  @Column({ name: 'account_id', type: 'uuid', nullable: true })
  @ForeignKey(() => Account, { name: 'link_account_fkey' })
  accountId: string | null

  @Column({ name: 'expires_at', type: 'timestamptz' })
  expiresAt: Date

  @Column({ name: 'used_at', type: 'timestamptz', nullable: true })
  usedAt: Date | null

  @Column({ name: 'created_at', type: 'timestamptz', default: () => 'now()' })
  createdAt: Date
}
