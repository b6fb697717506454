import { Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { Role } from '../../../shared/people/permissions.ts';
import { Flag, Instant, Ref, Text } from './columns.ts';

@Entity('shops')
export class ShopRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Text(120) name: string;
  @Text(2) units: 'in' | 'mm';
  @Instant() createdAt: Date;
}

@Entity('users')
export class UserRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @ManyToOne(() => ShopRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shopId', foreignKeyConstraintName: 'fk_users_shop' })
  shop?: ShopRow;
  @Text(254, { unique: true }) email: string;
  @Text(120) name: string;
  @Text(10) role: Role;
  @Text(72) passwordHash: string;
  @Flag() active: boolean;
  @Instant() createdAt: Date;
}

/** One sign-in. Its refresh token changes at every use; only the hashes of this one and the one before are kept. */
@Entity('sessions')
export class SessionRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() userId: string;
  @ManyToOne(() => UserRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'userId', foreignKeyConstraintName: 'fk_sessions_user' })
  user?: UserRow;
  @Text(64, { unique: true }) refreshHash: string;
  @Text(64, { nullable: true }) previousHash: string | null;
  @Instant() createdAt: Date;
  @Instant() refreshedAt: Date;
  @Instant() expiresAt: Date;
  @Instant({ nullable: true }) revokedAt: Date | null;
  @Text(200) device: string;
}
