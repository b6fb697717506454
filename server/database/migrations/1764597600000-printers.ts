import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Printers of a shop and their corrections. */
export class Printers1764597600000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('CREATE TABLE printers (id uuid NOT NULL, shopId uuid NOT NULL, name varchar(80) NOT NULL, correctionX double NOT NULL, correctionY double NOT NULL, measuredAt datetime(3) NULL, createdAt datetime(3) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB');
    await runner.query('ALTER TABLE printers ADD CONSTRAINT fk_printers_shop FOREIGN KEY (shopId) REFERENCES shops(id) ON DELETE CASCADE ON UPDATE NO ACTION');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE printers');
  }
}
