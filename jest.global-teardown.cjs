/** Closes the standard input of the test database's process and waits until it has cleaned up. */
module.exports = async function stopTestDatabase() {
  const child = globalThis.noonwellTestDatabase;
  if (child === undefined || child.exitCode !== null) return;
  const ended = new Promise((resolve) => child.once('exit', resolve));
  child.stdin.end();
  await ended;
};
