import { cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, test, vi } from "vitest";
import { DropZone } from "@/components/uploads/drop-zone";
import { PART_SIZE_BYTES } from "@/lib/uploads/constants";
import { aStatus, fakePortal, sha256Of } from "./fake-portal";

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const bytesOf = (size: number) => Uint8Array.from({ length: size }, (_, i) => (i * 31 + 7) % 251);
const fileOf = (name: string, bytes: Uint8Array<ArrayBuffer>) =>
  new File([bytes], name, { lastModified: 1_700_000_000_000 });

function choose(...files: File[]) {
  fireEvent.change(screen.getByLabelText("Pictures to add"), { target: { files } });
}
const rows = () => screen.findByRole("list", { name: "Files on their way" });
const whole = {
  uploadId: "upl_1",
  way: { kind: "whole" as const, url: "store:whole", mediaType: "image/tiff" },
};

describe("files on their way", () => {
  test("a small file goes in one piece, with its SHA-256, and is told ready once checked", async () => {
    const portal = fakePortal({
      ticket: whole,
      standing: [
        aStatus({ state: "sent" }),
        aStatus({ state: "taken", imageId: "rec_7", imageLabel: "IM-07" }),
      ],
    });
    const onDone = vi.fn();
    render(<DropZone caseId="case_1" purpose="image" onDone={onDone} />);
    const bytes = bytesOf(5000);
    choose(fileOf("face.tif", bytes));
    await waitFor(async () => expect((await rows()).textContent).toContain("Being checked"));
    expect(portal.sent.get("store:whole")).toEqual(bytes);
    expect(portal.askedFor("POST", "/api/uploads")[0]?.body).toMatchObject({
      caseId: "case_1",
      purpose: "image",
      fileName: "face.tif",
      sizeBytes: 5000,
      firstPartSha256: sha256Of(bytes),
      details: { technique: "camera" },
    });
    expect(portal.askedFor("POST", "/finish")[0]?.body).toEqual({ sha256: sha256Of(bytes) });
    expect(onDone).not.toHaveBeenCalled();
    const link = await screen.findByRole("link", { name: "Open IM-07" }, { timeout: 8000 });
    expect(link.getAttribute("href")).toBe("/cases/case_1/images/rec_7");
    expect(onDone).toHaveBeenCalledOnce();
  });

  test("a file that goes on sends only the parts that are missing, and all are reported", async () => {
    const bytes = bytesOf(2 * PART_SIZE_BYTES + 1000);
    const portal = fakePortal({
      ticket: {
        uploadId: "upl_1",
        way: { kind: "parts", partSizeBytes: PART_SIZE_BYTES, parts: [], alreadySent: [1] },
      },
    });
    render(<DropZone caseId="case_1" purpose="image" />);
    choose(fileOf("face.tif", bytes));
    await waitFor(() => expect(portal.askedFor("POST", "/finish")).toHaveLength(1), {
      timeout: 8000,
    });
    expect([...portal.sent.keys()].sort()).toEqual(["store:2", "store:3"]);
    expect(portal.sent.get("store:3")).toEqual(bytes.subarray(2 * PART_SIZE_BYTES));
    const reported = portal
      .askedFor("POST", "/parts")
      .flatMap(({ body }) => (body as { done?: unknown[] }).done ?? []);
    expect(reported).toEqual(
      expect.arrayContaining([
        { partNumber: 2, etag: '"etag of store:2"', sizeBytes: PART_SIZE_BYTES },
        { partNumber: 3, etag: '"etag of store:3"', sizeBytes: 1000 },
      ]),
    );
    expect(reported).toHaveLength(2);
    expect(portal.askedFor("POST", "/finish")[0]?.body).toEqual({ sha256: sha256Of(bytes) });
  });

  test("what cannot be taken is shown with its reason and never sent", async () => {
    const portal = fakePortal({ ticket: whole });
    render(<DropZone caseId="case_1" purpose="image" />);
    choose(fileOf("notes.txt", bytesOf(10)), new File([], "empty.png"));
    const list = await rows();
    await waitFor(() => expect(list.textContent).toContain("empty.png is empty (0 bytes)."));
    expect(list.textContent).toContain("notes.txt is not named like a JPEG, PNG or TIFF picture.");
    expect(portal.askedFor("POST", "/api/uploads")).toEqual([]);
    expect(portal.sent.size).toBe(0);
  });

  test("a file left unfinished says what is kept, and the same file goes on in its row", async () => {
    const portal = fakePortal({
      ticket: whole,
      unfinished: [
        aStatus({ state: "sending", fileName: "face.tif", sizeBytes: 5000, sentBytes: 2000 }),
      ],
    });
    render(<DropZone caseId="case_1" purpose="image" />);
    const list = await rows();
    expect(list.textContent).toContain("face.tif stopped at 2.0");
    expect(list.textContent).toContain(
      "The part sent so far is kept. Choose the same file again to carry on.",
    );
    choose(fileOf("face.tif", bytesOf(5000)));
    await waitFor(() => expect(list.textContent).toContain("Being checked"));
    expect(list.querySelectorAll("li")).toHaveLength(1);
    expect(portal.sent.size).toBe(1);
  });

  test("a refusal by the check is shown in the portal's words and can be put away", async () => {
    const refusal = "face.tif is a web page, not a picture. It was not kept.";
    const portal = fakePortal({ unfinished: [aStatus({ state: "refused", refusal })] });
    render(<DropZone caseId="case_1" purpose="image" />);
    expect((await rows()).textContent).toContain(refusal);
    fireEvent.click(screen.getByRole("button", { name: "Put away: face.tif" }));
    await waitFor(() => expect(portal.askedFor("DELETE", "/api/uploads/upl_1")).toHaveLength(1));
    expect(screen.queryByText(refusal)).toBeNull();
  });

  test("a refusal of the store stops the file and keeps its row", async () => {
    fakePortal({ ticket: whole, storeStatus: () => 400 });
    render(<DropZone caseId="case_1" purpose="image" />);
    choose(fileOf("face.tif", bytesOf(500)));
    await waitFor(async () =>
      expect((await rows()).textContent).toContain("The store refused the file (400)."),
    );
  });

  test("where nothing may be added it says why and offers no choice", () => {
    fakePortal({});
    render(<DropZone caseId="case_1" purpose="image" disabledReason="The report is signed." />);
    expect(screen.getByText(/The report is signed\./)).toBeTruthy();
    expect(screen.queryByRole("button")).toBeNull();
  });
});
