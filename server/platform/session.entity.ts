import { Column, Entity, Index, PrimaryColumn } from 'typeorm'

/** A browser session; written and read by connect-pg-simple, which names the columns. */
@Entity('session')
@Index('session_expire', ['expire'])
export class SessionRow {
  @PrimaryColumn({ name: 'sid', type: 'text', primaryKeyConstraintName: 'session_pkey' })
  sid: string

  @Column({ name: 'sess', type: 'jsonb' })
  sess: unknown

  @Column({ name: 'expire', type: 'timestamptz' })
  expire: Date
}
