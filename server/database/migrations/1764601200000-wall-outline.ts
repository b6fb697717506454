import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The outline of a wall that is no upright rectangle. */
export class WallOutline1764601200000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE walls ADD outlineMm json NULL');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE walls DROP COLUMN outlineMm');
  }
}
