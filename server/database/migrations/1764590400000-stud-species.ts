import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Species group of a wall's studs. Walls measured before had been reckoned as spruce-pine-fir. */
export class StudSpecies1764590400000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE walls ADD studSpecies varchar(30) NOT NULL DEFAULT 'spruce-pine-fir' AFTER coveringMm");
    await runner.query('ALTER TABLE walls ALTER COLUMN studSpecies DROP DEFAULT');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE walls DROP COLUMN studSpecies');
  }
}
