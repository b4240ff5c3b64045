"use client";

import { type Editor, useEditorState } from "@tiptap/react";
import {
  Bold,
  ChartLine,
  Image as ImageIcon,
  Italic,
  List,
  ListOrdered,
  Redo2,
  Subscript,
  Superscript,
  Table as TableIcon,
  Undo2,
} from "lucide-react";
import { Button } from "@/components/ui/button";
import { Kbd } from "@/components/ui/kbd";
import { Select } from "@/components/ui/select";

const STYLES = [
  { value: "0", label: "Section text" },
  { value: "1", label: "Heading" },
  { value: "2", label: "Smaller heading" },
  { value: "3", label: "Smallest heading" },
];
const LEVELS = [1, 2, 3] as const;

type Props = { editor: Editor; onCite: () => void; onFigure: () => void; onChart: () => void };

/** What can be done to the text at the cursor. */
export function Toolbar({ editor, onCite, onFigure, onChart }: Props) {
  const now = useEditorState({
    editor,
    selector: ({ editor: e }) => ({
      level: String(LEVELS.find((level) => e.isActive("heading", { level })) ?? 0),
      bold: e.isActive("bold"),
      italic: e.isActive("italic"),
      subscript: e.isActive("subscript"),
      superscript: e.isActive("superscript"),
      bullets: e.isActive("bulletList"),
      numbers: e.isActive("orderedList"),
      inTable: e.isActive("table"),
      canUndo: e.can().undo(),
      canRedo: e.can().redo(),
    }),
  });
  const chain = () => editor.chain().focus();
  const tool = (
    label: string,
    icon: React.ReactNode,
    isOn: boolean | undefined,
    act: () => void,
    isOff = false,
  ) => (
    <Button
      icon
      look="quiet"
      aria-label={label}
      title={label}
      aria-pressed={isOn}
      disabled={isOff}
      onClick={act}
      className={isOn ? "bg-action-tint" : undefined}
    >
      {icon}
    </Button>
  );
  return (
    <div
      role="toolbar"
      aria-label="Text"
      className="sticky top-[6.5rem] z-10 flex flex-wrap items-center gap-1 border-b border-rule-2 bg-surface px-4 py-1.5"
    >
      <div className="w-36">
        <Select
          aria-label="Kind of text"
          value={now.level}
          onChange={(event) => {
            const level = LEVELS.find((known) => String(known) === event.target.value);
            if (level) chain().setHeading({ level }).run();
            else chain().setParagraph().run();
          }}
          options={STYLES}
        />
      </div>
      {tool("Bold", <Bold size={16} aria-hidden="true" />, now.bold, () =>
        chain().toggleBold().run(),
      )}
      {tool("Italic", <Italic size={16} aria-hidden="true" />, now.italic, () =>
        chain().toggleItalic().run(),
      )}
      {tool("Subscript", <Subscript size={16} aria-hidden="true" />, now.subscript, () =>
        chain().toggleMark("subscript").run(),
      )}
      {tool("Superscript", <Superscript size={16} aria-hidden="true" />, now.superscript, () =>
        chain().toggleMark("superscript").run(),
      )}
      {tool("List", <List size={16} aria-hidden="true" />, now.bullets, () =>
        chain().toggleBulletList().run(),
      )}
      {tool("Numbered list", <ListOrdered size={16} aria-hidden="true" />, now.numbers, () =>
        chain().toggleOrderedList().run(),
      )}
      {tool(
        "Table",
        <TableIcon size={16} aria-hidden="true" />,
        undefined,
        () => chain().insertTable({ rows: 3, cols: 3, withHeaderRow: true }).run(),
        now.inTable,
      )}
      {tool("Picture", <ImageIcon size={16} aria-hidden="true" />, undefined, onFigure)}
      {tool("Chart of a traverse", <ChartLine size={16} aria-hidden="true" />, undefined, onChart)}
      <Button look="quiet" onClick={onCite}>
        Cite a value <Kbd>@</Kbd>
      </Button>
      {tool(
        "Undo",
        <Undo2 size={16} aria-hidden="true" />,
        undefined,
        () => chain().undo().run(),
        !now.canUndo,
      )}
      {tool(
        "Redo",
        <Redo2 size={16} aria-hidden="true" />,
        undefined,
        () => chain().redo().run(),
        !now.canRedo,
      )}
      {now.inTable && (
        <span className="flex gap-1 border-l border-rule pl-2">
          <Button small onClick={() => chain().addRowAfter().run()}>
            Add row
          </Button>
          <Button small onClick={() => chain().addColumnAfter().run()}>
            Add column
          </Button>
          <Button small onClick={() => chain().deleteRow().run()}>
            Delete row
          </Button>
          <Button small onClick={() => chain().deleteColumn().run()}>
            Delete column
          </Button>
          <Button small look="danger" onClick={() => chain().deleteTable().run()}>
            Delete table
          </Button>
        </span>
      )}
    </div>
  );
}
