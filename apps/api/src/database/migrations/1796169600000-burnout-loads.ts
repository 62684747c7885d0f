import type { MigrationInterface, QueryRunner } from 'typeorm';

export class BurnoutLoads1796169600000 implements MigrationInterface {
  name = 'BurnoutLoads1796169600000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE "burnout_loads" ("id" text PRIMARY KEY NOT NULL, "number" integer NOT NULL, "ovenId" text NOT NULL, "ovenName" text NOT NULL, "day" text NOT NULL, "remark" text NOT NULL, "limitC" real NOT NULL, "limitReason" text NOT NULL, "limitSource" text NOT NULL, "limitStanding" text NOT NULL, "offsetK" real NOT NULL, "partChannels" text, "verdict" text, "reasons" text NOT NULL, "hottest" text, "peakC" real, "minutesAboveLimit" real, "minutesAbove345C" real, "fileName" text, "storedName" text, "sizeBytes" integer, "sha256" text, "readAt" text, "hints" text NOT NULL, "read" text, "byUserId" text NOT NULL, "byName" text NOT NULL, "createdAt" text NOT NULL, "version" integer NOT NULL, CONSTRAINT "UQ_e5999a7d42207172f29f1f01402" UNIQUE ("number"), CONSTRAINT "UQ_a18c5ac3e80444b4e28b9cff2d3" UNIQUE ("storedName"), CONSTRAINT "FK_8cb01ae40189ef8028fd6a402cd" FOREIGN KEY ("byUserId") REFERENCES "users" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION)`);
    await runner.query(`CREATE INDEX "burnout_loads_by_oven" ON "burnout_loads" ("ovenId", "number")`);
    await runner.query(`CREATE TABLE "burnout_load_jobs" ("id" text PRIMARY KEY NOT NULL, "loadId" text NOT NULL, "jobId" text NOT NULL, "ringsOff" boolean NOT NULL, "limitC" real NOT NULL, "limitReason" text NOT NULL, CONSTRAINT "FK_750e1b6d751ef482059a7082753" FOREIGN KEY ("loadId") REFERENCES "burnout_loads" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION, CONSTRAINT "FK_8ba475a880e0b607216839bf274" FOREIGN KEY ("jobId") REFERENCES "jobs" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION)`);
    await runner.query(`CREATE INDEX "burnout_load_jobs_by_job" ON "burnout_load_jobs" ("jobId")`);
    await runner.query(`CREATE UNIQUE INDEX "burnout_load_jobs_once" ON "burnout_load_jobs" ("loadId", "jobId")`);
    await runner.query(`CREATE TABLE "oven_history" ("id" text PRIMARY KEY NOT NULL, "ovenId" text NOT NULL, "day" text NOT NULL, "change" real NOT NULL, "remark" text NOT NULL, "byUserId" text NOT NULL, "byName" text NOT NULL, "at" text NOT NULL, "withdrawnAt" text, "withdrawnBecause" text NOT NULL, CONSTRAINT "FK_62484660a829a6ce50bbc365b00" FOREIGN KEY ("byUserId") REFERENCES "users" ("id") ON DELETE NO ACTION ON UPDATE NO ACTION)`);
    await runner.query(`CREATE INDEX "oven_history_in_order" ON "oven_history" ("ovenId", "day", "id")`);
  }

  down(): Promise<void> {
    return Promise.reject(new Error('Migrations go forward only; restore the backup instead.'));
  }
}
