import { createHash, randomUUID } from "node:crypto";
import { mkdir, readdir, readFile, rename, rm, writeFile } from "node:fs/promises";
import path from "node:path";

/** What is kept beside the bytes of an object. */
interface ObjectHeaders {
  type: string;
  etag: string;
  /** x-amz-meta-… */
  meta: Record<string, string>;
  at: string;
}

export interface KeptObject extends ObjectHeaders {
  body: Buffer;
}

/** An upload in parts that has begun. */
export interface PartedUpload {
  uploadId: string;
  key: string;
  type: string;
  meta: Record<string, string>;
  at: string;
}

export interface KeptPart {
  number: number;
  size: number;
  etag: string;
}

const fileOf = (key: string) => encodeURIComponent(key);
const etagOf = (body: Buffer) => `"${createHash("md5").update(body).digest("hex")}"`;
const uploadForm = /^[\da-f-]{36}$/;

/** The objects of one bucket as files of a folder. Everything lies on the disk, so that several processes share it. */
export class ObjectFiles {
  constructor(private readonly folder: string) {}

  async put(key: string, body: Buffer, type: string, meta: Record<string, string>): Promise<string> {
    const headers: ObjectHeaders = { type, etag: etagOf(body), meta, at: new Date().toISOString() };
    await this.write(["headers", fileOf(key)], Buffer.from(JSON.stringify(headers)));
    await this.write(["objects", fileOf(key)], body);
    return headers.etag;
  }

  async get(key: string): Promise<KeptObject | null> {
    const [headers, body] = await Promise.all([
      this.read(["headers", fileOf(key)]),
      this.read(["objects", fileOf(key)]),
    ]);
    return headers && body && { ...(JSON.parse(headers.toString()) as ObjectHeaders), body };
  }

  async delete(key: string): Promise<void> {
    await rm(this.at("objects", fileOf(key)), { force: true });
    await rm(this.at("headers", fileOf(key)), { force: true });
  }

  async keys(): Promise<string[]> {
    return (await this.list("objects")).map(decodeURIComponent);
  }

  async begin(key: string, type: string, meta: Record<string, string>): Promise<string> {
    const upload: PartedUpload = { uploadId: randomUUID(), key, type, meta, at: new Date().toISOString() };
    await this.write(["uploads", upload.uploadId, "upload"], Buffer.from(JSON.stringify(upload)));
    return upload.uploadId;
  }

  async upload(uploadId: string): Promise<PartedUpload | null> {
    if (!uploadForm.test(uploadId)) return null;
    const text = await this.read(["uploads", uploadId, "upload"]);
    return text && (JSON.parse(text.toString()) as PartedUpload);
  }

  async uploads(): Promise<PartedUpload[]> {
    const all = await Promise.all((await this.list("uploads")).map((id) => this.upload(id)));
    return all.filter((upload) => upload !== null);
  }

  async putPart(uploadId: string, number: number, body: Buffer): Promise<string> {
    await this.write(["uploads", uploadId, String(number)], body);
    return etagOf(body);
  }

  async parts(uploadId: string): Promise<(KeptPart & { body: Buffer })[]> {
    const numbers = (await this.list("uploads", uploadId)).filter((name) => /^\d+$/.test(name)).map(Number);
    const parts = numbers
      .sort((a, b) => a - b)
      .map(async (number) => {
        const body = (await this.read(["uploads", uploadId, String(number)])) ?? Buffer.alloc(0);
        return { number, size: body.length, etag: etagOf(body), body };
      });
    return Promise.all(parts);
  }

  async complete({ uploadId, key, type, meta }: PartedUpload): Promise<string> {
    const parts = await this.parts(uploadId);
    const etag = await this.put(key, Buffer.concat(parts.map(({ body }) => body)), type, meta);
    await this.abort(uploadId);
    return etag;
  }

  async abort(uploadId: string): Promise<void> {
    await rm(this.at("uploads", uploadId), { recursive: true, force: true });
  }

  private at(...names: string[]): string {
    return path.join(this.folder, ...names);
  }

  private async list(...names: string[]): Promise<string[]> {
    const found = await readdir(this.at(...names)).catch(nothing);
    return found ?? [];
  }

  private async read(names: string[]): Promise<Buffer | null> {
    return readFile(this.at(...names)).catch(nothing);
  }

  /** Whole or not at all, also for those who read meanwhile. */
  private async write(names: string[], bytes: Buffer): Promise<void> {
    const file = this.at(...names);
    const draft = this.at("drafts", randomUUID());
    await Promise.all([mkdir(path.dirname(file), { recursive: true }), mkdir(this.at("drafts"), { recursive: true })]);
    await writeFile(draft, bytes);
    await rename(draft, file);
  }
}

function nothing(error: NodeJS.ErrnoException): null {
  if (error.code === "ENOENT") return null;
  throw error;
}
