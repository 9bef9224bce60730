import { config } from 'zod/v4';

/**
 * Stands in the place of "zod" in the bundle (vite.config.ts), so that it runs before any schema is made: by
 * default each schema tries whether code may be made from text, which our content-security policy refuses and
 * reports.
 */
config({ jitless: true });

export * from 'zod/v4';
export { default } from 'zod/v4';
