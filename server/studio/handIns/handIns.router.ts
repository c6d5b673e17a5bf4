import type { DataSource } from "typeorm";
import { handIn, handInRequest, soundLink } from "../../../shared/contract/studio/handIn";
import type { Api } from "../../http/api";
import { currentUserId } from "../../http/currentUser";
import { HttpProblem } from "../../http/httpProblem";
import { idIn } from "../../http/ownedCollection.router";
import { parse } from "../../http/parse";
import { TryBucket } from "../../http/tryBucket";
import type { ObjectStore } from "../../storage/objectStore.service";
import { forMembers } from "../studioAnswers";
import { HandInsService } from "./handIns.service";

const announcedInAnHour = 120;
const recording = { name: "HandIn", schema: handIn };
const missing = { description: "There is no such recording within the asker's reach (not-found)." };
const closed = { description: "The pupil does not agree at present (not-agreed)." };
const gone = { description: "It was deleted (recording-deleted)." };
const down = { description: "The storage does not answer (storage-down); what was sent stays." };

/** Recordings that pupils hand in and teachers answer with. */
export function handInsRoutes(api: Api, dataSource: DataSource, objects: ObjectStore): void {
  const handIns = new HandInsService(dataSource, objects);
  const announcing = new TryBucket(dataSource, "hand-in", announcedInAnHour, 3600);
  const idOf = (params: Record<string, string>) => idIn(params, "id", "recording");

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/parts/:id/hand-ins",
      summary: "Announce a recording for this part; then send its bytes to /uploads/<its id>. May be repeated",
      body: { name: "HandInRequest", schema: handInRequest },
      answers: {
        200: { description: "The same take was handed in before: that recording, by its own id.", schema: recording },
        201: { description: "Announced, or known already: its present state.", schema: recording },
        403: { description: "The pupil does not agree (not-agreed), or it is of the wrong side (wrong-side)." },
        404: { description: "There is no such part within the asker's reach (not-found)." },
        409: { description: "The thread is full (collection-full), or the id is another's (conflict)." },
        410: gone,
        429: { description: "Announced too often (too-many-tries)." },
        503: down,
      },
    },
    async (req, res) => {
      const request = parse(handInRequest, req.body);
      await announcing.take(currentUserId(res));
      const announced = await handIns.announce(currentUserId(res), idIn(req.params, "id", "part"), request);
      res.status(announced.id === request.id.toLowerCase() ? 201 : 200).json(announced);
    },
  );
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/parts/:id/hand-ins",
      summary: "The recordings in the thread of this part, oldest first, deleted ones as such",
      answers: { 200: { description: "The recordings.", schema: recording, list: true }, 403: closed, 404: missing },
    },
    async (req, res) => {
      res.json(await handIns.list(currentUserId(res), idIn(req.params, "id", "part")));
    },
  );
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/hand-ins/:id",
      summary: "One recording, without its sound",
      answers: { 200: { description: "The recording.", schema: recording }, 403: closed, 404: missing },
    },
    async (req, res) => {
      res.json(await handIns.get(currentUserId(res), idOf(req.params)));
    },
  );
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/hand-ins/:id/sound",
      summary: "A signed link by which a recording can be played for five minutes",
      answers: {
        200: { description: "The link.", schema: { name: "SoundLink", schema: soundLink } },
        403: closed,
        404: missing,
        409: { description: "It is still on its way (still-uploading)." },
        410: gone,
      },
    },
    async (req, res) => {
      res.json(await handIns.sound(currentUserId(res), idOf(req.params)));
    },
  );
  api.route(
    {
      ...forMembers,
      method: "delete",
      path: "/hand-ins/:id",
      summary: "Take a recording of one's own back: out of the thread at once, and deleted from the storage",
      answers: {
        204: { description: "Taken back." },
        403: { description: "Another's (not-yours), or closed (not-agreed)." },
        404: missing,
      },
    },
    async (req, res) => {
      await handIns.remove(currentUserId(res), idOf(req.params));
      res.status(204).end();
    },
  );

  const upload = { ...forMembers, path: "/uploads/:id" } as const;
  const uploadAnswers = {
    403: { description: "Not the asker's own (not-yours), or consent is missing (not-agreed)." },
    404: missing,
    410: gone,
    412: { description: "The header Tus-Resumable: 1.0.0 is missing." },
    423: { description: "It is being sent from another place (upload-busy)." },
    503: down,
  };
  api.route(
    {
      ...upload,
      method: "head",
      summary: "How many bytes of an announced recording are there (Upload-Offset), by the tus protocol 1.0.0",
      answers: { 200: { description: "Upload-Offset and Upload-Length." }, ...uploadAnswers },
    },
    async (req, res) => {
      await handIns.uploads.answer(req, res, await handIns.uploadKey(currentUserId(res), idOf(req.params)));
    },
  );
  api.route(
    {
      ...upload,
      method: "patch",
      summary: "Send bytes of an announced recording from Upload-Offset on, as application/offset+octet-stream",
      answers: {
        204: { description: "Received; with the last byte the recording is in the thread." },
        ...uploadAnswers,
        409: { description: "Bytes from another offset are awaited (upload-refused)." },
        413: { description: "More bytes than were announced (upload-refused)." },
        415: { description: "Not application/offset+octet-stream (unsupported-media-type)." },
        422: {
          description: "Not sound that can be played here (not-a-recording), or too long (invalid); it was deleted.",
        },
      },
    },
    async (req, res) => {
      const key = await handIns.uploadKey(currentUserId(res), idOf(req.params));
      // A form of another site cannot send this type.
      if (!req.is("application/offset+octet-stream"))
        throw new HttpProblem(415, "unsupported-media-type", "Send application/offset+octet-stream.");
      await handIns.uploads.answer(req, res, key);
    },
  );
}
