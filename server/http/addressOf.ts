import type { Request } from "express";

/** From where a request comes; tries are counted by it. */
export const addressOf = (req: Request<Record<string, string>>) => req.ip ?? "";
