import { RequestMethod } from '@nestjs/common';
import type { IncomingMessage } from 'node:http';
import { randomUUID } from 'node:crypto';
import type { Params } from 'nestjs-pino';
import type { Settings } from '../config/settings';

/** One line a request, without headers, query or body: that is where secrets travel. */
export function loggerOptions({ logLevel }: Settings): Params {
  return {
    // Nest's default path is in a syntax that express 5 no longer takes.
    forRoutes: [{ path: '{*path}', method: RequestMethod.ALL }],
    pinoHttp: {
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
    },
  };
}

const pathOf = (url: string): string => url.split('?', 1)[0] ?? url;
