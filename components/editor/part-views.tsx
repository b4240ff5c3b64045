"use client";

import { NodeViewWrapper, type ReactNodeViewProps, ReactNodeViewRenderer } from "@tiptap/react";
import { SvgChart } from "@/components/charts/svg-chart";
import { CitedChip } from "@/components/ui/cited-chip";
import { routes } from "@/lib/routes";
import { ChartFigure, CitedValue, Figure, SectionHeading } from "@/lib/findings/extensions";
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

const said = (value: string) => value.replace("±", "plus or minus").replace("≈", "about");

function CitedView(props: ReactNodeViewProps) {
  const { citedLook } = useFindingsSources();
  const look = citedLook(text(props, "recordId"), text(props, "versionId"), text(props, "field"));
  const cited = text(props, "text");
  const tag = text(props, "tag");
  const hasChanged = look.state === "stale" || look.state === "kept";
  const state = hasChanged ? (text(props, "keptReason") ? "kept" : "stale") : look.state;
  const now = state === "stale" && look.now?.text !== cited ? look.now?.text : undefined;
  return (
    <NodeViewWrapper as="span" data-state={state}>
      <CitedChip
        paper
        state={state}
        source={tag}
        value={now ?? cited}
        spoken={`${said(cited)}, from ${tag}${state === "current" ? "" : `, ${state}`}${now ? `, now ${said(now)}` : ""}`}
        {...(now && { was: cited })}
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
      className="raw w-full resize-y bg-transparent font-sans text-13 text-paper-ink outline-offset-2"
      placeholder="Caption: item, place on the part, what is shown, technique"
      value={text(props, "caption")}
      onChange={(event) => props.updateAttributes({ caption: event.target.value })}
    />
  ) : (
    <p className="raw font-sans text-13">{text(props, "caption")}</p>
  );
}

/** "Figure 3" as the report will number it, and what it shows. */
function FigureNumber({ label, children }: { label?: string; children?: React.ReactNode }) {
  return (
    <p className="flex items-baseline gap-3 font-sans text-13">
      <span className="figure-number font-strong" />
      <span className="font-mono text-12 text-paper-ink-2">{label}</span>
      <span className="grow" />
      {children}
    </p>
  );
}

function FigureView(props: ReactNodeViewProps) {
  const { picture } = useFindingsSources();
  const imageId = text(props, "imageId");
  const shown = picture(imageId);
  const withMarks = props.node.attrs.withMarks !== false;
  return (
    <NodeViewWrapper
      as="figure"
      contentEditable={false}
      className="my-4 border-b border-paper-rule pb-2"
    >
      {shown ? (
        // eslint-disable-next-line @next/next/no-img-element -- its address asks for the sign-in, which the framework's image service does not have
        <img
          src={routes.api.figure(imageId, withMarks)}
          alt={`${shown.label} ${shown.caption}`}
          className="w-full"
          loading="lazy"
        />
      ) : (
        <p className="border border-bad-mark p-3 text-13 text-bad">This picture was withdrawn.</p>
      )}
      <figcaption className="mt-2">
        <FigureNumber label={shown?.label}>
          {props.editor.isEditable && (
            <label className="inline-flex min-h-6 items-center gap-1.5 text-12 text-paper-ink-2">
              <input
                type="checkbox"
                className="m-1 size-6"
                checked={withMarks}
                onChange={(event) => props.updateAttributes({ withMarks: event.target.checked })}
              />
              Marks drawn in
            </label>
          )}
        </FigureNumber>
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
        <FigureNumber label={shown?.label} />
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
