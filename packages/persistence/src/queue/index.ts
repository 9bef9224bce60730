export * from './backend.js';
export * from './channels.js';
export * from './listen.js';
export * from './migrate.js';
export * from './run-claims.js';
export * from './run-requests.js';
