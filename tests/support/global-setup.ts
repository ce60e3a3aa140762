import pg from 'pg'
import type { TestProject } from 'vitest/node'
import { migrate } from '../../server/database/migrate.ts'
import { startThrowawayServices } from '../../server/bin/launcher/throwaway-services.mjs'
import { template, urlFor } from './template-database.ts'

declare module 'vitest' {
  interface ProvidedContext {
    adminUrl: string
    redisUrl: string
  }
}

/** One template database for the whole run, with every migration in it; each test file gets a copy. */
export default async function setup(project: TestProject) {
  const given = process.env.TEST_DATABASE_URL && process.env.TEST_REDIS_URL ? { databaseUrl: process.env.TEST_DATABASE_URL, redisUrl: process.env.TEST_REDIS_URL, stop: async () => {} } : null
  const services = given ?? (await startThrowawayServices())
  await makeTemplate(services.databaseUrl)
  project.provide('adminUrl', services.databaseUrl)
  project.provide('redisUrl', services.redisUrl)
  return () => services.stop()
}

async function makeTemplate(adminUrl: string): Promise<void> {
  const admin = new pg.Client({ connectionString: adminUrl })
  await admin.connect()
  try {
    await admin.query('select pg_advisory_lock(7242)')
    for (const role of ['crosshead_owner', 'crosshead_app']) {
      const { rowCount } = await admin.query('select 1 from pg_roles where rolname = $1', [role])
      if (!rowCount) await admin.query(`create role ${role} login`)
      await admin.query(`alter role ${role} login password 'only-for-tests'`)
    }
    await admin.query(`drop database if exists ${template} with (force)`)
    await admin.query(`create database ${template} owner crosshead_owner`)
    await migrate(urlFor(adminUrl, 'crosshead_owner', template), urlFor(adminUrl, 'crosshead_app', template))
  } finally {
    await admin.end()
  }
}
