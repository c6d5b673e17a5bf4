import type { S3Client, S3ClientConfig } from "@aws-sdk/client-s3";
import type { StorageSettings } from "../env";
import { HttpProblem } from "../http/httpProblem";

/** How a take in the storage is reached for a while. */
export interface SignedLink {
  url: string;
  expiresAt: string;
}

/** Signed links to sound end after so many seconds. */
const linkLifeS = 300;

/** Where browsers fetch sound from; goes into the content security policy. */
export function storageOrigin({ publicEndpoint, bucket, pathStyle }: StorageSettings): string {
  const { protocol, host, origin } = new URL(publicEndpoint);
  return pathStyle ? origin : `${protocol}//${bucket}.${host}`;
}

/** How the SDK's client reaches the storage. */
export function clientConfig({ endpoint, region, pathStyle, accessKeyId, secretAccessKey }: StorageSettings) {
  return {
    endpoint,
    region,
    forcePathStyle: pathStyle,
    credentials: { accessKeyId, secretAccessKey },
    // Not every S3 but Amazon's understands the checksums that newer clients add by themselves.
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
    maxAttempts: 3,
  } satisfies S3ClientConfig;
}

/** The storage does not do what it is asked; `cause` is for the log. */
export function storageDown(cause?: unknown): HttpProblem {
  const message = "The storage of recordings does not answer. Nothing was lost; try again in a moment.";
  return Object.assign(new HttpProblem(503, "storage-down", message), { cause });
}

/** The objects of one bucket: sound that was handed in. The SDK is loaded when it is first needed: it is heavy. */
export class ObjectStore {
  private clients: Promise<{ inside: S3Client; outside: S3Client }> | undefined;

  constructor(readonly settings: StorageSettings) {}

  /** A link by which a browser plays the sound, and nothing else: it ends after five minutes. */
  async signedLink(key: string, mediaType: string): Promise<SignedLink> {
    const { GetObjectCommand } = await import("@aws-sdk/client-s3");
    const { getSignedUrl } = await import("@aws-sdk/s3-request-presigner");
    const command = new GetObjectCommand({
      Bucket: this.settings.bucket,
      Key: key,
      ResponseContentType: mediaType,
      ResponseContentDisposition: "inline",
      ResponseCacheControl: "private, no-store",
    });
    const signingDate = new Date();
    const url = await getSignedUrl((await this.connect()).outside, command, { expiresIn: linkLifeS, signingDate });
    return { url, expiresAt: new Date(signingDate.getTime() + linkLifeS * 1000).toISOString() };
  }

  /** The bytes of an object; null if it is not there. */
  async read(key: string): Promise<Uint8Array | null> {
    const { GetObjectCommand } = await import("@aws-sdk/client-s3");
    return this.orNull(async (client) => {
      const { Body } = await client.send(new GetObjectCommand({ Bucket: this.settings.bucket, Key: key }));
      return Body ? await Body.transformToByteArray() : new Uint8Array();
    });
  }

  /** How many bytes an object has; null if it is not there. */
  async size(key: string): Promise<number | null> {
    const { HeadObjectCommand } = await import("@aws-sdk/client-s3");
    return this.orNull(async (client) => {
      const { ContentLength } = await client.send(new HeadObjectCommand({ Bucket: this.settings.bucket, Key: key }));
      return ContentLength ?? 0;
    });
  }

  /** Deletes an object and everything that an upload to it left behind, and makes sure that it is gone. */
  async remove(key: string): Promise<void> {
    const { AbortMultipartUploadCommand, DeleteObjectCommand, ListMultipartUploadsCommand } =
      await import("@aws-sdk/client-s3");
    const { inside: client } = await this.connect();
    const { bucket: Bucket } = this.settings;
    const { Uploads = [] } = await client.send(new ListMultipartUploadsCommand({ Bucket, Prefix: key }));
    for (const { Key, UploadId } of Uploads) {
      if (Key === key) await client.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }));
    }
    for (const Key of [key, `${key}.part`, `${key}.info`]) {
      await client.send(new DeleteObjectCommand({ Bucket, Key }));
    }
    if ((await this.size(key)) !== null) throw new Error("The storage still holds an object that was deleted.");
  }

  async isUp(): Promise<boolean> {
    const { HeadBucketCommand } = await import("@aws-sdk/client-s3");
    const { inside } = await this.connect();
    await inside.send(new HeadBucketCommand({ Bucket: this.settings.bucket }), {
      abortSignal: AbortSignal.timeout(3000),
    });
    return true;
  }

  private async orNull<Result>(ask: (client: S3Client) => Promise<Result>): Promise<Result | null> {
    try {
      return await ask((await this.connect()).inside);
    } catch (error) {
      if (error instanceof Error && ["NoSuchKey", "NotFound"].includes(error.name)) return null;
      throw storageDown(error);
    }
  }

  private connect() {
    this.clients ??= import("@aws-sdk/client-s3").then(({ S3Client: Client }) => {
      const config = clientConfig(this.settings);
      return { inside: new Client(config), outside: new Client({ ...config, endpoint: this.settings.publicEndpoint }) };
    });
    return this.clients;
  }
}
