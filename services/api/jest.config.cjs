const shared = require('../../jest.shared.cjs');

/** @type {import('jest').Config} */
module.exports = { ...shared, displayName: 'api', rootDir: __dirname };
