import { createHash, createHmac, timingSafeEqual } from "node:crypto";
import type { IncomingMessage } from "node:http";

/** Who may ask the storage. */
export interface Credentials {
  accessKeyId: string;
  secretAccessKey: string;
}

const algorithm = "AWS4-HMAC-SHA256";
const clockSkewMs = 15 * 60_000;

/**
 * What is wrong with the signature of a request to S3, as S3 names it; null for a good one. Links carry theirs behind the
 * question mark and end by themselves, everything else has it in a header.
 * @see https://docs.aws.amazon.com/AmazonS3/latest/API/sig-v4-authenticating-requests.html
 */
export function signatureFault(req: IncomingMessage, credentials: Credentials, now: number): string | null {
  const url = new URL(req.url ?? "/", "http://localhost");
  const link = url.searchParams.has("X-Amz-Signature");
  const claim = link ? claimOfLink(url.searchParams) : claimOfHeader(req);
  if (!claim) return "AccessDenied";
  const signedAt = instantOf(claim.date);
  if (!Number.isFinite(signedAt)) return "AccessDenied";
  if (now > signedAt + claim.lifeMs || now < signedAt - clockSkewMs)
    return link ? "AccessDenied" : "RequestTimeTooSkewed";
  const [accessKeyId, day, region, service, end] = claim.credential.split("/");
  if (accessKeyId !== credentials.accessKeyId) return "InvalidAccessKeyId";
  const canonical = [
    req.method,
    url.pathname,
    canonicalQuery(req.url ?? "/"),
    ...claim.signedHeaders.map((name) => `${name}:${String(req.headers[name] ?? "").trim()}`),
    "",
    claim.signedHeaders.join(";"),
    claim.payloadHash,
  ].join("\n");
  const scope = [day, region, service, end].join("/");
  const toSign = [algorithm, claim.date, scope, createHash("sha256").update(canonical).digest("hex")].join("\n");
  const key = [day, region, service, end].reduce<string | Buffer>(
    (secret, part) =>
      createHmac("sha256", secret)
        .update(part ?? "")
        .digest(),
    `AWS4${credentials.secretAccessKey}`,
  );
  const expected = createHmac("sha256", key).update(toSign).digest();
  const given = Buffer.from(claim.signature, "hex");
  return given.length === expected.length && timingSafeEqual(given, expected) ? null : "SignatureDoesNotMatch";
}

interface Claim {
  credential: string;
  signedHeaders: string[];
  signature: string;
  date: string;
  payloadHash: string;
  lifeMs: number;
}

function claimOfLink(query: URLSearchParams): Claim | null {
  const lifeS = Number(query.get("X-Amz-Expires"));
  if (query.get("X-Amz-Algorithm") !== algorithm || !(lifeS > 0)) return null;
  return {
    credential: query.get("X-Amz-Credential") ?? "",
    signedHeaders: (query.get("X-Amz-SignedHeaders") ?? "").split(";"),
    signature: query.get("X-Amz-Signature") ?? "",
    date: query.get("X-Amz-Date") ?? "",
    payloadHash: query.get("X-Amz-Content-Sha256") ?? "UNSIGNED-PAYLOAD",
    lifeMs: lifeS * 1000,
  };
}

function claimOfHeader({ headers }: IncomingMessage): Claim | null {
  const form = /^AWS4-HMAC-SHA256 Credential=([^,\s]+), ?SignedHeaders=([^,\s]+), ?Signature=([\da-f]+)$/;
  const [, credential, signedHeaders, signature] = form.exec(headers.authorization ?? "") ?? [];
  if (!credential || !signedHeaders || !signature) return null;
  return {
    credential,
    signedHeaders: signedHeaders.split(";"),
    signature,
    date: String(headers["x-amz-date"] ?? ""),
    payloadHash: String(headers["x-amz-content-sha256"] ?? ""),
    lifeMs: clockSkewMs,
  };
}

/** "20261201T223000Z" in ms; NaN for anything else. */
function instantOf(date: string): number {
  return Date.parse(date.replace(/^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/, "$1-$2-$3T$4:$5:$6Z"));
}

function canonicalQuery(address: string): string {
  const [, query = ""] = address.split("?");
  const encode = (text: string) =>
    encodeURIComponent(decodeURIComponent(text)).replace(
      /[!'()*]/g,
      (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`,
    );
  return query
    .split("&")
    .filter(Boolean)
    .map((pair) => {
      const [name = "", ...value] = pair.split("=");
      return [encode(name), encode(value.join("="))] as const;
    })
    .filter(([name]) => name !== "X-Amz-Signature")
    .sort(([a, x], [b, y]) => (a < b ? -1 : a > b ? 1 : x < y ? -1 : 1))
    .map((pair) => pair.join("="))
    .join("&");
}
