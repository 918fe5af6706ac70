"""The curve's window: it follows the record, is drawn elsewhere, and says everything in words."""

from __future__ import annotations

import threading
from collections.abc import Iterator
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt
from PySide6.QtTest import QTest
from PySide6.QtWidgets import QTableWidget, QWidget

from curve_hands import ODDS, choose, curve_shown, drawn
from fourcount.face import curve_window
from fourcount.face.curve_window import CurveWindow, open_curve
from fourcount.face.later import Later
from fourcount.ink.curve import draw_curve
from fourcount.wording import curve_labels as labels
from fourcount.wording.curve import NOTHING

if TYPE_CHECKING:
    from conftest import Hands


@pytest.fixture
def shown(example: Hands) -> Iterator[CurveWindow]:
    """The curve of the worked example's counts."""
    with curve_shown(example) as opened:
        yield opened


def test_the_command_opens_it_once(example: Hands, shown: CurveWindow) -> None:
    """Asked for again, the same window comes to the front."""
    assert open_curve(example.window) is shown
    assert len(example.window.findChildren(CurveWindow)) == 1


def test_the_window_is_live_before_the_first_drawing(example: Hands, monkeypatch: pytest.MonkeyPatch) -> None:
    """Until the drawing is there it says so, nothing can be saved yet, and typing goes on meanwhile."""
    go, threads = threading.Event(), []

    def slow(*request: object) -> bytes:
        threads.append(threading.current_thread())
        go.wait(10)
        return draw_curve(*request)  # type: ignore[arg-type]

    monkeypatch.setattr(curve_window, "draw_curve", slow)
    opened = open_curve(example.window)
    example.qtbot.waitUntil(lambda: bool(threads))
    assert threads[0] is not threading.main_thread()
    assert opened.canvas.image.isNull()
    assert not opened.save.isEnabled()
    assert "17.1%" in opened.sentence.text()
    before = opened.canvas.grab().toImage()
    example.window.activateWindow()
    example.qtbot.waitUntil(example.window.isActiveWindow)
    example.write(example.window.printed.grid.cells["first_left_text"], "50")
    assert "50" in example.texts
    go.set()
    drawn(example, opened)
    assert opened.save.isEnabled()
    assert opened.canvas.grab().toImage() != before
    opened.close()


def test_it_follows_the_record(example: Hands, shown: CurveWindow) -> None:
    """A starting risk typed in the main window moves the sentence and the drawing."""
    before = drawn(example, shown)
    example.window.session.edit_text("starting_risk_text", "12%")
    example.qtbot.waitUntil(lambda: "At a starting risk of 12%: 6.5%" in shown.sentence.text())
    assert drawn(example, shown) != before


def test_it_follows_undo(example: Hands, shown: CurveWindow) -> None:
    """What is undone in the main window is undone here."""
    example.window.session.edit_text("starting_risk_text", "12%")
    example.qtbot.waitUntil(lambda: "12%" in shown.sentence.text())
    example.window.session.undo()
    example.qtbot.waitUntil(lambda: "12%" not in shown.sentence.text())


def test_every_view_can_be_chosen_by_keyboard(example: Hands, shown: CurveWindow) -> None:
    """Each effect's band, and the odds ratio as a risk ratio, by arrows in the choice."""
    images = [drawn(example, shown)]
    for place in range(1, shown.view.count()):
        choose(example, shown, shown.view.itemText(place))
        images.append(shown.canvas.image)
    assert shown.view.currentText() == ODDS
    assert "the odds ratio is a risk ratio of" in shown.sentence.text()
    assert all(image != other for i, image in enumerate(images) for other in images[:i])


def test_a_chosen_view_stays_while_the_numbers_change(example: Hands, shown: CurveWindow) -> None:
    """Typing does not put the choice back."""
    choose(example, shown, ODDS)
    example.window.session.edit_text("first_left_text", "40")
    drawn(example, shown)
    assert shown.view.currentText() == ODDS


def test_a_view_that_is_gone_gives_way(example: Hands, shown: CurveWindow) -> None:
    """Where its effect cannot be carried any more, the usual one is drawn."""
    choose(example, shown, ODDS)
    example.window.session.edit_text("second_left_text", "0")
    drawn(example, shown)
    assert shown.view.currentText() == "Risk with: risk difference and its interval"


def test_without_an_effect_it_says_so(example: Hands, shown: CurveWindow) -> None:
    """Cells that give nothing leave a sentence, and nothing to save."""
    example.window.session.edit_text("first_left_text", "x")
    example.qtbot.waitUntil(lambda: shown.notes.text() == NOTHING)
    assert not shown.save.isEnabled()
    assert shown.table.rowCount() == 0


def test_the_whole_range_can_be_seen(example: Hands, shown: CurveWindow) -> None:
    """One command shows all starting risks, and is then the way back."""
    before = drawn(example, shown)
    example.click(shown.whole)
    assert drawn(example, shown) != before
    assert shown.whole.text() == labels.NEAR
    example.click(shown.whole)
    assert drawn(example, shown) == before


def test_the_same_numbers_are_a_table(example: Hands, shown: CurveWindow) -> None:
    """Shown on demand, walked through by keyboard, never changed."""
    assert shown.table.isHidden()
    example.click(shown.numbers)
    assert shown.table.isVisible()
    heads = [shown.table.horizontalHeaderItem(column).text() for column in range(4)]
    assert heads[0] == "Starting risk"
    assert heads[1].startswith("Risk ratio 0.54")
    cells = {shown.table.item(row, 0).text(): shown.table.item(row, 1).text() for row in range(shown.table.rowCount())}
    assert cells["17.1% (the study and this patient)"] == "9.2% (6.4 to 13.3%)"
    assert shown.table.editTriggers() == QTableWidget.EditTrigger.NoEditTriggers
    example.click(shown.numbers)
    assert shown.table.isHidden()


@pytest.mark.parametrize("zoom", [1.0, 1.5, 2.0])
def test_heads_of_the_table_are_seen_whole(example: Hands, shown: CurveWindow, zoom: float) -> None:
    """However many lines a head takes in its column, at every text size; no row is cut either."""
    example.window.look.set_zoom(zoom)
    example.click(shown.numbers)
    table, head = shown.table, shown.table.horizontalHeader()

    def room(column: int) -> int:
        text = table.horizontalHeaderItem(column).text()
        return head.fontMetrics().boundingRect(
            0, 0, table.columnWidth(column) - 8, 0, Qt.TextFlag.TextWordWrap.value, text
        ).height()  # fmt: skip

    example.qtbot.waitUntil(lambda: head.font() == example.window.look.font("body"))
    example.qtbot.waitUntil(lambda: all(head.height() >= room(column) for column in range(table.columnCount())))
    assert any(room(column) > head.fontMetrics().height() for column in range(table.columnCount()))
    example.qtbot.waitUntil(lambda: table.height() >= head.height() + table.verticalHeader().length())


@pytest.mark.parametrize("view", [0, 1, 2, 3])
@pytest.mark.parametrize(("zoom", "size"), [(1.0, (360, 300)), (2.0, (700, 600)), (2.0, (480, 400))])
def test_words_of_any_length_are_no_error_in_a_small_window(
    example: Hands, shown: CurveWindow, zoom: float, size: tuple[int, int], view: int
) -> None:
    """Whatever is typed, the drawing is made and the description has all of it."""
    span = "within two years and a day " * 74
    for field in ("span_text", "name_text", "left_words_text", "first_label_text", "second_label_text"):
        example.window.session.edit_text(field, span)
    example.window.look.set_zoom(zoom)
    shown.resize(*size)
    choose(example, shown, shown.view.itemText(view))
    assert shown.canvas.accessibleDescription().count(span.strip()) >= 1
    example.click(shown.copy)
    assert shown.notice.text() == labels.COPIED


def test_a_screen_reader_hears_all_of_it(shown: CurveWindow) -> None:
    """The drawing is one object with a name and a description; every control has a name."""
    assert shown.canvas.accessibleName() == "Across starting risks: had the event"
    assert "whichever effect is kept constant" in shown.canvas.accessibleDescription()
    assert "assumption" in shown.canvas.accessibleDescription()
    for widget in (shown.view, shown.whole, shown.numbers, shown.save, shown.copy, shown.table):
        assert widget.accessibleName()


def test_tab_walks_every_control(example: Hands, shown: CurveWindow) -> None:
    """Tab goes from the choice to the buttons and round again."""
    shown.view.setFocus(Qt.FocusReason.TabFocusReason)
    walked: list[QWidget] = []
    while example.focus not in walked:
        walked.append(example.focus)
        QTest.keyClick(example.focus, Qt.Key.Key_Tab)
    stops = [shown.view, shown.whole, shown.numbers, shown.canvas, shown.save, shown.copy]
    assert [widget for widget in walked if widget in stops] == stops


def test_it_is_drawn_anew_in_the_dark_and_at_larger_text(example: Hands, shown: CurveWindow) -> None:
    """Palette and text size are those of the window."""
    light = drawn(example, shown)
    example.window.look.set_appearance("dark")
    dark = drawn(example, shown)
    assert dark.pixelColor(2, 2).lightness() < 60 < light.pixelColor(2, 2).lightness()
    example.window.look.set_zoom(2.0)
    assert drawn(example, shown) != dark


def test_escape_leaves_and_nothing_follows(example: Hands, shown: CurveWindow) -> None:
    """The closed window draws no more, and the main one goes on."""
    QTest.keyClick(shown, Qt.Key.Key_Escape)
    example.qtbot.waitUntil(lambda: not example.window.findChildren(CurveWindow))
    example.window.session.edit_text("first_left_text", "40")
    assert example.window.findChildren(CurveWindow) == []


def test_an_error_in_drawing_is_told_to_the_window(example: Hands, monkeypatch: pytest.MonkeyPatch) -> None:
    """It surfaces in the window's thread, where the program listens for the unexpected; later drawings go on."""

    def broken(*request: object) -> bytes:
        raise ValueError("no ink")

    monkeypatch.setattr(curve_window, "draw_curve", broken)
    with example.qtbot.captureExceptions() as errors:
        opened = open_curve(example.window)
        example.qtbot.waitUntil(lambda: bool(errors))
    assert str(errors[0][1]) == "no ink"
    monkeypatch.setattr(curve_window, "draw_curve", draw_curve)
    example.click(opened.whole)
    assert not drawn(example, opened).isNull()
    opened.close()


def test_a_worker_that_is_closed_answers_nothing(example: Hands) -> None:
    """What is asked of it afterwards is never begun."""
    from fourcount.face.curve_worker import CurveWorker

    later = Later()
    worker, begun = CurveWorker(later), []
    worker.close()
    worker.ask("key", lambda: begun.append("drawn") or b"")
    assert later.finish(5.0)
    assert begun == []
