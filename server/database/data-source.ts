import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { HardwareRow } from './entities/hardware.ts';
import { AssignmentRow, JobRow } from './entities/jobs.ts';
import { FrameRow, LayoutRow, LinkRow, PatternRow, RevisionRow } from './entities/layouts.ts';
import { OutboxRow } from './entities/mail.ts';
import { SessionRow, ShopRow, UserRow } from './entities/people.ts';
import { PrinterRow } from './entities/printers.ts';
import { PhotoRow, StudRow, WallRow } from './entities/walls.ts';
import { migrations } from './migrations/all.ts';

export const entities = [
  ShopRow, UserRow, SessionRow, JobRow, AssignmentRow, WallRow, StudRow, PhotoRow,
  HardwareRow, PatternRow, LayoutRow, FrameRow, RevisionRow, LinkRow, OutboxRow, PrinterRow,
];

export type Database = DataSource;

/** A connection pool to MariaDB. The schema comes from migrations alone. */
export function createDataSource(databaseUrl: string): DataSource {
  return new DataSource({
    type: 'mariadb',
    url: databaseUrl,
    entities,
    migrations,
    migrationsTransactionMode: 'each',
    synchronize: false,
    charset: 'utf8mb4_unicode_ci',
    timezone: 'Z',
    poolSize: 12,
    supportBigNumbers: true,
    extra: { connectionLimit: 12 },
    logging: false,
  });
}
