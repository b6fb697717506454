import type { MigrationInterface, QueryRunner } from 'typeorm';

/** What was known of a photo beside its marks, what its straightening says of itself, its sharpness and focal length. */
export class PhotoFit1764594000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE photos ADD known json NULL, ADD fit json NULL, ADD sharpness double NULL, ADD focal35Mm double NULL');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE photos DROP COLUMN known, DROP COLUMN fit, DROP COLUMN sharpness, DROP COLUMN focal35Mm');
  }
}
