"use client";

import { NodeViewWrapper, type ReactNodeViewProps, ReactNodeViewRenderer } from "@tiptap/react";
import { SvgChart } from "@/components/charts/svg-chart";
import { CitedChip } from "@/components/ui/cited-chip";
import { routes } from "@/lib/routes";
import { ChartFigure, CitedValue, Figure, SectionHeading } from "./extensions";
import { useFindingsSources } from "./findings-context";

const text = (props: ReactNodeViewProps, name: string) => String(props.node.attrs[name] ?? "");

function SectionView(props: ReactNodeViewProps) {
  return (
    <NodeViewWrapper
      as="h2"
      contentEditable={false}
      className="section-heading mt-8 mb-2 font-serif text-sheet-head font-head"
    >
      {text(props, "title")}
    </NodeViewWrapper>
  );
}

function CitedView(props: ReactNodeViewProps) {
  const { citedLook } = useFindingsSources();
  const look = citedLook(text(props, "recordId"), text(props, "versionId"), text(props, "field"));
  const cited = text(props, "text");
  const isStale = look.state === "stale" && look.now !== null;
  return (
    <NodeViewWrapper as="span" data-state={look.state}>
      <CitedChip
        paper
        state={look.state}
        source={text(props, "tag")}
        value={isStale ? (look.now?.text ?? cited) : cited}
        {...(isStale && { was: cited })}
      />
    </NodeViewWrapper>
  );
}

function Caption(props: ReactNodeViewProps) {
  return props.editor.isEditable ? (
    <textarea
      aria-label="Caption"
      rows={2}
      maxLength={500}
      className="raw w-full resize-y bg-transparent text-13 text-paper-ink outline-offset-2"
      placeholder="Caption: item, place on the part, what is shown, technique"
      value={text(props, "caption")}
      onChange={(event) => props.updateAttributes({ caption: event.target.value })}
    />
  ) : (
    <p className="raw text-13">{text(props, "caption")}</p>
  );
}

function FigureView(props: ReactNodeViewProps) {
  const { picture } = useFindingsSources();
  const imageId = text(props, "imageId");
  const shown = picture(imageId);
  return (
    <NodeViewWrapper
      as="figure"
      contentEditable={false}
      className="my-4 border-b border-paper-rule pb-2"
    >
      {shown ? (
        // The picture is drawn by the server with its marks, behind the session's cookie.
        // eslint-disable-next-line @next/next/no-img-element
        <img
          src={routes.api.figure(imageId)}
          alt={`${shown.label} ${shown.caption}`}
          className="w-full"
          loading="lazy"
        />
      ) : (
        <p className="border border-bad-mark p-3 text-13 text-bad">This picture was withdrawn.</p>
      )}
      <figcaption className="mt-2">
        <span className="font-mono text-12 text-paper-ink-2">{shown?.label}</span>
        <Caption {...props} />
      </figcaption>
    </NodeViewWrapper>
  );
}

function ChartView(props: ReactNodeViewProps) {
  const { chart } = useFindingsSources();
  const shown = chart(text(props, "traverseId"));
  return (
    <NodeViewWrapper
      as="figure"
      contentEditable={false}
      className="my-4 border-b border-paper-rule pb-2"
    >
      {shown ? (
        <SvgChart chart={shown.chart} className="h-auto w-full" />
      ) : (
        <p className="border border-bad-mark p-3 text-13 text-bad">This traverse was withdrawn.</p>
      )}
      <figcaption className="mt-2">
        <span className="font-mono text-12 text-paper-ink-2">{shown?.label}</span>
        <Caption {...props} />
      </figcaption>
    </NodeViewWrapper>
  );
}

const viewOf = (view: React.ComponentType<ReactNodeViewProps>) => () => ReactNodeViewRenderer(view);

/** The parts of findings as they look on screen. */
export const SHOWN_PARTS = [
  SectionHeading.extend({ addNodeView: viewOf(SectionView) }),
  CitedValue.extend({ addNodeView: viewOf(CitedView) }),
  Figure.extend({ addNodeView: viewOf(FigureView) }),
  ChartFigure.extend({ addNodeView: viewOf(ChartView) }),
];
