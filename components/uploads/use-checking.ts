"use client";

import { useEffect, useEffectEvent } from "react";
import type { UploadStatus } from "@/lib/uploads/schemas";
import { routes } from "@/lib/routes";
import { askServer } from "./ask-server";
import { type FileRow, withStatus } from "./file-row";

const ASK_EVERY_MS = 1_500;

/** Asks for the files that are being checked until each is taken in or refused. */
export function useChecking(
  rows: readonly FileRow[],
  change: (key: string, how: (row: FileRow) => FileRow) => void,
  onTaken: (() => void) | undefined,
): void {
  const checking = rows.filter((row) => row.state === "checking" && row.uploadId !== null);
  const asked = checking.map((row) => `${row.key} ${row.uploadId}`).join("\n");
  const tellTaken = useEffectEvent(() => onTaken?.());

  useEffect(() => {
    if (asked === "") return;
    const leaving = new AbortController();
    const { signal } = leaving;
    const pairs = asked.split("\n").map((pair) => pair.split(" "));
    const ask = async () => {
      for (const [key, uploadId] of pairs) {
        if (!key || !uploadId) continue;
        const status = await askServer<UploadStatus>(routes.api.upload(uploadId), {
          isBackground: true,
          signal,
        });
        if (status.state === "sent") continue;
        change(key, (row) => withStatus(row, status));
        if (status.state === "taken") tellTaken();
      }
    };
    const timer = setInterval(() => {
      ask().catch((error: unknown) => {
        // The next round asks again; the file is safe with the server.
        if (!signal.aborted) console.warn("no answer about files being checked", error);
      });
    }, ASK_EVERY_MS);
    return () => {
      clearInterval(timer);
      leaving.abort();
    };
  }, [asked, change]);
}
