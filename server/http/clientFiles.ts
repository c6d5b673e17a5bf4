import { existsSync, statSync } from "node:fs";
import path from "node:path";
import express, { type Request, type RequestHandler, type Response } from "express";
import { isClientRoute } from "./clientRoutes";

/** A name that changes with its content may be kept for ever. */
const hashed = /[-.][0-9a-f]{16,64}(@\dx)?(\.[a-z0-9]+)+$/;
const encodings = [
  { name: "br", ending: ".br" },
  { name: "gzip", ending: ".gz" },
] as const;
const notBuilt = "<!doctype html><meta charset=utf-8><title>Larkspan</title><p>The web client has not been built yet.";

/** The built web client: its files, and its one page under every address the client knows. */
export function clientFiles(directory: string): RequestHandler[] {
  const root = path.resolve(directory);
  const files = express.static(root, {
    index: false,
    redirect: false,
    setHeaders: (res, file) => {
      const name = path.basename(file).replace(/\.(br|gz)$/, "");
      res.set("Cache-Control", hashed.test(name) ? "public, max-age=31536000, immutable" : "no-cache");
    },
  });

  const page = (req: Request, res: Response, status: number) => {
    res.status(status).set("Cache-Control", "no-cache").vary("Accept-Encoding");
    const index = path.join(root, "index.html");
    if (!existsSync(index)) {
      res
        .status(status === 200 ? 503 : status)
        .type("html")
        .send(notBuilt);
      return;
    }
    const packed = packedFile(req, index);
    if (packed) res.set("Content-Encoding", packed.encoding);
    // A range or a date of the asker's must not turn a 404 into something else.
    res.type("html").sendFile(packed?.file ?? index, {
      cacheControl: false,
      acceptRanges: false,
      etag: status === 200,
      lastModified: status === 200,
    });
  };

  return [
    (req, res, next) => {
      if (req.method !== "GET" && req.method !== "HEAD") {
        next();
        return;
      }
      const wanted = fileUnder(root, req.path);
      if (!wanted) {
        next();
        return;
      }
      res.vary("Accept-Encoding");
      const packed = packedFile(req, wanted);
      if (packed) {
        res.type(path.extname(wanted)).set("Content-Encoding", packed.encoding);
        req.url = req.path + packed.ending;
      }
      files(req, res, next);
    },
    (req, res) => {
      if (req.method !== "GET" && req.method !== "HEAD") {
        res.status(405).set("Allow", "GET, HEAD").type("text").send("Only GET and HEAD.\n");
      } else if (isClientRoute(req.path)) {
        page(req, res, statusFor(res));
      } else if (path.extname(req.path) !== "") {
        res.status(404).type("text").send("There is no such file.\n");
      } else {
        page(req, res, 404);
      }
    },
  ];
}

/** 200, unless who knows more of the page has said otherwise. */
function statusFor(res: Response): number {
  const told: unknown = res.locals.pageStatus;
  return typeof told === "number" ? told : 200;
}

/** The file an address names, if it is one inside the directory. */
function fileUnder(root: string, address: string): string | null {
  let decoded: string;
  try {
    decoded = decodeURIComponent(address);
  } catch {
    return null;
  }
  const file = path.join(root, decoded);
  if (decoded.includes("\0") || !file.startsWith(root + path.sep) || /\/\./.test(decoded)) return null;
  if (file === path.join(root, "index.html")) return null;
  return statSync(file, { throwIfNoEntry: false })?.isFile() ? file : null;
}

/** The compressed neighbour of a file, if there is one and the asker takes it. */
function packedFile(req: Request, file: string) {
  for (const { name, ending } of encodings) {
    if (req.acceptsEncodings(name) && existsSync(file + ending)) return { file: file + ending, encoding: name, ending };
  }
  return null;
}
