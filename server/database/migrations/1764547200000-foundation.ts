import type { MigrationInterface, QueryRunner } from 'typeorm';

/** People, jobs, walls, patterns, layouts, sign-off and mail. */
export class Foundation1764547200000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    for (const statement of statements) await runner.query(statement);
  }

  async down(): Promise<void> {
    throw new Error('The first migration is not undone: drop the database instead.');
  }
}

const statements = [
  'CREATE TABLE shops (id uuid NOT NULL, name varchar(120) NOT NULL, units varchar(2) NOT NULL, createdAt datetime(3) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE users (id uuid NOT NULL, shopId uuid NOT NULL, email varchar(254) NOT NULL, name varchar(120) NOT NULL, role varchar(10) NOT NULL, passwordHash varchar(72) NOT NULL, active tinyint NOT NULL, createdAt datetime(3) NOT NULL, UNIQUE INDEX IDX_97672ac88f789774dd47f7c8be (email), PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE sessions (id uuid NOT NULL, userId uuid NOT NULL, refreshHash varchar(64) NOT NULL, previousHash varchar(64) NULL, createdAt datetime(3) NOT NULL, refreshedAt datetime(3) NOT NULL, expiresAt datetime(3) NOT NULL, revokedAt datetime(3) NULL, device varchar(200) NOT NULL, UNIQUE INDEX IDX_9aa6679df2de6777dc1bd127cb (refreshHash), PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE jobs (id uuid NOT NULL, shopId uuid NOT NULL, title varchar(120) NOT NULL, clientName varchar(120) NOT NULL, clientEmail varchar(254) NOT NULL, site varchar(300) NOT NULL, state varchar(10) NOT NULL, version int NOT NULL, createdAt datetime(3) NOT NULL, updatedAt datetime(3) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE job_assignments (jobId uuid NOT NULL, userId uuid NOT NULL, PRIMARY KEY (jobId, userId)) ENGINE=InnoDB',
  'CREATE TABLE walls (id uuid NOT NULL, shopId uuid NOT NULL, jobId uuid NOT NULL, name varchar(80) NOT NULL, widthMm double NOT NULL, heightMm double NOT NULL, construction varchar(20) NOT NULL, coveringMm double NOT NULL, obstructions json NOT NULL, zones json NOT NULL, photoId uuid NULL, version int NOT NULL, createdAt datetime(3) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE studs (id uuid NOT NULL, wallId uuid NOT NULL, xMm double NOT NULL, widthMm double NOT NULL, foundBy varchar(10) NOT NULL, uncertaintyMm double NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE photos (id uuid NOT NULL, shopId uuid NOT NULL, wallId uuid NOT NULL, originalKey varchar(200) NOT NULL, previewKey varchar(200) NOT NULL, elevationKey varchar(200) NULL, elevationSha256 varchar(64) NULL, widthPx int NOT NULL, heightPx int NOT NULL, marks json NULL, elevation json NULL, createdAt datetime(3) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE hardware (id uuid NOT NULL, shopId uuid NOT NULL, kind varchar(10) NOT NULL, name varchar(80) NOT NULL, body json NOT NULL, createdAt datetime(3) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE patterns (id uuid NOT NULL, shopId uuid NOT NULL, name varchar(80) NOT NULL, design json NOT NULL, archived tinyint NOT NULL, version int NOT NULL, createdAt datetime(3) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE layouts (id uuid NOT NULL, shopId uuid NOT NULL, jobId uuid NOT NULL, wallId uuid NOT NULL, name varchar(80) NOT NULL, revealMm double NOT NULL, version int NOT NULL, createdAt datetime(3) NOT NULL, updatedAt datetime(3) NOT NULL, updatedBy varchar(120) NOT NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE frames (layoutId uuid NOT NULL, id uuid NOT NULL, patternId uuid NOT NULL, xMm double NOT NULL, yMm double NOT NULL, turnRad double NOT NULL, flipped tinyint NOT NULL, locked tinyint NOT NULL, label varchar(12) NOT NULL, contentsKg double NULL, hungGroup varchar(40) NULL, PRIMARY KEY (layoutId, id)) ENGINE=InnoDB',
  'CREATE TABLE revisions (id uuid NOT NULL, shopId uuid NOT NULL, layoutId uuid NOT NULL, letter varchar(4) NOT NULL, state varchar(15) NOT NULL, canonical longtext NOT NULL, sha256 varchar(64) NOT NULL, contentSha256 varchar(64) NOT NULL, elevationKey varchar(200) NULL, sentAt datetime(3) NOT NULL, signedAt datetime(3) NULL, signedName varchar(120) NULL, consent varchar(500) NULL, askedFor varchar(4000) NULL, UNIQUE INDEX uq_revisions_letter (layoutId, letter), PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE links (id uuid NOT NULL, shopId uuid NOT NULL, revisionId uuid NOT NULL, jobId uuid NOT NULL, tokenHash varchar(64) NOT NULL, sentTo varchar(254) NOT NULL, createdAt datetime(3) NOT NULL, expiresAt datetime(3) NOT NULL, revokedAt datetime(3) NULL, UNIQUE INDEX IDX_f8620dc6b713f47e0b7cf1aff6 (tokenHash), PRIMARY KEY (id)) ENGINE=InnoDB',
  'CREATE TABLE outbox (id uuid NOT NULL, shopId uuid NOT NULL, recipient varchar(254) NOT NULL, replyTo varchar(254) NULL, subject varchar(300) NOT NULL, text longtext NOT NULL, html longtext NOT NULL, state varchar(10) NOT NULL, attempts int NOT NULL, lastError varchar(500) NULL, createdAt datetime(3) NOT NULL, nextTryAt datetime(3) NOT NULL, sentAt datetime(3) NULL, PRIMARY KEY (id)) ENGINE=InnoDB',
  'ALTER TABLE users ADD CONSTRAINT fk_users_shop FOREIGN KEY (shopId) REFERENCES shops(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE sessions ADD CONSTRAINT fk_sessions_user FOREIGN KEY (userId) REFERENCES users(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE jobs ADD CONSTRAINT fk_jobs_shop FOREIGN KEY (shopId) REFERENCES shops(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE job_assignments ADD CONSTRAINT fk_assignments_job FOREIGN KEY (jobId) REFERENCES jobs(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE job_assignments ADD CONSTRAINT fk_assignments_user FOREIGN KEY (userId) REFERENCES users(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE walls ADD CONSTRAINT fk_walls_job FOREIGN KEY (jobId) REFERENCES jobs(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE studs ADD CONSTRAINT fk_studs_wall FOREIGN KEY (wallId) REFERENCES walls(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE photos ADD CONSTRAINT fk_photos_wall FOREIGN KEY (wallId) REFERENCES walls(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE hardware ADD CONSTRAINT fk_hardware_shop FOREIGN KEY (shopId) REFERENCES shops(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE patterns ADD CONSTRAINT fk_patterns_shop FOREIGN KEY (shopId) REFERENCES shops(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE layouts ADD CONSTRAINT fk_layouts_job FOREIGN KEY (jobId) REFERENCES jobs(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE layouts ADD CONSTRAINT fk_layouts_wall FOREIGN KEY (wallId) REFERENCES walls(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE frames ADD CONSTRAINT fk_frames_layout FOREIGN KEY (layoutId) REFERENCES layouts(id) ON DELETE CASCADE ON UPDATE NO ACTION',
  'ALTER TABLE frames ADD CONSTRAINT fk_frames_pattern FOREIGN KEY (patternId) REFERENCES patterns(id) ON DELETE RESTRICT ON UPDATE NO ACTION',
  'ALTER TABLE revisions ADD CONSTRAINT fk_revisions_layout FOREIGN KEY (layoutId) REFERENCES layouts(id) ON DELETE RESTRICT ON UPDATE NO ACTION',
  'ALTER TABLE links ADD CONSTRAINT fk_links_revision FOREIGN KEY (revisionId) REFERENCES revisions(id) ON DELETE CASCADE ON UPDATE NO ACTION',
];
