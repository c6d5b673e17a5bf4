import type { DetailedError } from "tus-js-client";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { session } from "@/features/api/session";
import type { Problem } from "@/shared/contract/problem";
import type { HandIn } from "@/shared/contract/studio/handIn";
import type { UnsentTake } from "./unsentTakes";

/** A piece is acknowledged on its own: of a cut connection at most one is sent again. */
const pieceBytes = 512 * 1024;
/** How often it is tried again by itself before it is told that the connection is gone. */
const retryDelays = [500, 2000, 5000];
const mostRounds = 3;

/**
 * Brings a recording to the server: announces it, sends what is not there yet, and makes sure that it arrived. Everything
 * may be repeated from the start.
 * @param onSent told how many bytes the server has
 * @throws ApiError whose `refused` says that repeating does not help
 */
export async function uploadTake(
  { accountId, partId, request, sound }: Pick<UnsentTake, "accountId" | "partId" | "request" | "sound">,
  onSent: (bytes: number) => void,
): Promise<HandIn> {
  const asOwner = () => {
    if (session.current().account?.id !== accountId) throw ApiError.offline();
  };
  for (let round = 0; round < mostRounds; round++) {
    asOwner();
    const announced = await http.post<HandIn>(`/parts/${partId}/hand-ins`, request);
    if (announced.state === "ready") return announced;
    try {
      await sendBytes(announced.id, sound, onSent, asOwner);
      asOwner();
      const arrived = await http.get<HandIn>(`/hand-ins/${announced.id}`);
      if (arrived.state === "ready") return arrived;
    } catch (error) {
      // What paused for long is forgotten on the way: it is announced once more.
      if (!(error instanceof ApiError) || error.status !== 404) throw error;
    }
  }
  throw ApiError.offline();
}

async function sendBytes(
  id: string,
  sound: Blob,
  onSent: (bytes: number) => void,
  beforeRequest: () => void,
): Promise<void> {
  const { Upload } = await import("tus-js-client");
  await new Promise<void>((resolve, reject) => {
    const upload = new Upload(sound, {
      uploadUrl: `/api/uploads/${id}`,
      uploadSize: sound.size,
      chunkSize: pieceBytes,
      retryDelays,
      storeFingerprintForResuming: false,
      onBeforeRequest: async (asked) => {
        beforeRequest();
        const header = await http.authorization();
        if (header !== null) asked.setHeader("Authorization", header);
      },
      onProgress: (sent) => onSent(sent),
      onSuccess: () => resolve(),
      onError: (error) => reject(problemOf(error)),
    });
    upload.start();
  });
}

/** What tus says, as the rest of the client tells it. */
function problemOf(error: Error | DetailedError): ApiError {
  const answer = "originalResponse" in error ? error.originalResponse : null;
  const status = answer?.getStatus() ?? 0;
  if (status === 0 || status >= 500) return ApiError.offline();
  try {
    const { code, message } = JSON.parse(answer?.getBody() ?? "") as Problem;
    return new ApiError(status, code, message);
  } catch {
    return new ApiError(status, "unexpected", "The recording could not be sent. Try again.");
  }
}
