import { parseArgs, type ParseArgsConfig } from 'node:util';
import { badInput } from './outcome.js';

type Options = NonNullable<ParseArgsConfig['options']>;
type Parsed<Wanted extends Options> = ReturnType<
  typeof parseArgs<{ args: string[]; options: Wanted; strict: true; allowPositionals: true }>
>;

/** `parseArgs` of Node, strict, with its complaint turned into ours. */
export function readOptions<Wanted extends Options>(
  args: readonly string[],
  command: string,
  options: Wanted,
): Parsed<Wanted> {
  try {
    return parseArgs({ args: [...args], options, strict: true, allowPositionals: true });
  } catch (error) {
    const complaint =
      error instanceof Error ? error.message.replace(/\. To specify .*$/s, '') : String(error);
    throw badInput(`${complaint}.`.replace(/\.\.$/, '.'), `Try: noonwell ${command} --help`);
  }
}
