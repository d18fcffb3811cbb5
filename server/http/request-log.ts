import type { Request, Response } from 'express';
import type { Logger } from 'pino';
import { type HttpLogger, pinoHttp } from 'pino-http';

/**
 * A line for each request. It names what may stand in a log and nothing else: no header, since
 * some would let a reader sign in as somebody else, and no body.
 */
export function requestLog(logger: Logger): HttpLogger {
  return pinoHttp({
    logger,
    wrapSerializers: false,
    autoLogging: { ignore: ({ url }) => url === '/healthz' },
    serializers: {
      req: ({ method, originalUrl, ip }: Request) => ({ method, url: originalUrl, address: ip }),
      res: ({ statusCode }: Response) => ({ status: statusCode }),
    },
  });
}
