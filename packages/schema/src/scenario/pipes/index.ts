import type { PipeSettings } from '@noonwell/engine';
import { z } from 'zod';
import { fieldRegistry } from '../../field.js';
import type { CrossFieldProblem } from '../problem.js';
import { buriedPipeSchema, buriedProblems, buriedSettings } from './buried.js';
import { exposedPipeSchema, exposedSettings } from './exposed.js';

/** A new kind of pipe is a new file and its lines here (and its model in the engine's registry). */
export const pipeSchema = z
  .discriminatedUnion('kind', [exposedPipeSchema, buriedPipeSchema])
  .register(fieldRegistry, {
    label: 'How the pipe is laid',
    unit: '',
    help: 'Exposed to the air, or buried in ground whose temperature follows the weather year late and damped.',
    source: 'ground temperature: Kusuda & Achenbach 1965',
    defaultValue: 'exposed',
    choices: { exposed: 'Exposed', buried: 'Buried' },
  });
export type PipeDocument = z.infer<typeof pipeSchema>;

export function toPipeSettings(pipe: PipeDocument): PipeSettings {
  return pipe.kind === 'buried' ? buriedSettings(pipe) : exposedSettings(pipe);
}

/** Problems of a pipe that no single field can see. */
export function pipeProblems(pipe: PipeDocument): CrossFieldProblem[] {
  return pipe.kind === 'buried' ? buriedProblems(pipe) : [];
}
