import type { MigrationInterface, QueryRunner } from 'typeorm';
import { createTriggers } from '../append-only.js';

export class InstrumentCalibrations1796256000000 implements MigrationInterface {
  name = 'InstrumentCalibrations1796256000000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE "instrument_calibrations" ("id" text PRIMARY KEY NOT NULL, "instrumentId" text NOT NULL, "calibratedOn" text NOT NULL, "dueOn" text NOT NULL, "certificateNumber" text NOT NULL, "laboratory" text NOT NULL, "asFound" text NOT NULL, "asFoundWords" text NOT NULL, "percentOfReading" real NOT NULL, "percentOfRange" real NOT NULL, "byUserId" text, "byName" text NOT NULL, "at" text NOT NULL, CONSTRAINT "FK_3ec88af51c659e897f61559a97e" FOREIGN KEY ("instrumentId") REFERENCES "instruments" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION, CONSTRAINT "FK_1b1e6eecc566ed139c7e28cacf4" FOREIGN KEY ("byUserId") REFERENCES "users" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION)`);
    await runner.query(`CREATE INDEX "instrument_calibrations_in_order" ON "instrument_calibrations" ("instrumentId", "calibratedOn") `);
    await runner.query(`CREATE TABLE "instrument_certificates" ("id" text PRIMARY KEY NOT NULL, "calibrationId" text NOT NULL, "name" text NOT NULL, "storedName" text NOT NULL, "sizeBytes" integer NOT NULL, "sha256" text NOT NULL, "byUserId" text NOT NULL, "byName" text NOT NULL, "at" text NOT NULL, CONSTRAINT "UQ_2fe229580ceb0decf6ab4151b51" UNIQUE ("storedName"), CONSTRAINT "FK_615c99f4317efd167a00fc1f97c" FOREIGN KEY ("calibrationId") REFERENCES "instrument_calibrations" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION, CONSTRAINT "FK_6ca4ae0b89b99c5de4362f74630" FOREIGN KEY ("byUserId") REFERENCES "users" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION)`);
    await runner.query(`CREATE INDEX "instrument_certificates_by_calibration" ON "instrument_certificates" ("calibrationId") `);
    // what the register knew of each instrument is the beginning of its history
    await runner.query(`INSERT INTO "instrument_calibrations" ("id", "instrumentId", "calibratedOn", "dueOn", "certificateNumber", "laboratory", "asFound", "asFoundWords", "percentOfReading", "percentOfRange", "byUserId", "byName", "at") SELECT lower(hex(randomblob(16))), "id", "calibratedOn", "dueOn", "certificateNumber", '', 'not-stated', '', "percentOfReading", "percentOfRange", NULL, '', "calibratedOn" || 'T00:00:00.000Z' FROM "instruments"`);
    await createTriggers(runner);
  }

  down(): Promise<void> {
    return Promise.reject(new Error('Migrations go forward only; restore the backup instead.'));
  }
}
