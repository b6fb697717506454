import { Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { HardwareItem } from '../../../shared/hardware/hardware.api.ts';
import { Instant, Json, Ref, Text } from './columns.ts';
import { ShopRow } from './people.ts';

/** An entry of a shop's hardware book. */
@Entity('hardware')
export class HardwareRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @ManyToOne(() => ShopRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shopId', foreignKeyConstraintName: 'fk_hardware_shop' })
  shop?: ShopRow;
  @Text(10) kind: HardwareItem['kind'];
  @Text(80) name: string;
  @Json() body: HardwareItem['body'];
  @Instant() createdAt: Date;
}
