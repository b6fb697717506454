import { Entity, PrimaryColumn } from 'typeorm';
import { Instant, LongText, Ref, Text, Whole } from './columns.ts';

/** Mail waiting to go or gone; written in the transaction of what it tells of. */
@Entity('outbox')
export class OutboxRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @Text(254) recipient: string;
  @Text(254, { nullable: true }) replyTo: string | null;
  @Text(300) subject: string;
  @LongText() text: string;
  @LongText() html: string;
  @Text(10) state: 'waiting' | 'sent' | 'failed';
  @Whole() attempts: number;
  @Text(500, { nullable: true }) lastError: string | null;
  @Instant() createdAt: Date;
  @Instant() nextTryAt: Date;
  @Instant({ nullable: true }) sentAt: Date | null;
}
