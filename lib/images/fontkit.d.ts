/** The part of fontkit 2 that figures use; it comes with pdfkit and publishes no types. */
declare module "fontkit" {
  type Path = {
    scale(x: number, y?: number): Path;
    translate(x: number, y: number): Path;
    toSVG(): string;
  };
  type Glyph = { path: Path; advanceWidth: number };
  type Run = { glyphs: Glyph[]; positions: { xAdvance: number }[]; advanceWidth: number };
  export type Font = { unitsPerEm: number; layout(text: string): Run };
  export function create(file: Uint8Array): Font;
}
