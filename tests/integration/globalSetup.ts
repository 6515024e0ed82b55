import type { TestProject } from 'vitest/node';
import { makeEmptyDatabase } from '../fixtures/testDatabase';

/** Empties and migrates the database that the integration tests share. */
export default async function setup(project: TestProject): Promise<void> {
  project.provide('databaseUrl', await makeEmptyDatabase(''));
}
