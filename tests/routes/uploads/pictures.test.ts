import sharp from "sharp";
import { beforeAll, describe, expect, it, vi } from "vitest";
import { GET as getTile } from "@/app/api/iiif/[imageId]/[...path]/route";
import { GET as getOriginal } from "@/app/api/images/[imageId]/original/route";
import { GET as getThumbnail } from "@/app/api/images/[imageId]/thumbnail/route";
import { GET as listPictures } from "@/app/api/cases/[caseId]/images/route";
import { POST as start } from "@/app/api/uploads/route";
import { POST as finish } from "@/app/api/uploads/[uploadId]/finish/route";
import type { Actor } from "@/lib/auth/actor";
import { addImageBytes } from "@/lib/uploads/add-bytes";
import { aCase, setState } from "../../helpers/cases";
import {
  asAdministrator,
  asInvestigator,
  asOtherRequester,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { startInput } from "../../helpers/send-file";

let actor: Actor | null = null;
vi.mock("@/lib/auth/session", () => ({ currentActor: () => Promise.resolve(actor) }));

const request = (path: string, init: RequestInit = {}) =>
  new Request(`http://portal.test${path}`, {
    ...init,
    headers: { host: "portal.test", ...init.headers },
  });
const tile = (imageId: string, path: string, headers: HeadersInit = {}) =>
  getTile(request(`/api/iiif/${imageId}/${path}`, { headers }), {
    params: Promise.resolve({ imageId, path: path.split("/") }),
  });
const thumbnail = (imageId: string) =>
  getThumbnail(request(`/api/images/${imageId}/thumbnail`), {
    params: Promise.resolve({ imageId }),
  });
const original = (imageId: string) =>
  getOriginal(request(`/api/images/${imageId}/original`), {
    params: Promise.resolve({ imageId }),
  });

let caseId = "";
let imageId = "";
let sharedId = "";
let bytes: Buffer;
beforeAll(async () => {
  const lab = await asInvestigator();
  caseId = await aCase();
  bytes = await sharp({ create: { width: 700, height: 400, channels: 3, background: "#345" } })
    .png()
    .toBuffer();
  const sent = { caseId, mediaType: "image/png", bytes, fileName: "Fläche “1”.png" };
  const add = async (isShareable: boolean) =>
    (await addImageBytes(lab, { ...sent, details: { technique: "camera", isShareable } })).imageId;
  imageId = await add(false);
  sharedId = await add(true);
});

describe("tiles", () => {
  it("info.json has what IIIF Image API 3.0 section 5 asks of level 0, at the address it was asked", async () => {
    actor = await asInvestigator();
    const answer = await tile(imageId, "info.json");
    expect(answer.headers.get("cache-control")).toBe("private, no-cache");
    expect(await answer.json()).toEqual({
      "@context": "http://iiif.io/api/image/3/context.json",
      id: expect.stringMatching(
        new RegExp(`^https?://portal\\.test/api/iiif/${imageId}$`),
      ) as string,
      type: "ImageService3",
      protocol: "http://iiif.io/api/image",
      profile: "level0",
      width: 700,
      height: 400,
      sizes: [{ width: 350, height: 200 }],
      tiles: [{ width: 512, scaleFactors: [1, 2] }],
    });
  });

  it("come as JPEG of the size asked for, to keep, and 304 to who has them", async () => {
    actor = await asTechnician();
    const path = "512,0,188,400/188,400/0/default.jpg";
    const answer = await tile(imageId, path);
    expect(answer.headers.get("content-type")).toBe("image/jpeg");
    expect(answer.headers.get("cache-control")).toMatch(/^private, .*immutable$/);
    const picture = await sharp(Buffer.from(await answer.arrayBuffer())).metadata();
    expect(picture).toMatchObject({ width: 188, height: 400, format: "jpeg" });
    const etag = answer.headers.get("etag") ?? "";
    expect((await tile(imageId, path, { "if-none-match": etag })).status).toBe(304);
  });

  it.each([
    "../thumbnail.jpg",
    "thumbnail.jpg",
    "full/max/0/default.jpg",
    "full/350,200/0/default.png",
    "full/350,200/90/default.jpg",
    "0,0,512,512/512,512/0/default.jpg",
    "1,0,512,400/512,400/0/default.jpg",
    "0,0,512,400/512,400/0/default.jpg/x",
    "-512,0,512,400/512,400/0/default.jpg",
    "1e2,0,512,400/512,400/0/default.jpg",
  ])("there is no %s", async (path) => {
    actor = await asInvestigator();
    expect((await tile(imageId, path)).status).toBe(404);
  });
});

describe("who may see a picture", () => {
  it("those at work on the case see tiles, thumbnail and the original as it was sent", async () => {
    for (const person of [asInvestigator, asTechnician]) {
      actor = await person();
      expect((await thumbnail(imageId)).status).toBe(200);
      const answer = await original(imageId);
      expect(Buffer.from(await answer.arrayBuffer()).equals(bytes)).toBe(true);
      expect(answer.headers.get("content-disposition")).toContain(
        "filename*=UTF-8''Fl%C3%A4che%20%E2%80%9C1%E2%80%9D.png",
      );
    }
  });

  it("the client sees a shared one only, and never the original", async () => {
    actor = await asRequester();
    expect((await thumbnail(imageId)).status).toBe(404);
    expect((await tile(imageId, "info.json")).status).toBe(404);
    expect((await thumbnail(sharedId)).status).toBe(200);
    expect((await tile(sharedId, "full/350,200/0/default.jpg")).status).toBe(200);
    expect((await original(sharedId)).status).toBe(403);
  });

  it("another client, an administrator and nobody see nothing", async () => {
    for (const [person, status] of [
      [await asOtherRequester(), 404],
      [await asAdministrator(), 403],
      [null, 401],
    ] as const) {
      actor = person;
      for (const answer of [
        await thumbnail(sharedId),
        await tile(sharedId, "info.json"),
        await tile(sharedId, "full/350,200/0/default.jpg"),
      ]) {
        expect(answer.status).toBe(status);
      }
    }
  });

  it("the list tells of the same file twice", async () => {
    actor = await asInvestigator();
    const answer = await listPictures(request(`/api/cases/${caseId}/images`), {
      params: Promise.resolve({ caseId }),
    });
    expect(await answer.json()).toMatchObject({
      pictures: [
        { label: "IM-01", state: "ready", pixelText: null, duplicates: [] },
        { label: "IM-02", isShareable: true, duplicates: [{ imageId, label: "IM-01" }] },
      ],
    });
  });
});

describe("sending a file", () => {
  const post = (body: unknown, headers: HeadersInit = {}) =>
    start(request("/api/uploads", { method: "POST", body: JSON.stringify(body), headers }), {
      params: Promise.resolve({}),
    });
  const input = (inCase: string) => startInput({ caseId: inCase, fileName: "face.png", bytes });

  it("needs a sign-in, the right role, the own case and an open one", async () => {
    const statusOf = async (person: Actor | null, inCase: string) => {
      actor = person;
      return (await post(input(inCase))).status;
    };
    expect(await statusOf(null, caseId)).toBe(401);
    expect(await statusOf(await asAdministrator(), caseId)).toBe(403);
    expect(await statusOf(await asRequester(), caseId)).toBe(403);
    expect(await statusOf(await asOtherRequester(), caseId)).toBe(404);
    const signed = await aCase();
    await setState(signed, "signed");
    expect(await statusOf(await asInvestigator(), signed)).toBe(423);
    expect(await statusOf(await asInvestigator(), caseId)).toBe(201);
  });

  it("is refused from another site and with a body that is not right", async () => {
    actor = await asInvestigator();
    expect((await post(input(caseId), { "sec-fetch-site": "cross-site" })).status).toBe(403);
    for (const wrong of [
      {},
      { ...input(caseId), sizeBytes: -1 },
      { ...input(caseId), sizeBytes: null },
      { ...input(caseId), fileName: "a/../b.png" },
      { ...input(caseId), firstPartSha256: "abc" },
      { ...input(caseId), fileName: "other.png", details: { itemId: "rec_of_another_case" } },
    ]) {
      expect((await post(wrong)).status).toBe(400);
    }
    const nowhere = await finish(
      request("/api/uploads/upl_none/finish", {
        method: "POST",
        body: JSON.stringify({ sha256: "0".repeat(64) }),
      }),
      { params: Promise.resolve({ uploadId: "upl_none" }) },
    );
    expect(nowhere.status).toBe(404);
  });
});
