#!/usr/bin/env node
import { runCommandLine } from './command-line.js';

// A reader that has seen enough (`| head`) closes the pipe: that is no failure.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
});

// npm runs a script in the package's folder; paths mean the folder where the person stands.
const folder =
  (process.env['npm_lifecycle_event'] === 'noonwell' ? process.env['INIT_CWD'] : undefined) ?? process.cwd();

process.exitCode = await runCommandLine(process.argv.slice(2), {
  folder,
  out: (text) => process.stdout.write(text),
  err: (text) => process.stderr.write(text),
  isWatched: process.stderr.isTTY,
});
