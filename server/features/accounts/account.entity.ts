import { Check, Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm'

/** A person who may sign in. */
@Entity('account')
@Index('account_email_unique', ['email'], { unique: true })
@Check('account_email_lower_case', 'email = lower(email)')
export class Account {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'account_pkey' })
  id: string

  /** Lower case; what the person signs in with. */
  @Column({ name: 'email', type: 'text' })
  email: string

  @Column({ name: 'name', type: 'text' })
  name: string

  @Column({ name: 'initials', type: 'text' })
  initials: string

  /** Looks after people and memberships; gives no role on any sheet. */
  @Column({ name: 'administrator', type: 'boolean', default: false })
  administrator: boolean

  /** A demo account has a published password: it may sign in only while the demo is served on loopback. */
  @Column({ name: 'demo', type: 'boolean', default: false })
  demo: boolean

  /** Argon2id, in its standard text form; null until the person has set a password by their link. */
  @Column({ name: 'password_hash', type: 'text', nullable: true, select: false })
  passwordHash: string | null

  @Column({ name: 'created_at', type: 'timestamptz', default: () => 'now()' })
  createdAt: Date
}
