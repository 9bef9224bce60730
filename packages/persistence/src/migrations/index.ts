import type { MigrationObject } from '@mikro-orm/core';
import { FirstPathS } from './20250601000000-first-path-S.js';
import { RunSignalsS } from './20250602000000-run-signals-S.js';

/**
 * In order; the name is what the database remembers. -S changes structure, -D changes data. A list instead of a
 * folder scan, so that source and build run the same.
 */
export const MIGRATIONS: MigrationObject[] = [
  { name: '20250601000000-first-path-S', class: FirstPathS },
  { name: '20250602000000-run-signals-S', class: RunSignalsS },
];
