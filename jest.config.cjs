const { existsSync, readdirSync } = require('node:fs');
const { join } = require('node:path');

/** Every workspace with a jest.config.cjs of its own is a project: a new package needs no line here. */
const projects = ['packages', 'services']
  .flatMap((group) => readdirSync(join(__dirname, group)).map((name) => join(__dirname, group, name)))
  .filter((dir) => existsSync(join(dir, 'jest.config.cjs')));

/** @type {import('jest').Config} */
module.exports = { projects, testTimeout: 60_000 };
