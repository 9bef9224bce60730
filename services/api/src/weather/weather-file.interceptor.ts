import {
  HttpStatus,
  Injectable,
  PayloadTooLargeException,
  type CallHandler,
  type ExecutionContext,
} from '@nestjs/common';
import { FileInterceptor } from '@nestjs/platform-express';
import { problemOfSize, WEATHER_FILE_LIMIT_BYTES } from '@noonwell/weather';
import { memoryStorage } from 'multer';
import type { Observable } from 'rxjs';
import { ProblemException } from '../http/problem';

const NAME_BYTES = 1024;

/** Field "file" and perhaps "name", nothing else; the file stays in memory and never meets the disk. */
const MulterInterceptor = FileInterceptor('file', {
  storage: memoryStorage(),
  limits: {
    fileSize: WEATHER_FILE_LIMIT_BYTES,
    files: 1,
    fields: 1,
    fieldSize: NAME_BYTES,
    fieldNameSize: 64,
    parts: 2,
  },
});

@Injectable()
export class WeatherFileInterceptor extends MulterInterceptor {
  override async intercept(context: ExecutionContext, next: CallHandler): Promise<Observable<unknown>> {
    try {
      return await super.intercept(context, next);
    } catch (error) {
      if (!(error instanceof PayloadTooLargeException)) throw error;
      // Reading stopped at the limit, so the size is not known: the limit's own sentence says what is allowed.
      const { reason, fix } = tooLarge();
      throw new ProblemException(
        HttpStatus.PAYLOAD_TOO_LARGE,
        'The file is too large',
        `Nothing was saved. At most ${String(WEATHER_FILE_LIMIT_BYTES / 1024 / 1024)} MiB are read.`,
        { kind: 'weather-refused', errors: [{ reason, fix }] },
      );
    }
  }
}

function tooLarge(): { reason: string; fix: string } {
  const problem = problemOfSize(WEATHER_FILE_LIMIT_BYTES + 1);
  if (problem === null) throw new Error('A file above the limit has no problem.');
  return { reason: 'The file is larger than is read.', fix: problem.fix };
}
