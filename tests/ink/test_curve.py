"""The files of a curve: the same bytes each time, every text in full, no trace of who made them, when or where."""

from __future__ import annotations

import gc
import os
import re
import weakref
from pathlib import Path

import msgspec
import pytest
from PySide6.QtCore import QStandardPaths
from PySide6.QtGui import QImage

from curves import AT_TWELVE, FOOT, RISING, parts
from fourcount.ink import curve as pen_of_curve
from fourcount.ink.curve import Format, draw_curve
from fourcount.ink.curve_sheet import Sheet
from fourcount.ink.palette import PAPER
from fourcount.record.outcome import Outcome


def made(outcome: Outcome, kind: Format = "png", sheet: Sheet | None = None, place: int = 0) -> bytes:
    return draw_curve(*parts(outcome, place), PAPER, sheet or Sheet(500, 340, foot=FOOT), kind)


@pytest.fixture
def outcome() -> Outcome:
    """The worked example for a patient who starts at 12%."""
    return AT_TWELVE


@pytest.fixture
def rising() -> Outcome:
    """A table whose risk ratio passes 100%."""
    return RISING


@pytest.mark.parametrize("kind", ["png", "svg", "pdf"])
def test_words_of_any_length_are_drawn(outcome: Outcome, kind: Format) -> None:
    """Also with real letters; a drawing says the whole of what it cuts where it is described."""
    span = "within two years and a day " * 74
    outcome = msgspec.structs.replace(outcome, span_text=span, name_text=span, left_words_text=span)
    for sheet in (Sheet(360, 240), Sheet(500, 340, foot=FOOT)):
        data = made(outcome, kind, sheet)
        if kind == "svg":
            described = re.search(r"<dc:description>(.*?)</dc:description>", data.decode(), re.DOTALL)
            assert described is not None
            assert described[1].count(span.strip()) >= 2


@pytest.mark.parametrize("kind", ["png", "svg", "pdf"])
def test_equal_drawings_are_equal_files(outcome: Outcome, kind: Format) -> None:
    """Drawn twice, a file has the same bytes: it holds no date and no chance."""
    assert made(outcome, kind) == made(outcome, kind)


def test_a_png_has_the_size_that_was_asked_for(outcome: Outcome) -> None:
    """Two device pixels a pixel make a picture twice as wide, of more than one colour."""
    image = QImage.fromData(made(outcome, "png", Sheet(500, 340, ratio=2.0)))
    assert (image.width(), image.height()) == (1000, 680)
    assert len({image.pixel(x, 340) for x in range(1000)}) > 2


def test_an_svg_has_text_as_text(outcome: Outcome) -> None:
    """Names, axes, title and description can be searched; typed marks are escaped."""
    outcome = msgspec.structs.replace(outcome, first_label_text="<b>night $lights$ & more</b>")
    text = made(outcome, "svg").decode()
    assert "<title>Across starting risks: fell at least once</title>" in text
    assert "Keep this in mind." in text
    assert "&lt;b&gt;night $lights$ &amp; more&lt;/b&gt;" in text
    assert "<b>" not in text


def test_a_pdf_has_fonts_and_a_title(outcome: Outcome) -> None:
    """Text is set in an embedded font, with a table of its characters, and the title is the drawing's."""
    data = made(outcome, "pdf")
    assert b"/ToUnicode" in data
    assert b"Across starting risks: fell at least once" in data


@pytest.mark.parametrize("kind", ["png", "svg", "pdf"])
def test_no_file_says_who_made_it_when_or_where(outcome: Outcome, kind: Format) -> None:
    """The program's name is all: no date, no user, no folder, no library."""
    data = made(outcome, kind)
    assert b"Fourcount" in data
    for trace in (b"Matplotlib v", b"CreationDate", b"<dc:date>", b"/Producer", b"/Author", os.fsencode(Path.home())):
        assert trace not in data
    assert not re.search(rb"20\d\d-\d\d-\d\dT", data)


def test_any_characters_are_drawn(outcome: Outcome) -> None:
    """Labels in other scripts, dollar signs and characters that no font has give no warning and no error."""
    outcome = msgspec.structs.replace(
        outcome,
        first_label_text="夜间照明 $x^2 \U0001f4a1",
        second_label_text="обычный \u0600 уход",
        span_text="\ue000",
    )
    assert made(outcome, "png")
    assert made(outcome, "svg")
    assert made(outcome, "pdf")


def test_figures_do_not_stay(outcome: Outcome, monkeypatch: pytest.MonkeyPatch) -> None:
    """Once a drawing is made, nothing holds its figure."""
    from matplotlib.figure import Figure

    made(outcome)
    kept: list[weakref.ref] = []
    clear = Figure.clear

    def cleared(self, *rest, **more) -> None:
        clear(self, *rest, **more)
        kept.append(weakref.ref(self))

    monkeypatch.setattr(Figure, "clear", cleared)
    made(outcome)
    gc.collect()
    assert kept
    assert all(figure() is None for figure in kept)


def test_the_dots_of_a_drawing_are_freed_at_once(outcome: Outcome, monkeypatch: pytest.MonkeyPatch) -> None:
    """No collector has to run before the megabytes of a picture are free again."""
    from matplotlib.backends.backend_agg import FigureCanvasAgg

    renderers = []
    get = FigureCanvasAgg.get_renderer

    def got(self):
        renderers.append(get(self))
        return renderers[-1]

    monkeypatch.setattr(FigureCanvasAgg, "get_renderer", got)
    made(outcome)
    assert renderers
    assert not any(vars(renderer) for renderer in renderers)


def test_the_list_of_fonts_has_a_folder_of_the_programs_own(monkeypatch: pytest.MonkeyPatch) -> None:
    """While the library loads it is pointed to the program's cache, and the environment is as before afterwards."""
    monkeypatch.delenv("MPLCONFIGDIR", raising=False)
    place = QStandardPaths.writableLocation(QStandardPaths.StandardLocation.GenericCacheLocation)
    with pen_of_curve._own_cache():
        assert os.environ["MPLCONFIGDIR"] == str(Path(place) / "fourcount" / "matplotlib")
    assert "MPLCONFIGDIR" not in os.environ


def test_a_folder_that_was_asked_for_is_used(monkeypatch: pytest.MonkeyPatch) -> None:
    """Who names a folder for the library keeps it."""
    monkeypatch.setenv("MPLCONFIGDIR", "/elsewhere")
    with pen_of_curve._own_cache():
        assert os.environ["MPLCONFIGDIR"] == "/elsewhere"
    assert os.environ["MPLCONFIGDIR"] == "/elsewhere"


def test_concurrent_drawings_are_each_as_alone(outcome: Outcome, rising: Outcome) -> None:
    """Two threads that draw at once get what each would get by itself."""
    from concurrent.futures import ThreadPoolExecutor

    alone = [made(one, "svg") for one in (outcome, rising)]
    with ThreadPoolExecutor(2) as pool:
        assert list(pool.map(lambda one: made(one, "svg"), (outcome, rising, outcome, rising))) == alone * 2
