const { spawn } = require('node:child_process');
const { join } = require('node:path');
const { createInterface } = require('node:readline');

const script = join(__dirname, 'packages/persistence/test/serve-test-database.ts');

/** One throw-away PostgreSQL for all jest workspaces of a run; each test copies its own database from the template. */
module.exports = async function startTestDatabase() {
  const child = spawn(process.execPath, ['--conditions=@noonwell/source', '--import', 'tsx', script], {
    cwd: __dirname,
    stdio: ['pipe', 'pipe', 'inherit'],
    // Ctrl-C reaches jest only; the server goes down when its standard input closes.
    detached: true,
  });
  const address = await new Promise((resolve, reject) => {
    const lines = createInterface({ input: child.stdout });
    // Whatever else a migration prints is not the address.
    lines.on('line', (line) => line.startsWith('{') && resolve(line));
    child.once('error', reject);
    child.once('exit', (code) =>
      reject(new Error(`The test database did not start (code ${String(code)}).`)),
    );
  });
  process.env['NOONWELL_TEST_POSTGRES'] = address;
  globalThis.noonwellTestDatabase = child;
};
