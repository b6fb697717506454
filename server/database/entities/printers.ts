import { Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import { Instant, Mm, Ref, Text } from './columns.ts';
import { ShopRow } from './people.ts';

/** A shop's printer, with what its prints need on each axis to come out true. */
@Entity('printers')
export class PrinterRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @ManyToOne(() => ShopRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shopId', foreignKeyConstraintName: 'fk_printers_shop' })
  shop?: ShopRow;
  @Text(80) name: string;
  @Mm() correctionX: number;
  @Mm() correctionY: number;
  /** When its bars were last measured; null for one never proved. */
  @Instant({ nullable: true }) measuredAt: Date | null;
  @Instant() createdAt: Date;
}
