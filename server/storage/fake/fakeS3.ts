import { randomBytes } from "node:crypto";
import { createServer, type IncomingMessage, type Server, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";
import type { StorageSettings } from "../../env";
import { type Credentials, signatureFault } from "./awsSignature";
import { type KeptObject, ObjectFiles } from "./objectFiles";

const bucket = "takes";
const xmlOf = (text: string) =>
  text.replace(/[<>&"]/g, (sign) => ({ "<": "&lt;", ">": "&gt;", "&": "&amp;", '"': "&quot;" })[sign] ?? sign);

/** One request, taken apart. */
interface Asked {
  key: string;
  query: URLSearchParams;
  body: Buffer;
  type: string;
  meta: Record<string, string>;
}

/**
 * As much of S3 as Larkspan needs, on loopback, with its objects in a folder: for development and tests. It checks
 * signatures as S3 does, so what is not signed, or signed too long ago, is refused.
 */
export class FakeS3 {
  /** As a storage in trouble: everything is refused. */
  down = false;
  /** As one in trouble with some requests only, told by "METHOD /address". */
  refuses: (asked: string) => boolean = () => false;
  /** Its clock, in ms; links end by it. */
  now = () => Date.now();
  /** What was asked of it: method and address, newest last. */
  readonly asked: string[] = [];
  private readonly files: ObjectFiles;
  private readonly credentials: Credentials = {
    accessKeyId: "larkspan",
    secretAccessKey: randomBytes(24).toString("base64url"),
  };
  private readonly server: Server;

  private constructor(folder: string) {
    this.files = new ObjectFiles(folder);
    this.server = createServer((req, res) => {
      this.answer(req, res).catch((error: unknown) => refuse(res, 500, "InternalError", String(error)));
    });
  }

  /** The folder is made when the first object comes. */
  static async start(folder: string): Promise<FakeS3> {
    const fake = new FakeS3(folder);
    await new Promise<void>((resolve) => fake.server.listen(0, "127.0.0.1", resolve));
    return fake;
  }

  /** How a client reaches it. */
  get settings(): StorageSettings {
    const endpoint = `http://127.0.0.1:${(this.server.address() as AddressInfo).port}`;
    return { endpoint, publicEndpoint: endpoint, region: "us-east-1", bucket, pathStyle: true, ...this.credentials };
  }

  /** Every object that it holds, and every upload that has begun. */
  async keys(): Promise<string[]> {
    const uploads = await this.files.uploads();
    return [...(await this.files.keys()), ...uploads.map(({ key }) => `${key} (uploading)`)];
  }

  async stop(): Promise<void> {
    this.server.closeAllConnections();
    await new Promise<void>((resolve) => this.server.close(() => resolve()));
  }

  private async answer(req: IncomingMessage, res: ServerResponse): Promise<void> {
    this.asked.push(`${req.method} ${req.url}`);
    this.asked.splice(0, this.asked.length - 500);
    if (this.down || this.refuses(`${req.method} ${req.url}`)) return refuse(res, 503, "SlowDown", "Not now");
    const url = new URL(req.url ?? "/", "http://localhost");
    const fault = signatureFault(req, this.credentials, this.now());
    if (fault) return refuse(res, 403, fault, "The signature is missing, wrong or too old.");
    const [, named, ...rest] = url.pathname.split("/").map(decodeURIComponent);
    if (named !== bucket) return refuse(res, 404, "NoSuchBucket", "There is no such bucket.");
    const asked: Asked = {
      key: rest.join("/"),
      query: url.searchParams,
      body: Buffer.concat((await req.toArray()) as Buffer[]),
      type: req.headers["content-type"] ?? "application/octet-stream",
      meta: Object.fromEntries(
        Object.entries(req.headers).flatMap(([name, value]) =>
          name.startsWith("x-amz-meta-") ? [[name, String(value)]] : [],
        ),
      ),
    };
    if (asked.key === "") return this.ofBucket(req, res, asked);
    if (asked.query.has("uploads") || asked.query.has("uploadId")) return this.inParts(req, res, asked);
    return this.ofObject(req, res, asked);
  }

  private async ofBucket(req: IncomingMessage, res: ServerResponse, { query }: Asked): Promise<void> {
    if (req.method === "HEAD") return void res.writeHead(200).end();
    if (req.method !== "GET" || !query.has("uploads")) return refuse(res, 501, "NotImplemented", "Not here");
    const prefix = query.get("prefix") ?? "";
    const uploads = (await this.files.uploads()).filter(({ key }) => key.startsWith(prefix));
    const items = uploads.map(
      ({ key, uploadId, at }) =>
        `<Upload><Key>${xmlOf(key)}</Key><UploadId>${uploadId}</UploadId><Initiated>${at}</Initiated></Upload>`,
    );
    return say(res, "ListMultipartUploadsResult", `<IsTruncated>false</IsTruncated>${items.join("")}`);
  }

  private async ofObject(req: IncomingMessage, res: ServerResponse, { key, body, type, meta }: Asked): Promise<void> {
    if (req.method === "PUT") {
      return void res.writeHead(200, { etag: await this.files.put(key, body, type, meta) }).end();
    }
    if (req.method === "DELETE") {
      await this.files.delete(key);
      return void res.writeHead(204).end();
    }
    const found = await this.files.get(key);
    if (!found) return refuse(res, 404, "NoSuchKey", "There is no such object.");
    return send(req, res, found);
  }

  private async inParts(req: IncomingMessage, res: ServerResponse, asked: Asked): Promise<void> {
    const { key, query, body, type, meta } = asked;
    if (req.method === "POST" && query.has("uploads")) {
      const uploadId = await this.files.begin(key, type, meta);
      return say(
        res,
        "InitiateMultipartUploadResult",
        `<Bucket>${bucket}</Bucket><Key>${xmlOf(key)}</Key><UploadId>${uploadId}</UploadId>`,
      );
    }
    const upload = await this.files.upload(query.get("uploadId") ?? "");
    if (upload?.key !== key) return refuse(res, 404, "NoSuchUpload", "There is no such upload.");
    switch (req.method) {
      case "PUT": {
        const etag = await this.files.putPart(upload.uploadId, Number(query.get("partNumber")), body);
        return void res.writeHead(200, { etag }).end();
      }
      case "GET": {
        const parts = (await this.files.parts(upload.uploadId)).map(
          ({ number, size, etag }) =>
            `<Part><PartNumber>${number}</PartNumber><ETag>${xmlOf(etag)}</ETag><Size>${size}</Size></Part>`,
        );
        return say(res, "ListPartsResult", `<IsTruncated>false</IsTruncated>${parts.join("")}`);
      }
      case "POST": {
        const etag = await this.files.complete(upload);
        return say(res, "CompleteMultipartUploadResult", `<Key>${xmlOf(key)}</Key><ETag>${xmlOf(etag)}</ETag>`);
      }
      default:
        await this.files.abort(upload.uploadId);
        return void res.writeHead(204).end();
    }
  }
}

function send(req: IncomingMessage, res: ServerResponse, { body, type, etag, meta, at }: KeptObject): void {
  const query = new URL(req.url ?? "/", "http://localhost").searchParams;
  const headers = {
    "content-type": query.get("response-content-type") ?? type,
    "content-disposition": query.get("response-content-disposition") ?? "inline",
    "accept-ranges": "bytes",
    "cache-control": "private, no-store",
    "last-modified": new Date(at).toUTCString(),
    etag,
    ...meta,
  };
  const [, from, to] = /^bytes=(\d+)-(\d*)$/.exec(req.headers.range ?? "") ?? [];
  if (from === undefined) {
    res.writeHead(200, { ...headers, "content-length": body.length }).end(req.method === "HEAD" ? undefined : body);
    return;
  }
  const [first, last] = [Number(from), to ? Math.min(Number(to), body.length - 1) : body.length - 1];
  if (first > last) return refuse(res, 416, "InvalidRange", "There are not so many bytes.");
  const part = body.subarray(first, last + 1);
  res
    .writeHead(206, {
      ...headers,
      "content-length": part.length,
      "content-range": `bytes ${first}-${last}/${body.length}`,
    })
    .end(part);
}

function say(res: ServerResponse, name: string, content: string): void {
  res
    .writeHead(200, { "content-type": "application/xml" })
    .end(`<?xml version="1.0" encoding="UTF-8"?><${name}>${content}</${name}>`);
}

function refuse(res: ServerResponse, status: number, code: string, message: string): void {
  const xml = `<?xml version="1.0" encoding="UTF-8"?><Error><Code>${code}</Code><Message>${xmlOf(message)}</Message></Error>`;
  res.writeHead(status, { "content-type": "application/xml" }).end(xml);
}
