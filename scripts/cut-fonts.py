#!/usr/bin/python3
"""Prepares the fonts in public/fonts; run by hand, once, when a font is changed. Needs Debian's python3-fonttools and python3-brotli.

1. Gives the web fonts a prime and a double prime, the signs for feet and inches, drawn as the straight quotes they already have.
2. Cuts single weights out of the variable fonts for the PDFs, whose library reads neither WOFF2 nor variations, with the basic
   and the extended Latin letters in one file.
"""

from pathlib import Path
from tempfile import TemporaryDirectory

from fontTools.merge import Merger
from fontTools.ttLib import TTFont
from fontTools.varLib.instancer import instantiateVariableFont

FONTS = Path(__file__).resolve().parent.parent / "public" / "fonts"
SUBSETS = ("latin", "latin-ext")
STYLES = {400: "Regular", 500: "Medium", 600: "SemiBold", 700: "Bold"}
CUTS = {"atkinson-hyperlegible-next": (400, 700), "sofia-sans-condensed": (500, 600, 700)}
PRIMES = {0x2032: 0x27, 0x2033: 0x22}


def add_primes(file):
    font = TTFont(file)
    glyphs = font.getBestCmap()
    if 0x27 not in glyphs or 0x2033 in glyphs:
        return
    for table in font["cmap"].tables:
        if table.isUnicode():
            table.cmap.update({prime: glyphs[quote] for prime, quote in PRIMES.items()})
    font.save(file)


def cut(name, weight, folder):
    """One weight of one subset after the other, then merged. A merged font cannot hold two variable tables, hence this order."""
    for subset in SUBSETS:
        font = TTFont(FONTS / f"{name}-{subset}.woff2")
        font.flavor = None
        part = folder / f"{subset}.ttf"
        instantiateVariableFont(font, {"wght": weight}).save(part)
        yield str(part)


def name_style(font, style):
    """The variable font calls itself Regular; the cut is named by its own weight, as a list of a PDF's fonts shows it."""
    names = font["name"]
    family = names.getDebugName(1)
    for name_id, text in {2: style, 4: f"{family} {style}", 6: f"{family.replace(' ', '')}-{style}"}.items():
        for record in names.names:
            if record.nameID == name_id:
                record.string = text


for woff2 in sorted(FONTS.glob("*.woff2")):
    add_primes(woff2)
(FONTS / "print").mkdir(exist_ok=True)
for name, weights in CUTS.items():
    for weight in weights:
        with TemporaryDirectory() as folder:
            font = Merger().merge(list(cut(name, weight, Path(folder))))
        name_style(font, STYLES[weight])
        font.save(FONTS / "print" / f"{name}-{weight}.ttf")
