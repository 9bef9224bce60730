/** Entry of a thread that reads TypeScript: Node gives a thread no loader of its own, so it is set up first. */
const { workerData } = require('node:worker_threads');
require('tsx/cjs');

require(workerData.entry);
