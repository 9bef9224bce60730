import { readdirSync, readFileSync } from 'node:fs';
import { runInNewContext } from 'node:vm';

/** One `@example` line: an expression and the number its docstring promises. */
export interface DocumentedExample {
  readonly file: string;
  readonly expression: string;
  readonly promised: number;
  /** Half a unit of the last digit written: what the reader may take the number to mean. */
  readonly halfUnit: number;
}

/** All lines of the form ` * expression // number` that follow an `@example` in a folder's sources. */
export function documentedExamples(folder: URL): DocumentedExample[] {
  return readdirSync(folder)
    .filter((file) => file.endsWith('.ts') && !file.endsWith('.test.ts'))
    .flatMap((file) => {
      const blocks = readFileSync(new URL(file, folder), 'utf8').split('@example').slice(1);
      return blocks.map((block) => {
        const line = /^\s*\*\s*(\S.*?)\s*\/\/\s*(-?[\d.]+(?:e-?\d+)?)\s*$/m.exec(block.split('*/')[0] ?? '');
        const [, expression, number] = line ?? [];
        if (expression === undefined || number === undefined) {
          throw new Error(`${file}: an @example has no line "expression // number"`);
        }
        const decimals = number.split('e')[0]?.split('.')[1]?.length ?? 0;
        const exponent = Number(number.split('e')[1] ?? 0);
        const halfUnit = 0.5 * 10 ** (exponent - decimals);
        return { file, expression, promised: Number(number), halfUnit };
      });
    });
}

/** Evaluates an example with the given names in scope. */
export function evaluateExample(
  example: DocumentedExample,
  scope: Readonly<Record<string, unknown>>,
): number {
  const value: unknown = runInNewContext(example.expression, { ...scope });
  if (typeof value !== 'number') throw new Error(`${example.expression} is not a number`);
  return value;
}
