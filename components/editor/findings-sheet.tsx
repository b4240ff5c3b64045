import { type Editor, EditorContent } from "@tiptap/react";
import { ROOT_CAUSE_MAX } from "@/lib/findings/document-schema";

type Props = {
  caseNumber: string;
  issueNumber: number;
  isSigned: boolean;
  isReadOnly: boolean;
  rootCause: string;
  onRootCause: (typed: string) => void;
  editor: Editor | null;
};

/** The sheet of paper: root cause at its head, the text under it. */
export function FindingsSheet(props: Props) {
  return (
    <div className="mx-auto my-4 max-w-sheet bg-paper px-6 py-10 text-paper-ink sm:px-18">
      <p className="flex justify-between border-b border-paper-rule pb-2 text-12 text-paper-ink-2">
        <span className="font-mono">{props.caseNumber}</span>
        <span>
          Findings, issue {props.issueNumber}, {props.isSigned ? "signed" : "not signed"}
        </span>
      </p>
      <label className="mt-6 block text-13 font-head" htmlFor="root-cause">
        Root cause, in one sentence
      </label>
      <textarea
        id="root-cause"
        rows={2}
        maxLength={ROOT_CAUSE_MAX}
        readOnly={props.isReadOnly}
        className="raw mt-1 w-full resize-y border-l-3 border-action bg-transparent pl-4 font-serif text-sheet"
        placeholder="What failed, by which mechanism, from where, and why."
        value={props.rootCause}
        onChange={(event) => props.onRootCause(event.target.value)}
      />
      <EditorContent editor={props.editor} />
    </div>
  );
}
