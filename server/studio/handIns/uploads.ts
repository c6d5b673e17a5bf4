import type { Request, Response } from "express";
import type { Server } from "@tus/server";
import { HttpProblem } from "../../http/httpProblem";
import { clientConfig, type ObjectStore, storageDown } from "../../storage/objectStore.service";
import type { UploadLocks } from "./uploadLocks";

/** How long a request that was told to let go of an upload may still write. */
const drainMs = 500;

interface UploadSettings {
  objects: ObjectStore;
  locks: UploadLocks;
  /** called when all bytes are in the storage; what it throws is the answer to the last of them */
  onComplete: (key: string) => Promise<void>;
}

/**
 * Recordings on their way to the storage, by the tus protocol: a client asks how far its recording has come (HEAD) and
 * goes on from there (PATCH). An upload is begun by the server itself when a recording is announced.
 * @see https://tus.io/protocols/resumable-upload (1.0.0)
 */
export class Uploads {
  private loaded: Promise<Server> | undefined;

  constructor(private readonly settings: UploadSettings) {}

  /** Begins an upload, or finds the one that has begun; tells whether all of it is there. Call it under the upload's lock. */
  begin(key: string, size: number): Promise<boolean> {
    return this.beginOrFind(key, size).catch((error: unknown) => {
      throw error instanceof HttpProblem ? error : storageDown();
    });
  }

  private async beginOrFind(key: string, size: number): Promise<boolean> {
    const { Upload } = await import("@tus/server");
    const { datastore } = await this.server();
    const begun = await datastore.getUpload(key).catch((error: unknown) => {
      if (!isTusError(error) || error.status_code !== 404) throw error;
      return null;
    });
    if (begun) return begun.offset === begun.size;
    if (await this.hasBegun(key)) throw storageDown();
    await datastore.create(new Upload({ id: key, size, offset: 0 }));
    return false;
  }

  /** Answers HEAD and PATCH of the upload by this key; whether the asker may is checked before. */
  async answer(req: Request, res: Response, key: string): Promise<void> {
    req.url = `/${key}`;
    await (await this.server()).handle(req, res);
  }

  /** The store takes every fault of the storage for an upload that is not there: this asks the storage itself. */
  private async hasBegun(key: string): Promise<boolean> {
    return (await this.settings.objects.size(`${key}.info`)) !== null;
  }

  private server(): Promise<Server> {
    this.loaded ??= this.load();
    return this.loaded;
  }

  /** tus and the SDK are loaded when they are first needed: they are heavy. */
  private async load(): Promise<Server> {
    const { objects, locks, onComplete } = this.settings;
    const [{ Server: TusServer }, { S3Store }] = await Promise.all([import("@tus/server"), import("@tus/s3-store")]);
    /** Tells what went wrong as the rest of the API does. */
    class Answering extends TusServer {
      override write(...[context, headers, status, body = ""]: Parameters<Server["write"]>) {
        if (status < 400) return super.write(context, headers, status, body);
        headers.set("Content-Type", "application/json; charset=utf-8");
        const said = body.startsWith("{") ? body : JSON.stringify({ code: "upload-refused", message: body.trim() });
        return super.write(context, headers, status, said);
      }
    }
    return new Answering({
      path: "/api/uploads",
      datastore: new S3Store({
        s3ClientConfig: { bucket: objects.settings.bucket, ...clientConfig(objects.settings) },
        useTags: false,
      }),
      locker: locks,
      lockDrainTimeout: drainMs,
      // Pages of other origins have no business here: none is named.
      allowedOrigins: [],
      getFileIdFromRequest: (_req, key) => key,
      onUploadFinish: async (_req, { id }) => {
        await onComplete(id);
        return {};
      },
      onResponseError: async (req, error) => {
        const key = req.url.slice(req.url.lastIndexOf("/") + 1);
        const problem = await problemOf(error, () => this.hasBegun(key));
        return { status_code: problem.status, body: JSON.stringify(problem.toBody()) };
      },
    });
  }
}

function isTusError(error: unknown): error is { status_code: number; body: string } {
  return typeof error === "object" && error !== null && "status_code" in error && "body" in error;
}

/** Everything that goes wrong with an upload, as the rest of the API tells it. */
async function problemOf(error: unknown, hasBegun: () => Promise<boolean>): Promise<HttpProblem> {
  if (error instanceof HttpProblem) return error;
  if (!isTusError(error)) return storageDown();
  if (error.status_code === 404 && (await hasBegun().catch(() => true))) return storageDown();
  return new HttpProblem(error.status_code, "upload-refused", error.body.trim());
}
