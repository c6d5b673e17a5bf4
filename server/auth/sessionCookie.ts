import type { CookieOptions, Request, Response } from "express";
import { sessionLifeS } from "./sessions.service";

/** The cookie that holds the refresh token. Browsers grant the __Host- prefix and Secure over TLS only. */
export class SessionCookie {
  private readonly name: string;
  private readonly options: CookieOptions;

  constructor(secure: boolean) {
    this.name = secure ? "__Host-larkspan" : "larkspan";
    this.options = { httpOnly: true, sameSite: "strict", path: "/", secure };
  }

  read(req: Request): string | null {
    const value: unknown = (req.cookies as Record<string, unknown>)[this.name];
    return typeof value === "string" && value !== "" ? value : null;
  }

  write(res: Response, token: string): void {
    res.cookie(this.name, token, { ...this.options, maxAge: sessionLifeS * 1000 });
  }

  clear(res: Response): void {
    res.clearCookie(this.name, this.options);
  }
}
