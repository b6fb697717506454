import { Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { Mark, Obstruction, Photo, Stud, WallOutline, WallShape, Zone } from '../../../shared/walls/wall.ts';
import type { FitReport } from '../../../shared/walls/fit-report.ts';
import type { KnownBeside } from '../../../shared/walls/photo.ts';
import { Instant, Json, Mm, Ref, Text, Whole } from './columns.ts';
import { JobRow } from './jobs.ts';

@Entity('walls')
export class WallRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @Ref() jobId: string;
  @ManyToOne(() => JobRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'jobId', foreignKeyConstraintName: 'fk_walls_job' })
  job?: JobRow;
  @Text(80) name: string;
  @Mm() widthMm: number;
  @Mm() heightMm: number;
  @Text(20) construction: WallShape['construction'];
  @Mm() coveringMm: number;
  @Text(30) studSpecies: WallShape['studSpecies'];
  /** Null: the whole of width by height. */
  @Json({ nullable: true }) outlineMm: WallOutline | null;
  @Json() obstructions: Obstruction[];
  @Json() zones: Zone[];
  /** The photo in force. No foreign key: photos point at walls, and a circle of keys cannot be filled. */
  @Ref({ nullable: true }) photoId: string | null;
  @Whole() version: number;
  @Instant() createdAt: Date;
}

@Entity('studs')
export class StudRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() wallId: string;
  @ManyToOne(() => WallRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'wallId', foreignKeyConstraintName: 'fk_studs_wall' })
  wall?: WallRow;
  @Mm() xMm: number;
  @Mm() widthMm: number;
  @Text(10) foundBy: Stud['foundBy'];
  @Mm() uncertaintyMm: number;
}

@Entity('photos')
export class PhotoRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Ref() shopId: string;
  @Ref() wallId: string;
  @ManyToOne(() => WallRow, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'wallId', foreignKeyConstraintName: 'fk_photos_wall' })
  wall?: WallRow;
  /** Keys in the file store. */
  @Text(200) originalKey: string;
  @Text(200) previewKey: string;
  @Text(200, { nullable: true }) elevationKey: string | null;
  @Text(64, { nullable: true }) elevationSha256: string | null;
  @Whole() widthPx: number;
  @Whole() heightPx: number;
  @Json({ nullable: true }) marks: Mark[] | null;
  @Json({ nullable: true }) elevation: Omit<NonNullable<Photo['elevation']>, 'url'> | null;
  /** What was known beside the marks at the last straightening, and what it said of itself. */
  @Json({ nullable: true }) known: KnownBeside | null;
  @Json({ nullable: true }) fit: FitReport | null;
  @Mm({ nullable: true }) sharpness: number | null;
  @Mm({ nullable: true }) focal35Mm: number | null;
  @Instant() createdAt: Date;
}
