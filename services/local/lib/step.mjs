import process from 'node:process';

// A closed terminal or pipe must not end the program half-way: what was started still has to be stopped.
process.stdout.on('error', () => undefined);

/** An error whose text says all the reader needs; shown without a stack. */
export class StartError extends Error {}

/**
 * Runs one step and says so: a line when it starts, and its result with the seconds it took. On a terminal the seconds
 * count up in place.
 * @template T
 * @param {string} title what is being done, e.g. `Starting PostgreSQL`
 * @param {(note: (text: string) => void) => Promise<T> | T} work `note` sets the few words shown behind the title at the end
 * @returns {Promise<T>}
 */
export async function step(title, work) {
  const started = performance.now();
  const seconds = () => ((performance.now() - started) / 1000).toFixed(1);
  const live = process.stdout.isTTY;
  let result = '';
  const show = (/** @type {string} */ mark) =>
    `${mark} ${title}${result === '' ? '' : `: ${result}`}  ${seconds()} s`;
  if (live) process.stdout.write(`… ${title}`);
  const ticker = live ? setInterval(() => process.stdout.write(`\r\u001b[K${show('…')}`), 500) : undefined;
  const finish = (/** @type {string} */ mark) => {
    clearInterval(ticker);
    process.stdout.write(`${live ? '\r\u001b[K' : ''}${show(mark)}\n`);
  };
  try {
    const value = await work((text) => {
      result = text;
    });
    finish('✓');
    return value;
  } catch (error) {
    finish('✗');
    throw error;
  }
}

/**
 * Ends the program with the error in plain words.
 * @param {unknown} error
 * @returns {never}
 */
export function fail(error) {
  const sentence = fileFault(error);
  if (sentence !== undefined) process.stderr.write(`\n${sentence}\n`);
  else if (error instanceof StartError) process.stderr.write(`\n${error.message}\n`);
  else process.stderr.write(`\n${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  process.exit(1);
}

/**
 * What the file system said, for the faults that a person can mend.
 * @param {unknown} error
 * @returns {string | undefined}
 */
export function fileFault(error) {
  if (!(error instanceof Error) || !('code' in error)) return undefined;
  const path = 'path' in error && typeof error.path === 'string' ? error.path : 'a file';
  if (error.code === 'ENOSPC')
    return `The disk is full: ${path} could not be written. Make room, then start again.`;
  if (error.code === 'EACCES' || error.code === 'EPERM' || error.code === 'EROFS') {
    return `${path} cannot be written by this account. Correct its owner or rights, or choose another data folder: npm start -- --data DIR`;
  }
  return undefined;
}
