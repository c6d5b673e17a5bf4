import type { RequestHandler, Response } from "express";
import { type Logger, pino } from "pino";
import { pinoHttp } from "pino-http";

export function createLogger(level: string): Logger {
  return pino({ level });
}

interface LoggedError {
  type: string;
  message: string;
  stack: string;
  code?: string;
}

/** One line for each request: when, what, by which account, and what became of it. Headers, bodies and the parameters of queries, which hold secrets, are never written. */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    serializers: {
      req: (req: { id: unknown; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        path: req.url.split("?")[0],
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      err: ({ type, message, stack, code }: LoggedError) => ({ type, message, stack, code }),
    },
    // Who was served or refused, and why.
    customProps: (_req, res) => {
      const { userId: user, refusal } = (res as Response).locals as { userId?: string; refusal?: string };
      return { user, refusal };
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? "error" : "info"),
  });
}
