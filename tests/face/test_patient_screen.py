"""The patient view: full screen, one outcome at a time, dark on white; refused until nothing is missing."""

from __future__ import annotations

from collections.abc import Callable

import pytest
from msgspec.structs import replace
from PySide6.QtCore import Qt
from PySide6.QtGui import QAccessible, QColor, QImage, QKeySequence
from PySide6.QtTest import QTest
from PySide6.QtWidgets import QAbstractButton, QApplication
from pytestqt.qtbot import QtBot

from fourcount.face import patient_screen
from fourcount.face.patient_screen import PatientScreen, open_screen
from fourcount.face.window import MainWindow
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from patient_outcomes import AT_TWELVE, HARM, SMALL, TRIAL, WELCOME

UNNAMED = replace(TRIAL, span_text="", name_text="Sleep")
SEVERAL = Record(title_text="Night lights", outcomes=(AT_TWELVE, HARM, UNNAMED, WELCOME))

Opened = Callable[..., tuple[MainWindow, PatientScreen]]


@pytest.fixture
def opened(open_window: Callable[..., MainWindow], qtbot: QtBot) -> Opened:
    """A window on a record, with the patient view over it."""

    def make(*outcomes: Outcome) -> tuple[MainWindow, PatientScreen]:
        window = open_window(Record(outcomes=outcomes) if outcomes else SEVERAL)
        screen = open_screen(window)
        assert screen is not None
        qtbot.waitUntil(screen.isVisible)
        return window, screen

    return make


def press(screen: PatientScreen, *keys: str) -> None:
    """Press keys in the patient view."""
    for key in keys:
        QTest.keyClick(screen.canvas, QKeySequence(key)[0].key())


def title(screen: PatientScreen) -> str:
    """What the page is about, as a screen reader says it."""
    return screen.canvas.accessibleName()


def test_it_fills_the_screen(opened: Opened) -> None:
    """Nothing but the page is there to be seen."""
    _, screen = opened()
    assert screen.isFullScreen()
    assert title(screen) == "Falls in 12 months"


def test_arrows_lead_among_the_outcomes_that_are_ready(opened: Opened) -> None:
    """The unfinished one is passed over; the count is of those that can be shown; the ends are ends."""
    _, screen = opened()
    assert screen.place.text() == "1 of 3"
    press(screen, "Right", "Right")
    assert (title(screen), screen.place.text()) == ("Healing in 12 weeks", "3 of 3")
    press(screen, "Right")
    assert screen.place.text() == "3 of 3"
    press(screen, "Left")
    assert title(screen) == "Bleeding in 12 months"
    press(screen, "End", "Home")
    assert screen.place.text() == "1 of 3"


def test_the_links_do_what_the_arrows_do(opened: Opened) -> None:
    """Back and Next can be clicked, and are off at the ends."""
    _, screen = opened()
    assert not screen.back.isEnabled()
    QTest.mouseClick(screen.next, Qt.MouseButton.LeftButton)
    assert screen.place.text() == "2 of 3"
    QTest.mouseClick(screen.back, Qt.MouseButton.LeftButton)
    assert screen.place.text() == "1 of 3"


def test_one_outcome_has_nowhere_to_go(opened: Opened) -> None:
    """No count and no arrows where there is one outcome."""
    _, screen = opened(TRIAL)
    assert not screen.back.isVisible()
    assert not screen.next.isVisible()
    assert screen.place.text() == ""


def test_escape_leaves(opened: Opened, qtbot: QtBot) -> None:
    """Escape closes the view and nothing else."""
    window, screen = opened()
    with qtbot.waitSignal(screen.destroyed):
        press(screen, "Escape")
    assert window.isVisible()


def test_it_begins_with_the_outcome_in_view(open_window: Callable[..., MainWindow]) -> None:
    """What the clinician looks at is what the patient is shown first."""
    window = open_window(SEVERAL)
    window.session.look_at(3)
    screen = open_screen(window)
    assert screen is not None
    assert title(screen) == "Healing in 12 weeks"


def test_it_is_refused_with_what_is_missing(open_window: Callable[..., MainWindow]) -> None:
    """Without a time span there is no view; the window says what to fill in, and no longer once it is filled in."""
    window = open_window(Record(outcomes=(UNNAMED,)))
    assert open_screen(window) is None
    assert window.banner.isVisible()
    assert window.banner.words.text() == "Before a patient is shown this, fill in “Time span”."
    window.session.edit_text("span_text", "12 months")
    assert open_screen(window) is not None
    assert not window.banner.isVisible()


@pytest.mark.parametrize("outcome", [Outcome(), replace(TRIAL, table=Outcome().table)], ids=["empty", "no counts"])
def test_an_unfinished_table_is_refused(open_window: Callable[..., MainWindow], outcome: Outcome) -> None:
    """No counts, no view, and a sentence."""
    window = open_window(Record(outcomes=(outcome,)))
    assert open_screen(window) is None
    assert window.banner.words.text()


def test_it_is_white_in_a_dark_window(opened: Opened) -> None:
    """Dark on white for a projector, whatever the window looks like."""
    window, screen = opened()
    window.look.set_appearance("dark")
    image = screen.grab().toImage()
    corners = [(2, 2), (image.width() - 3, 2), (2, image.height() - 3)]
    assert {image.pixelColor(*corner).name() for corner in corners} == {QColor("#FFFFFF").name()}


def test_the_whole_page_is_told_to_a_screen_reader(opened: Opened) -> None:
    """One object with the full sentences; every control has a name; a step is told as another page."""
    _, screen = opened()
    told = QAccessible.queryAccessibleInterface(screen.canvas)
    description = told.text(QAccessible.Text.Description)
    for part in (
        "12 in 100",
        "6 fewer of these 100",
        "We cannot say which people.",
        "How sure the evidence is: not rated, so nobody has judged it here.",
    ):
        assert part in description
    assert all(button.accessibleName() for button in screen.findChildren(QAbstractButton) if button.isVisible())
    press(screen, "Right")
    assert "10 more of these 100 bleed" in told.text(QAccessible.Text.Description)


def test_tab_walks_what_can_be_pressed(opened: Opened, qtbot: QtBot) -> None:
    """From the page to Next, the range and the way out, each at least 24 pixels high."""
    _, screen = opened()
    qtbot.waitUntil(screen.isActiveWindow)
    screen.canvas.setFocus()
    seen = []
    for _ in range(3):
        QTest.keyClick(QApplication.focusWidget() or screen, Qt.Key.Key_Tab)
        seen.append(QApplication.focusWidget())
    assert seen == [screen.next, screen.range, screen.leave]
    assert all(widget is not None and widget.height() >= 24 for widget in seen)


def test_the_range_is_one_click_away(opened: Opened) -> None:
    """Off at first; on, the sentence names both ends, and the link turns round."""
    _, screen = opened(TRIAL)
    before = screen.grab().toImage()
    QTest.mouseClick(screen.range, Qt.MouseButton.LeftButton)
    assert screen.range.text() == "Hide the range"
    assert screen.grab().toImage() != before
    QTest.mouseClick(screen.range, Qt.MouseButton.LeftButton)
    assert screen.grab().toImage() == before


def at_one_size(screen: PatientScreen) -> QImage:
    """The page as it is drawn in a window of 1,000 by 700."""
    screen.showNormal()
    screen.resize(1000, 700)
    QApplication.sendPostedEvents()
    return screen.canvas.grab().toImage()


@pytest.mark.parametrize("drawn", [{"icons": "dot"}, {"arrangement": "one"}, {"arrangement": "bars"}], ids=str)
def test_it_draws_as_the_clinician_chose(opened: Opened, drawn: dict[str, str]) -> None:
    """Icons and arrangement are those of the window; the range and the relative picture never come uncalled."""
    window, screen = opened(TRIAL)
    usual = at_one_size(screen)
    screen.close()
    window.patient.set_options(window.patient.options._replace(**drawn, uncertainty=True, relative=True))
    other = open_screen(window)
    assert other is not None
    assert other.range.text() == "Show the range"
    assert at_one_size(other) != usual


def test_it_follows_the_record(opened: Opened, qtbot: QtBot) -> None:
    """A change is seen at once; where nothing can be shown any more the view closes."""
    window, screen = opened(TRIAL)
    window.session.edit_text("name_text", "Tumbles")
    assert title(screen) == "Tumbles in 12 months"
    with qtbot.waitSignal(screen.destroyed):
        window.session.edit_text("span_text", "")


@pytest.mark.parametrize("zoom", [1.0, 1.5, 2.0])
@pytest.mark.parametrize("size", [(1024, 700), (640, 480)], ids=str)
def test_nothing_is_lost_at_larger_text(opened: Opened, zoom: float, size: tuple[int, int]) -> None:
    """The page is as wide as the screen, what is taller can be scrolled to, and every link keeps its whole words."""
    window, screen = opened()
    window.look.set_zoom(zoom)
    screen.showNormal()
    screen.resize(*size)
    QApplication.sendPostedEvents()
    assert screen.canvas.width() <= screen.width()
    bar = screen._scroll.verticalScrollBar()
    assert bar.maximum() >= screen.canvas.height() - screen._scroll.height()
    shown = [link for link in (screen.next, screen.range, screen.leave) if link.isVisible()]
    assert all(link.width() >= link.fontMetrics().horizontalAdvance(link.text()) for link in shown)
    assert all(screen.rect().contains(link.geometry().translated(screen._links.pos())) for link in shown)


def test_down_scrolls_a_page_that_is_taller(opened: Opened) -> None:
    """Up and down move the page where it is taller than the screen."""
    window, screen = opened()
    window.look.set_zoom(2.0)
    screen.showNormal()
    screen.resize(700, 420)
    QApplication.sendPostedEvents()
    press(screen, "Down")
    assert screen._scroll.verticalScrollBar().value() > 0


def test_a_page_that_is_scrolled_to_is_drawn_inside_its_frame(opened: Opened, qtbot: QtBot) -> None:
    """A page taller than the screen has a frame while it has the focus, and the page is seen in it."""
    window, screen = opened(SMALL)
    window.look.set_zoom(2.0)
    screen.showNormal()
    screen.resize(800, 700)
    qtbot.waitUntil(screen.isActiveWindow)
    screen.canvas.setFocus()
    QApplication.sendPostedEvents()
    assert screen.canvas.hasFocus()
    assert screen.canvas.height() > screen._scroll.height()
    image = screen.canvas.grab().toImage()
    rows = [{image.pixelColor(x, y).name() for x in range(4, image.width() - 4, 3)} for y in range(4, 900, 9)]
    assert any(len(shades) > 4 for shades in rows)
    assert any(shades == {"#ffffff"} for shades in rows)


def test_asked_for_twice_there_is_one(opened: Opened) -> None:
    """The view that is open comes to the front, with the outcome that the window then shows."""
    window, screen = opened()
    window.session.look_at(1)
    assert open_screen(window) is screen
    assert title(screen) == "Bleeding in 12 months"
    assert len(window.findChildren(PatientScreen)) == 1


def test_one_that_was_left_is_not_found_again(opened: Opened) -> None:
    """After Escape the next one is another."""
    window, screen = opened()
    press(screen, "Escape")
    again = open_screen(window)
    assert again is not None
    assert again is not screen
    assert again.isVisible()


def test_arrows_turn_outcomes_from_every_link(opened: Opened, qtbot: QtBot) -> None:
    """After Tab to the range or the way out, the arrows still lead to the next page and leave the focus where it is."""
    _, screen = opened()
    qtbot.waitUntil(screen.isActiveWindow)
    screen.range.setFocus()
    QTest.keyClick(screen.range, Qt.Key.Key_Right)
    assert screen.place.text() == "2 of 3"
    QTest.keyClick(screen.range, Qt.Key.Key_Left)
    assert screen.place.text() == "1 of 3"
    assert screen.range.hasFocus()
    QTest.keyClick(screen.leave, Qt.Key.Key_Right)
    assert screen.place.text() == "2 of 3"


def test_it_keeps_its_outcome_while_others_move(opened: Opened) -> None:
    """Moved, the outcome that the patient sees stays in view; edited too; removed, the window's own takes its place."""
    window, screen = opened(*(replace(AT_TWELVE, name_text=name) for name in ("One", "Two", "Three", "Four")))
    window.session.look_at(2)
    open_screen(window)
    assert title(screen) == "Three in 12 months"
    window.outcomes.move_left()
    assert (title(screen), screen.place.text()) == ("Three in 12 months", "2 of 4")
    window.session.edit_text("name_text", "Third")
    assert (title(screen), screen.place.text()) == ("Third in 12 months", "2 of 4")
    window.outcomes.remove()
    assert screen.place.text() == f"{window.session.view + 1} of 3"


def test_a_keystroke_looks_at_what_changed_alone(opened: Opened, monkeypatch: pytest.MonkeyPatch) -> None:
    """Of many outcomes one keystroke asks one whether it is ready, and what it says is on the page."""
    window, screen = opened(*(replace(AT_TWELVE, name_text=f"Outcome {n}") for n in range(12)))
    asked: list[str] = []
    why_of = patient_screen.why_of

    def counted(outcome: Outcome, choices: Choices) -> str:
        asked.append(outcome.name_text)
        return why_of(outcome, choices)

    monkeypatch.setattr(patient_screen, "why_of", counted)
    window.session.edit_text("name_text", "Falls")
    assert asked == ["Falls"]
    assert title(screen) == "Falls in 12 months"


def test_a_page_that_stays_keeps_its_place(opened: Opened) -> None:
    """What changes elsewhere in the record leaves a page where it was; another outcome begins at its top."""
    window, screen = opened()
    window.look.set_zoom(2.0)
    screen.showNormal()
    screen.resize(900, 500)
    QApplication.sendPostedEvents()
    press(screen, "Down")
    place = screen._scroll.verticalScrollBar().value()
    assert place > 0
    window.session.edit_text("title_text", "Another title")
    window.session.edit_text("second_label_text", "Care as usual")
    assert screen._scroll.verticalScrollBar().value() == place
    press(screen, "Right")
    assert screen._scroll.verticalScrollBar().value() == 0
