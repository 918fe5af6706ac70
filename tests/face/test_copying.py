"""What leaves the window: text, a table and a picture, each with its cautions, or a word that there is nothing yet."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtGui import QColor, QGuiApplication, QImage

from fourcount.wording import labels
from fourcount.wording.standing import STANDING_FULL

if TYPE_CHECKING:
    from conftest import Hands

COPIES = ("copy-text", "copy-table", "copy-picture")


@pytest.fixture(autouse=True)
def _empty_clipboard(qapp: object) -> None:
    """Nothing of another test lies on the clipboard."""
    QGuiApplication.clipboard().setText("before")


def copied_text() -> str:
    return QGuiApplication.clipboard().text()


def notice(hands: Hands) -> str:
    """The notice at the right of the header, as far as it can be seen."""
    words = hands.window.header.notice
    return words.text() if words.isVisible() else ""


@pytest.mark.parametrize("command", COPIES)
def test_an_empty_window_has_nothing_to_copy_and_says_so(hands: Hands, command: str) -> None:
    """The clipboard keeps what it had."""
    hands.do(command)
    assert notice(hands) == labels.NOTHING_TO_COPY
    assert copied_text() == "before"


@pytest.mark.parametrize("command", COPIES)
def test_an_unreadable_table_has_nothing_to_copy(example: Hands, command: str) -> None:
    """Figures of counts that stand no longer are never copied."""
    example.write(example.window.printed.grid.cells["first_left_text"], "abc")
    example.do(command)
    assert notice(example) == labels.NOTHING_TO_COPY
    assert copied_text() == "before"


@pytest.mark.parametrize("command", COPIES)
def test_copying_is_confirmed_until_something_changes(example: Hands, command: str) -> None:
    """A notice says what was copied; the next keystroke takes it away."""
    example.do(command)
    assert notice(example) == labels.COPIED[command]
    example.do("first-cell")
    example.type("5")
    assert notice(example) == ""


def test_copied_text_puts_absolute_before_relative(example: Hands) -> None:
    """Risks and their difference come before any ratio, so that a letter cannot quote the ratio alone by its top."""
    example.do("copy-text")
    text = copied_text().lower()
    assert text.index("17.1%") < text.index("risk ratio")
    assert text.index("fewer") < text.index("risk ratio")
    assert "0.54" in text


def test_copied_text_holds_its_cautions(example: Hands) -> None:
    """The cautions on screen and the standing sentences go along, with program and date."""
    example.choose(example.window.printed.design, "cohort study")
    example.do("copy-text")
    text = copied_text()
    assert example.window.cautions.texts
    assert all(caution in text for caution in example.window.cautions.texts)
    assert all(sentence in text for sentence in STANDING_FULL)
    assert "Calculated with Fourcount" in text


def test_a_copied_table_is_rows_and_cells(example: Hands) -> None:
    """Tabs between cells, as many in each line; the estimates unrounded; no cell begins like a formula."""
    example.do("copy-table")
    lines = copied_text().splitlines()
    assert len({line.count("\t") for line in lines}) == 1
    cells = {line.split("\t")[0]: line.split("\t") for line in lines}
    assert float(cells["Risk ratio"][1]) == pytest.approx((38 / 412) / (70 / 409))
    assert not any(line.startswith(("=", "+", "@")) for line in lines)
    assert all(any(sentence in line for line in lines) for sentence in STANDING_FULL)


def test_a_copied_table_pastes_into_a_letter_as_a_table(example: Hands) -> None:
    """The same rows lie beside it as HTML, with typed text escaped."""
    example.write(example.window.printed.grid.labels["first"], "<b>new</b>")
    example.do("copy-table")
    html = QGuiApplication.clipboard().mimeData().html()
    assert html.count("<tr>") == len(copied_text().splitlines())
    assert "<b>" not in html
    assert "&lt;b&gt;new" in html


def test_names_that_look_like_formulas_are_harmless(example: Hands) -> None:
    """A group called =1+1 does not become a sum in a spreadsheet."""
    example.write(example.window.printed.grid.labels["first"], "=1+1")
    example.do("copy-table")
    cells = [cell for line in copied_text().splitlines() for cell in line.split("\t")]
    assert any("=1+1" in cell for cell in cells)
    assert not any(cell.startswith("=") for cell in cells)


@pytest.mark.parametrize("appearance", ["light", "dark"])
def test_a_copied_picture_is_on_white(example: Hands, appearance: str) -> None:
    """Whatever the window looks like, the picture is not empty, on white, and has dark text."""
    example.window.look.set_appearance(appearance)
    example.do("copy-picture")
    image: QImage = QGuiApplication.clipboard().image()
    assert not image.isNull()
    assert image.width() > 400
    assert image.pixelColor(0, 0) == QColor("white")
    assert image.pixelColor(image.width() - 1, image.height() - 1) == QColor("white")
    shades = {
        image.pixelColor(x, y).lightness() for x in range(0, image.width(), 3) for y in range(0, image.height(), 3)
    }
    assert min(shades) < 60


def test_bars_are_copied_as_bars(example: Hands) -> None:
    """What is copied is what is shown."""
    example.do("copy-picture")
    people = QGuiApplication.clipboard().image()
    example.do("bars")
    example.do("copy-picture")
    bars = QGuiApplication.clipboard().image()
    assert bars.height() < people.height()


def test_a_withheld_picture_is_not_copied(example: Hands) -> None:
    """A case-control study without a starting risk has figures to copy, but no picture."""
    example.choose(example.window.printed.design, "case-control study")
    example.do("copy-picture")
    assert copied_text() == "before"
    assert notice(example) not in ("", labels.COPIED["copy-picture"])
    example.do("copy-text")
    assert "0.49 times" in copied_text()


@pytest.mark.parametrize(
    ("link", "command"), [("says", "copy-text"), ("says", "copy-table"), ("patient", "copy-picture")]
)
def test_links_copy_as_the_commands_do(example: Hands, link: str, command: str) -> None:
    """The words under the figures and under the picture copy them, by Enter as well."""
    window = example.window
    places = {
        "copy-text": window.says.copies[0],
        "copy-table": window.says.copies[1],
        "copy-picture": window.patient.figures.copy,
    }
    widget = places[command]
    assert widget.isVisible()
    widget.setFocus()
    example.press("Return")
    assert notice(example) == labels.COPIED[command]
