/** `npm run typecheck` */
import process from 'node:process';
import { typeCheck } from './lib/type-check.mjs';

process.exitCode = (await typeCheck()) ? 0 : 1;
