#!/usr/bin/python3
"""Cuts the faces in this folder from their open-licence sources; see README.md beside it.

Usage: cut-fonts.py INTER_UI_FOLDER NODE_MODULES_FOLDER OUTPUT_FOLDER
Needs fontTools with brotli (Debian: fonttools, python3-brotli).
"""
import os
import sys
import tempfile
from copy import deepcopy

from fontTools.merge import Merger
from fontTools.subset import Options, Subsetter
from fontTools.ttLib import TTFont
from fontTools.varLib.instancer import instantiateVariableFont

inter_ui, node_modules, out = sys.argv[1:4]

SYMBOLS = "≈≤≥≠→←↑↓↔⇒√∞∅∑∂∫□✓−×÷·±½⅓°′″µ" + "₀₁₂₃₄₅₆₇₈₉₊₋" + "⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻" + "\u2009\u202f"
GREEK = "αβγδεθλμνπρστφωΔΩΣ"
# Code points that Inter lacks but whose form it has under another: diameter sign, ballot box.
SAME_FORM = {0x2300: 0x2205, 0x2610: 0x25A1}

# No calt: it would turn "2 x 25" into "2 × 25" in a person's own words.
FEATURES = ["kern", "mark", "mkmk", "ccmp", "locl", "liga", "tnum", "lnum"]


def span(*ranges):
    return [code for first, last in ranges for code in range(first, last + 1)]


TEXT = span((0x20, 0x7E), (0xA0, 0x17F), (0x2B0, 0x2DD), (0x370, 0x3FF), (0x2000, 0x206F),
            (0x2070, 0x209C), (0x20AC, 0x20AC), (0x2100, 0x215F), (0x2190, 0x21FF),
            (0x2200, 0x22FF), (0x2300, 0x2300), (0x25A0, 0x25FF), (0x2610, 0x2610),
            (0x2713, 0x2713))


def add_copy(font, missing, present):
    """A glyph of its own, so that text copied from a PDF gives back the character put in."""
    cmap = font.getBestCmap()
    if missing in cmap or present not in cmap:
        return
    name = f"uni{missing:04X}"
    font["glyf"][name] = deepcopy(font["glyf"][cmap[present]])
    font["hmtx"][name] = font["hmtx"][cmap[present]]
    for table in font["cmap"].tables:
        if table.isUnicode():
            table.cmap[missing] = name


def list_lookups_once(font):
    """Inter lists its kerning lookups twice for the default script; pdfkit then kerns twice."""
    for tag in ("GSUB", "GPOS"):
        if tag in font:
            for record in font[tag].table.FeatureList.FeatureRecord:
                record.Feature.LookupListIndex = sorted(set(record.Feature.LookupListIndex))
                record.Feature.LookupCount = len(record.Feature.LookupListIndex)


def cut(font, codes):
    for missing, present in SAME_FORM.items():
        add_copy(font, missing, present)
    options = Options()
    options.layout_features = FEATURES
    options.hinting = False
    options.notdef_outline = True
    options.name_IDs = [0, 1, 2, 3, 4, 5, 6, 13, 14, 16, 17]
    options.drop_tables += ["DSIG", "STAT", "HVAR", "MVAR", "avar", "meta"]
    subsetter = Subsetter(options)
    subsetter.populate(unicodes=codes)
    subsetter.subset(font)
    list_lookups_once(font)
    return font


def rename(font, family, style):
    for record in list(font["name"].names):
        if record.nameID in (16, 17):
            font["name"].removeNames(nameID=record.nameID)
    plain = family.replace(" ", "") + "-" + style.replace(" ", "")
    for name_id, text in ((1, f"{family} {style}" if style not in ("Regular", "Italic") else family),
                          (2, "Italic" if style == "Italic" else "Regular"),
                          (3, plain), (4, f"{family} {style}"), (6, plain)):
        font["name"].setName(text, name_id, 3, 1, 0x409)
    return font


def save(font, name, flavor=None):
    font.flavor = flavor
    path = os.path.join(out, name)
    os.makedirs(os.path.dirname(path), exist_ok=True)
    font.save(path)
    print(f"{name}  {os.path.getsize(path) / 1000:.0f} kB  {len(font.getBestCmap())} characters")


def inter(style):
    return TTFont(os.path.join(inter_ui, "web", f"Inter-{style}.woff2"))


def fontsource(files, wght=None):
    """Joins the script subsets of one face into one static font."""
    with tempfile.TemporaryDirectory() as folder:
        paths = []
        for index, file in enumerate(files):
            font = TTFont(os.path.join(node_modules, file))
            if wght is not None:
                font = instantiateVariableFont(font, {"wght": wght})
            if index:
                # Kerning across subsets is not worth merging two GPOS tables for.
                for table in ("GSUB", "GPOS", "GDEF"):
                    if table in font:
                        del font[table]
            font.flavor = None
            path = os.path.join(folder, f"{index}.ttf")
            font.save(path)
            paths.append(path)
        joined = TTFont(paths[0]) if len(paths) == 1 else Merger().merge(paths)
        joined.ensureDecompiled()
        return joined


for style in ("Regular", "SemiBold"):
    codes = [ord(c) for c in SYMBOLS + GREEK] + list(SAME_FORM) + [0x20]
    save(rename(cut(inter(style), codes), "Riverline Math", style),
         f"riverline-math-{style.lower()}.woff2", "woff2")
    save(rename(cut(inter(style), codes), "Riverline Math", style), f"pdf/RiverlineMath-{style}.ttf")

for style in ("Regular", "Medium", "SemiBold"):
    save(rename(cut(inter(style), TEXT), "Inter", style), f"pdf/Inter-{style}.ttf")

# "Source" and "Plex" are reserved names, so a cut of those faces goes under a name of its own.
serif = "@fontsource-variable/source-serif-4/files/source-serif-4-{}-wght-{}.woff2"
for style, slope, wght in (("Regular", "normal", 400), ("Italic", "italic", 400),
                           ("SemiBold", "normal", 620)):
    files = [serif.format(subset, slope) for subset in ("latin", "latin-ext", "greek")]
    save(rename(cut(fontsource(files, wght), TEXT), "Riverline Serif", style),
         f"pdf/RiverlineSerif-{style}.ttf")

mono = "@fontsource/ibm-plex-mono/files/ibm-plex-mono-{}-400-normal.woff"
save(rename(cut(fontsource([mono.format(s) for s in ("latin", "latin-ext")]), TEXT),
            "Riverline Mono", "Regular"), "pdf/RiverlineMono-Regular.ttf")
