import { Entity, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import type { revisionStates } from '../../../shared/layouts/layout.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { Flag, Instant, Json, LongText, Mm, Ref, Text, Whole } from './columns.ts';
import { JobRow } from './jobs.ts';
import { ShopRow } from './people.ts';
import { WallRow } from './walls.ts';

@Entity('patterns')
export class PatternRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @ManyToOne(() => ShopRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shopId', foreignKeyConstraintName: 'fk_patterns_shop' })
  shop?: ShopRow;
  @Text(80) name: string;
  @Json() design: PatternDesign;
  @Flag() archived: boolean;
  @Whole() version: number;
  @Instant() createdAt: Date;
}

@Entity('layouts')
export class LayoutRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @Ref() jobId: string;
  @ManyToOne(() => JobRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'jobId', foreignKeyConstraintName: 'fk_layouts_job' })
  job?: JobRow;
  @Ref() wallId: string;
  @ManyToOne(() => WallRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'wallId', foreignKeyConstraintName: 'fk_layouts_wall' })
  wall?: WallRow;
  @Text(80) name: string;
  @Mm() revealMm: number;
  @Whole() version: number;
  @Instant() createdAt: Date;
  @Instant() updatedAt: Date;
  @Text(120) updatedBy: string;
}

@Entity('frames')
export class FrameRow {
  @PrimaryColumn({ type: 'uuid' }) layoutId: string;
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @ManyToOne(() => LayoutRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'layoutId', foreignKeyConstraintName: 'fk_frames_layout' })
  layout?: LayoutRow;
  @Ref() patternId: string;
  @ManyToOne(() => PatternRow, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'patternId', foreignKeyConstraintName: 'fk_frames_pattern' })
  pattern?: PatternRow;
  @Mm() xMm: number;
  @Mm() yMm: number;
  @Mm() turnRad: number;
  @Flag() flipped: boolean;
  @Flag() locked: boolean;
  @Text(12) label: string;
  @Mm({ nullable: true }) contentsKg: number | null;
  @Text(40, { nullable: true }) hungGroup: string | null;
  @Json({ nullable: true }) hangerSlides: Record<string, number> | null;
}

/** A layout as it was sent: the canonical text never changes after the row is written. */
@Entity('revisions')
@Unique('uq_revisions_letter', ['layoutId', 'letter'])
export class RevisionRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @Ref() layoutId: string;
  @ManyToOne(() => LayoutRow, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'layoutId', foreignKeyConstraintName: 'fk_revisions_layout' })
  layout?: LayoutRow;
  @Text(4) letter: string;
  @Text(15) state: (typeof revisionStates)[number];
  @LongText() canonical: string;
  @Text(64) sha256: string;
  /** Hash of what the bench held, without letter and note: tells whether it has changed since. */
  @Text(64) contentSha256: string;
  @Text(200, { nullable: true }) elevationKey: string | null;
  @Instant() sentAt: Date;
  @Instant({ nullable: true }) signedAt: Date | null;
  @Text(120, { nullable: true }) signedName: string | null;
  @Text(500, { nullable: true }) consent: string | null;
  @Text(4000, { nullable: true }) askedFor: string | null;
}

/** A client's personal link; the token itself is in their mail alone. */
@Entity('links')
export class LinkRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @Ref() revisionId: string;
  @ManyToOne(() => RevisionRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'revisionId', foreignKeyConstraintName: 'fk_links_revision' })
  revision?: RevisionRow;
  @Ref() jobId: string;
  @Text(64, { unique: true }) tokenHash: string;
  @Text(254) sentTo: string;
  @Instant() createdAt: Date;
  @Instant() expiresAt: Date;
  @Instant({ nullable: true }) revokedAt: Date | null;
}
