import "server-only";

/** A file that cannot be taken in. The message says what happened, what was kept and what to do. */
export class FileRefusal extends Error {
  override name = "FileRefusal";
}
