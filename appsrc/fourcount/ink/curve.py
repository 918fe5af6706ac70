"""The pen of the curve: the one file that knows matplotlib, and loads it at the first drawing.

A figure has 72 dots an inch for each device pixel of a logical one, so that points and logical pixels are the same and
a file shows what the window shows. The library's caches are not made for threads: one drawing is made at a time.
"""

from __future__ import annotations

import logging
import os
import threading
from collections.abc import Iterator, Sequence
from contextlib import contextmanager
from functools import cache
from importlib import import_module
from io import BytesIO
from pathlib import Path
from typing import TYPE_CHECKING, Literal

from PySide6.QtCore import QStandardPaths

from fourcount.appraisal.findings.curve import Curve
from fourcount.ink.curve_layout import CurveLayout
from fourcount.ink.curve_sheet import Dash, Marks, Shape, Sheet
from fourcount.ink.palette import Palette
from fourcount.picture.places import Box
from fourcount.wording.curve import CurveWords, View

if TYPE_CHECKING:
    from matplotlib.axes import Axes
    from matplotlib.backends.backend_agg import RendererAgg
    from matplotlib.figure import Figure
    from matplotlib.font_manager import FontProperties

Format = Literal["png", "svg", "pdf"]

OWN_FONT = "DejaVu Sans"
"""Comes with the library, so that it is there on every machine."""

FOLDER_VARIABLE = "MPLCONFIGDIR"
SHAPES: dict[Shape, str] = {"square": "s", "round": "o"}
PARTS = ("backends.backend_agg", "backends.backend_pdf", "backends.backend_svg", "figure", "font_manager")
SETTINGS = {
    "text.parse_math": False,  # a dollar sign in a label is a dollar sign
    "text.hinting": "none",
    "svg.fonttype": "none",  # text stays text
    "svg.hashsalt": "fourcount",  # equal drawings are equal files
    "pdf.fonttype": 42,  # likewise, and it can be searched
}

_one_at_a_time = threading.Lock()


def draw_curve(
    curve: Curve,
    view: View,
    words: CurveWords,
    palette: Palette,
    sheet: Sheet,
    kind: Format = "png",
) -> bytes:
    """The drawing as the bytes of a file; equal ones have equal bytes, and none says when or where it was made."""
    layout = CurveLayout(curve, view, words, palette, sheet)
    with _one_at_a_time:
        _load()
        from matplotlib.backends.backend_agg import FigureCanvasAgg
        from matplotlib.figure import Figure

        figure = Figure(figsize=(sheet.width / 72, sheet.height / 72), dpi=72 * sheet.ratio, facecolor=palette.page)
        canvas = FigureCanvasAgg(figure)
        renderers = [canvas.get_renderer()]
        try:
            families = _families(sheet.family, frozenset(c for text in layout.texts for c in text if c > "~"))
            grown = layout.grow(_Pen(figure, renderers[0], families))
            figure.set_size_inches(grown.width / 72, grown.height / 72)
            renderers.append(canvas.get_renderer())
            layout.draw(_Pen(figure, renderers[-1], families))
            target = BytesIO()
            figure.savefig(target, format=kind, dpi=figure.dpi, metadata=_metadata(kind, words))
            return target.getvalue()
        finally:
            figure.clear()
            for renderer in renderers:
                vars(renderer).clear()  # the library's cycles would hold megabytes of dots until somebody collects them


@cache
def _load() -> None:
    """Load the library and its list of fonts, which takes a second or more the first time on a machine."""
    logging.getLogger("matplotlib").setLevel(logging.ERROR)
    with _own_cache():
        import matplotlib as mpl

        for name in PARTS:
            import_module(f"matplotlib.{name}")
        import_module("fontTools.subset")  # what a PDF needs, so that saving one does not wait for it
    mpl.rcdefaults()  # whatever a file of the user's says about other drawings
    for setting, value in SETTINGS.items():
        mpl.rcParams[setting] = value  # type: ignore[index]


@contextmanager
def _own_cache() -> Iterator[None]:
    """Keep the list of fonts in a folder of the program's own; where none can be written, it goes to a passing one."""
    if FOLDER_VARIABLE in os.environ:
        yield
        return
    location = QStandardPaths.writableLocation(QStandardPaths.StandardLocation.GenericCacheLocation)
    os.environ[FOLDER_VARIABLE] = str(Path(location) / "fourcount" / "matplotlib")
    try:
        yield
    finally:
        del os.environ[FOLDER_VARIABLE]


def _metadata(kind: Format, words: CurveWords) -> dict[str, str | None]:
    """What a file says of itself: the whole of every text, whatever the drawing had to cut."""
    said = " ".join(part for part in (words.heading, words.described) if part)
    if kind == "png":
        return {"Software": "Fourcount", "Title": words.title, "Description": said}
    if kind == "svg":
        return {"Creator": "Fourcount", "Date": None, "Title": words.title, "Description": said}
    return {"Creator": "Fourcount", "Producer": None, "CreationDate": None, "Title": words.title, "Subject": said}


@cache
def _families(family: str, characters: frozenset[str]) -> list[str]:
    """The program's font, the library's own, and whatever other one has the characters that these two lack."""
    from matplotlib.font_manager import fontManager, get_font

    def has(path: str) -> set[str]:
        return {character for character in characters if ord(character) in get_font(path).get_charmap()}

    paths = {entry.name: entry.fname for entry in reversed(fontManager.ttflist)}
    found = [name for name in (family, OWN_FONT) if name in paths]
    lacking = set(characters).difference(*(has(paths[name]) for name in found))
    for name, path in paths.items():
        if not lacking:
            break
        if here := has(path) & lacking:
            found.append(name)
            lacking -= here
    return found


class _Pen:
    """What the layout draws with: places in pixels from the lower left corner, values on the axes once they are set."""

    def __init__(self, figure: Figure, renderer: RendererAgg, families: list[str]) -> None:
        self._figure = figure
        self._renderer = renderer
        self._families = families
        self._axes: Axes | None = None

    def _font(self, size: float, strong: bool) -> FontProperties:
        from matplotlib.font_manager import FontProperties

        return FontProperties(family=self._families, size=size, weight="bold" if strong else "normal")

    def width(self, text: str, size: float, strong: bool = False) -> float:
        """How wide a line of text is."""
        width, _, _ = self._renderer.get_text_width_height_descent(text, self._font(size, strong), ismath=False)
        return float(width) * 72 / self._figure.dpi

    def text(
        self,
        x: float,
        y: float,
        text: str,
        size: float,
        colour: str,
        strong: bool = False,
        right: bool = False,
        ground: str = "",
    ) -> None:
        """A line of text by its left or right end and its middle; ``ground`` is a colour behind it."""
        box = {"facecolor": ground, "edgecolor": "none", "pad": 1.5} if ground else None
        self._figure.text(
            x / 72,
            y / 72,
            text,
            transform=self._figure.dpi_scale_trans,
            fontproperties=self._font(size, strong),
            color=colour,
            ha="right" if right else "left",
            va="center_baseline",
            bbox=box,
        )

    def stroke(self, points: Sequence[tuple[float, float]], colour: str, width: float) -> None:
        """A thin line between places."""
        from matplotlib.lines import Line2D

        x, y = zip(*((x / 72, y / 72) for x, y in points), strict=True)
        to_inches = self._figure.dpi_scale_trans
        self._figure.add_artist(Line2D(x, y, color=colour, linewidth=width, transform=to_inches))

    def set_axes(self, box: Box, across: Marks, up: Marks, logarithmic: bool, size: float, colours: Palette) -> None:
        """The two axes with their marks and the words at them; hairlines go across at each mark."""
        wide, tall = (72 * float(length) for length in self._figure.get_size_inches())
        left, bottom, right, top = box
        axes = self._figure.add_axes((left / wide, bottom / tall, (right - left) / wide, (top - bottom) / tall))
        axes.patch.set_visible(False)
        axes.set_xlim(across.low, across.high)
        if logarithmic:
            axes.set_yscale("log")
        axes.set_ylim(up.low, up.high)
        axes.minorticks_off()
        axes.set_xticks(across.values, across.words, fontproperties=self._font(size, False))
        axes.set_yticks(up.values, up.words, fontproperties=self._font(size, False))
        axes.tick_params(color=colours.outline, labelcolor=colours.muted, width=0.8, length=size / 4)
        axes.tick_params(axis="y", length=0)
        axes.grid(axis="y", color=colours.hairline, linewidth=0.8)
        axes.set_axisbelow(True)
        for side in ("top", "right", "left"):
            axes.spines[side].set_visible(False)
        axes.spines["bottom"].set(color=colours.outline, linewidth=0.8)
        self._axes = axes

    def where(self, x: float, y: float) -> tuple[float, float]:
        """The place of values on the axes."""
        dots = self._on_axes().transData.transform((x, y)) * 72 / self._figure.dpi
        return float(dots[0]), float(dots[1])

    def line(self, points: Sequence[tuple[float, float]], colour: str, width: float, dash: Dash = ()) -> None:
        """A line through values on the axes."""
        if len(points) > 1:
            x, y = zip(*points, strict=True)
            style = (0, dash) if dash else "-"
            self._on_axes().plot(x, y, color=colour, linewidth=width, linestyle=style, clip_on=False, zorder=3)

    def area(self, rows: Sequence[tuple[float, float, float]], colour: str, strength: float) -> None:
        """What lies between a low and a high value on the axes."""
        if len(rows) > 1:
            x, low, high = zip(*rows, strict=True)
            self._on_axes().fill_between(x, low, high, color=colour, alpha=strength, linewidth=0, zorder=1)

    def point(self, x: float, y: float, shape: Shape, size: float, fill: str, edge: str) -> None:
        """A point at values on the axes."""
        self._on_axes().plot(
            [x],
            [y],
            marker=SHAPES[shape],
            markersize=size,
            markerfacecolor=fill,
            markeredgecolor=edge,
            markeredgewidth=1.6,
            linestyle="none",
            clip_on=False,
            zorder=5,
        )

    def _on_axes(self) -> Axes:
        if self._axes is None:
            raise RuntimeError("there are no axes yet")
        return self._axes
