import { formatBytes } from "@/lib/format/numbers";
import { routes } from "@/lib/routes";
import type { RequestFile } from "@/lib/uploads/request-files";

/** Photographs and papers that came with a field return. */
export function FileList({ files }: { files: readonly RequestFile[] }) {
  if (files.length === 0) return <p className="mb-3 text-13 text-ink-2">None were sent.</p>;
  return (
    <ul className="mb-3 grid gap-1 text-13">
      {files.map((file) => (
        <li key={file.id} className="flex gap-3">
          <a href={routes.api.requestFile(file.id)} className="font-mono text-12">
            {file.fileName}
          </a>
          <span className="text-ink-3">
            {formatBytes(file.sizeBytes)}, {file.by}
          </span>
        </li>
      ))}
    </ul>
  );
}
