import { randomUUID } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** Gives each request its number, says it in the answer, and logs one line when it has been answered. */
export function requestLog(log: Logger): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    // Who watches over the server asks every few seconds.
    autoLogging: { ignore: (request) => request.url.startsWith('/api/health') },
    customLogLevel: (request, response, error) => {
      if (error || response.statusCode >= 500) return 'error';
      if (response.statusCode >= 400) return 'warn';
      return request.url.startsWith('/api/') ? 'info' : 'debug';
    },
    // Neither headers nor the query: they hold cookies, tokens and what people look for.
    serializers: {
      req: (request: IncomingMessage & { id: unknown }) => ({
        id: request.id,
        method: request.method,
        path: request.url?.split('?')[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  });
}
