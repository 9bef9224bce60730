import { RequestMethod } from '@nestjs/common';
import type { IncomingMessage } from 'node:http';
import { randomUUID } from 'node:crypto';
import type { Params } from 'nestjs-pino';
import type { DestinationStream } from 'pino';
import type { Options } from 'pino-http';
import type { Settings } from '../config/settings';

/** Where log lines go; standard output unless a test listens. */
export type LogTarget = DestinationStream | undefined;

/** One line a request, without headers, query or body: that is where secrets travel. */
export function loggerOptions({ logLevel }: Settings, target: LogTarget): Params {
  const options: Options = {
    level: logLevel,
    genReqId: () => randomUUID(),
    serializers: {
      req: ({ id, method, url }: { id: string; method: string; url: string }) => ({
        id,
        method,
        path: pathOf(url),
      }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
    // Should anything else log a request's or a form's parts whole.
    redact: [
      '*.authorization',
      '*.cookie',
      '*["set-cookie"]',
      '*.password',
      '*.accessToken',
      '*.refreshToken',
    ],
    autoLogging: { ignore: (request: IncomingMessage) => request.url === '/api/health' },
  };
  return {
    // Nest's default path is in a syntax that express 5 no longer takes.
    forRoutes: [{ path: '{*path}', method: RequestMethod.ALL }],
    pinoHttp: target === undefined ? options : [options, target],
  };
}

const pathOf = (url: string): string => url.split('?', 1)[0] ?? url;
