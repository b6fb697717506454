import type { MigrationInterface, QueryRunner } from 'typeorm';

/** How far the hangers of a frame were slid along their members; null where none was. */
export class HangerSlides1764590460000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE frames ADD hangerSlides json NULL');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE frames DROP COLUMN hangerSlides');
  }
}
