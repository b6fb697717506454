import { Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { Job } from '../../../shared/jobs/jobs.api.ts';
import { Instant, Ref, Text, Whole } from './columns.ts';
import { ShopRow, UserRow } from './people.ts';

@Entity('jobs')
export class JobRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @ManyToOne(() => ShopRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shopId', foreignKeyConstraintName: 'fk_jobs_shop' })
  shop?: ShopRow;
  @Text(120) title: string;
  @Text(120) clientName: string;
  @Text(254) clientEmail: string;
  @Text(300) site: string;
  @Text(10) state: Job['state'];
  @Whole() version: number;
  @Instant() createdAt: Date;
  @Instant() updatedAt: Date;
}

/** Which hanger is sent to which job. */
@Entity('job_assignments')
export class AssignmentRow {
  @PrimaryColumn({ type: 'uuid' }) jobId: string;
  @PrimaryColumn({ type: 'uuid' }) userId: string;
  @ManyToOne(() => JobRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'jobId', foreignKeyConstraintName: 'fk_assignments_job' })
  job?: JobRow;
  @ManyToOne(() => UserRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'userId', foreignKeyConstraintName: 'fk_assignments_user' })
  user?: UserRow;
}
