"use client";

import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import type { UploadPurpose } from "@/lib/uploads/constants";
import { refusalBeforeSending } from "@/lib/uploads/file-rules";
import type { UploadDetails, UploadStatus } from "@/lib/uploads/schemas";
import { routes } from "@/lib/routes";
import { askServer, Refused } from "./ask-server";
import { type FileRow, newRow, rowOfStatus, withStatus } from "./file-row";
import { sendFile } from "./send-file";
import { useChecking } from "./use-checking";

const FILES_AT_ONCE = 2;

type Chosen = { file: File; details: UploadDetails };
type Change = (row: FileRow) => FileRow;

/** Puts a chosen file in the queue, or says why it cannot be sent at all. */
function admit(row: FileRow, purpose: UploadPurpose, file: File): FileRow {
  const refusal = refusalBeforeSending(purpose, file);
  return refusal
    ? { ...row, state: "refused", refusal: refusal.says }
    : { ...row, state: "waiting", needsFile: false };
}

export type Uploads = {
  rows: FileRow[];
  /** Whether anything would be cut short if the page were left. */
  isSending: boolean;
  add(files: readonly File[], details: UploadDetails): void;
  pause(key: string): void;
  carryOn(key: string): void;
  /** Gives a file up, or puts the notice of a finished one away. */
  remove(key: string): void;
};

/** Files on their way from this page to a case, and those an earlier page left unfinished. */
export function useUploads(
  caseId: string,
  purpose: UploadPurpose,
  onTaken: (() => void) | undefined,
): Uploads {
  const [rows, setRows] = useState<FileRow[]>([]);
  const chosen = useRef(new Map<string, Chosen>());
  const running = useRef(new Map<string, AbortController>());

  const change = useCallback((key: string, how: Change) => {
    setRows((now) => now.map((row) => (row.key === key ? how(row) : row)));
  }, []);

  useEffect(() => {
    const leaving = new AbortController();
    const { signal } = leaving;
    askServer<{ uploads: UploadStatus[] }>(
      `${routes.api.uploads()}?${new URLSearchParams({ caseId, purpose })}`,
      { signal },
    ).then(
      ({ uploads }) =>
        setRows((now) => {
          const known = new Set(now.map((row) => row.uploadId));
          return [...uploads.filter((it) => !known.has(it.uploadId)).map(rowOfStatus), ...now];
        }),
      (error: unknown) => {
        // Only the reminder of earlier files is missing; choosing one again finds it all the same.
        if (!signal.aborted) console.warn("unfinished files could not be listed", error);
      },
    );
    return () => leaving.abort();
  }, [caseId, purpose]);

  const run = useCallback(
    async (key: string, { file, details }: Chosen) => {
      const stop = new AbortController();
      running.current.set(key, stop);
      change(key, (row) => ({ ...row, state: "sending", needsFile: false, refusal: null }));
      try {
        const status = await sendFile({
          caseId,
          purpose,
          file,
          details,
          signal: stop.signal,
          onStarted: (started) => change(key, (row) => ({ ...row, ...started })),
          onProgress: (sentBytes) => change(key, (row) => ({ ...row, sentBytes })),
        });
        change(key, (row) => withStatus(row, status));
      } catch (error) {
        if (stop.signal.aborted) return;
        if (error instanceof Refused) {
          change(key, (row) => ({ ...row, state: "refused", refusal: error.message }));
        } else {
          console.warn(`sending ${file.name} stopped`, error);
          change(key, (row) => ({ ...row, state: "stopped" }));
        }
      } finally {
        if (running.current.get(key) === stop) running.current.delete(key);
      }
    },
    [caseId, purpose, change],
  );

  useEffect(() => {
    const free = FILES_AT_ONCE - rows.filter((row) => row.state === "sending").length;
    const next = rows.filter((row) => row.state === "waiting" && !running.current.has(row.key));
    for (const row of next.slice(0, Math.max(free, 0))) {
      const file = chosen.current.get(row.key);
      if (file) void run(row.key, file);
    }
  }, [rows, run]);

  useEffect(() => {
    const controllers = running.current;
    return () => controllers.forEach((controller) => controller.abort());
  }, []);

  useChecking(rows, change, onTaken);

  const halt = useCallback((key: string) => {
    running.current.get(key)?.abort();
    running.current.delete(key);
  }, []);

  const add = useCallback(
    (files: readonly File[], details: UploadDetails) => {
      const entries = files.map((file) => {
        const known = rows.find(
          (row) => row.needsFile && row.fileName === file.name && row.sizeBytes === file.size,
        );
        const row = known ?? newRow(crypto.randomUUID(), file);
        chosen.current.set(row.key, { file, details });
        return admit(row, purpose, file);
      });
      setRows((now) => [
        ...now.map((row) => entries.find((entry) => entry.key === row.key) ?? row),
        ...entries.filter((entry) => !now.some((row) => row.key === entry.key)),
      ]);
    },
    [purpose, rows],
  );
  const pause = useCallback(
    (key: string) => {
      halt(key);
      change(key, (row) => ({ ...row, state: "paused" }));
    },
    [halt, change],
  );
  const carryOn = useCallback(
    (key: string) => change(key, (row) => ({ ...row, state: "waiting" })),
    [change],
  );
  const remove = useCallback(
    (key: string) => {
      halt(key);
      chosen.current.delete(key);
      const row = rows.find((it) => it.key === key);
      setRows((now) => now.filter((it) => it.key !== key));
      if (!row?.uploadId || row.state === "taken") return;
      askServer(routes.api.upload(row.uploadId), { method: "DELETE" }).catch((error: unknown) => {
        // It is put back, so that nobody believes it gone.
        console.warn(`${row.fileName} could not be cancelled`, error);
        setRows((now) => [...now, { ...row, state: "stopped" }]);
      });
    },
    [halt, rows],
  );

  const isSending = rows.some((row) => row.state === "sending" || row.state === "waiting");
  return useMemo(
    () => ({ rows, isSending, add, pause, carryOn, remove }),
    [rows, isSending, add, pause, carryOn, remove],
  );
}
