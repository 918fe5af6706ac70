"""Several outcomes of one paper: tabs and commands go among them, and every change of them can be undone."""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import QPoint, Qt
from PySide6.QtGui import QAccessible
from PySide6.QtTest import QTest

from fourcount.face.outcomes_bar import OutcomesBar
from fourcount.record import editing
from fourcount.record.outcome import EventsAndOthers, Outcome
from fourcount.record.paper import Record

if TYPE_CHECKING:
    from conftest import Hands
    from fourcount.face.window import MainWindow

NAMES = ("Falls", "Poor sleep", "Death")


def paper(names: tuple[str, ...] = NAMES) -> Record:
    """Invented outcomes, each with counts of its own."""
    outcomes = tuple(
        Outcome(
            name_text=name,
            table=EventsAndOthers(
                first_left_text=str(10 + place), first_right_text="90", second_left_text="20", second_right_text="80"
            ),
        )
        for place, name in enumerate(names)
    )
    return Record(outcomes=outcomes)


@pytest.fixture
def three(open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands]) -> Hands:
    """Hands at a window with three outcomes, the first of them in view."""
    return at(open_window(paper()))


def bar(hands: Hands) -> OutcomesBar:
    """The tabs and the plus."""
    found = hands.window.header.bar
    assert found is not None
    return found


def tabs(hands: Hands) -> list[str]:
    """What the tabs say."""
    return [bar(hands).tabs.tabText(place) for place in range(bar(hands).tabs.count())]


def in_view(hands: Hands) -> str:
    """The name in the first column, which the tab in view carries too."""
    name = hands.window.printed.name.text()
    assert tabs(hands)[bar(hands).tabs.currentIndex()] == (name or f"Outcome {hands.window.session.view + 1}")
    return name


def press_tab(hands: Hands, place: int) -> None:
    """Press a tab with the mouse."""
    QTest.mouseClick(bar(hands).tabs, Qt.MouseButton.LeftButton, pos=bar(hands).tabs.tabRect(place).center())


def test_each_outcome_has_a_tab_and_the_first_is_in_view(three: Hands) -> None:
    """The tabs carry the outcomes' names in their order."""
    assert tabs(three) == list(NAMES)
    assert in_view(three) == "Falls"


def test_an_unnamed_outcome_is_called_by_its_place(hands: Hands) -> None:
    """The first start has one tab, called by its place until it has a name."""
    assert tabs(hands) == ["Outcome 1"]
    hands.write(hands.window.printed.name, "Pain & fever")
    assert tabs(hands) == ["Pain && fever"]  # a single ampersand would be an access key
    assert bar(hands).tabs.tabToolTip(0) == "Pain & fever" or "Pain &amp; fever" in bar(hands).tabs.tabToolTip(0)


def test_a_tab_shows_its_outcome_everywhere(three: Hands) -> None:
    """Counts, measures and picture are those of the tab that was pressed, and nothing was changed."""
    record = three.window.session.record
    press_tab(three, 2)
    assert in_view(three) == "Death"
    assert three.texts == ("12", "90", "20", "80")
    assert three.window.patient.figures.drawn.plan.with_risk == pytest.approx(12 / 102)
    assert three.window.session.record is record
    assert not three.window.session.can_undo


def test_keys_go_round_among_the_outcomes(three: Hands) -> None:
    """Next and previous go through all and on from the ends."""
    seen = []
    for _ in NAMES:
        three.do("outcome-next")
        seen.append(in_view(three))
    assert seen == ["Poor sleep", "Death", "Falls"]
    three.do("outcome-previous")
    assert in_view(three) == "Death"


def test_arrows_go_through_the_tabs(three: Hands) -> None:
    """With the focus on the tabs, Left and Right show the neighbour."""
    bar(three).tabs.setFocus(Qt.FocusReason.TabFocusReason)
    three.press("Right", times=2)
    assert in_view(three) == "Death"
    three.press("Left")
    assert in_view(three) == "Poor sleep"


def test_a_new_outcome_is_of_the_same_study(three: Hands) -> None:
    """It stands behind the one in view, takes groups and span along, and the cursor is in its first count."""
    three.write(three.window.printed.span, "12 months")
    three.write(three.window.printed.grid.labels["first"], "Night lights")
    three.click(bar(three).plus)
    assert tabs(three) == ["Falls", "Outcome 2", "Poor sleep", "Death"]
    assert three.field == "first_left_text"
    assert three.texts == ("", "", "", "")
    assert three.window.printed.span.text() == "12 months"
    assert three.window.printed.grid.labels["first"].text() == "Night lights"
    three.write(three.window.printed.name, "Pain")
    assert tabs(three)[1] == "Pain"
    three.do("undo")
    three.do("undo")
    assert tabs(three) == list(NAMES)
    assert in_view(three) == "Falls"


def test_a_copy_stands_behind_its_outcome(three: Hands) -> None:
    """The copy is in view, equal to what was copied."""
    three.do("outcome-copy")
    record = three.window.session.record
    assert record.outcomes[0] == record.outcomes[1]
    assert three.window.session.view == 1


def test_an_outcome_moves_with_the_view(three: Hands) -> None:
    """Moved by key it stays in view; undo moves it back."""
    three.do("outcome-right")
    assert tabs(three) == ["Poor sleep", "Falls", "Death"]
    assert in_view(three) == "Falls"
    three.do("outcome-right")
    three.do("outcome-right")  # at the end nothing happens
    assert tabs(three) == ["Poor sleep", "Death", "Falls"]
    three.do("outcome-left")
    assert tabs(three) == ["Poor sleep", "Falls", "Death"]
    three.press("Ctrl+Z", times=3)
    assert tabs(three) == list(NAMES)


def test_a_tab_is_pulled_to_another_place(three: Hands) -> None:
    """Pressed, moved and let go over another tab, the outcome stands there, as one step."""
    line = bar(three).tabs
    start, end = line.tabRect(0).center(), line.tabRect(2).center()
    QTest.mousePress(line, Qt.MouseButton.LeftButton, pos=start)
    for x in (start.x() + 15, end.x()):
        QTest.mouseMove(line, QPoint(x, start.y()))
    QTest.mouseRelease(line, Qt.MouseButton.LeftButton, pos=end)
    three.qtbot.waitUntil(lambda: tabs(three) == ["Poor sleep", "Death", "Falls"])
    assert in_view(three) == "Falls"
    three.window.session.undo()
    assert tabs(three) == list(NAMES)


def test_a_removed_outcome_is_told_and_comes_back(three: Hands) -> None:
    """Its neighbour is in view, a notice names what is gone, and undo brings back the very same."""
    record = three.window.session.record
    three.do("outcome-next")
    three.do("outcome-remove")
    assert tabs(three) == ["Falls", "Death"]
    assert in_view(three) == "Death"
    assert three.notice == "Poor sleep removed. Undo brings it back."
    three.do("undo")
    assert three.window.session.record == record
    assert in_view(three) == "Poor sleep"


def test_the_last_outcome_is_only_emptied(example: Hands) -> None:
    """A paper keeps one outcome at least."""
    example.do("outcome-remove")
    assert example.window.session.record.outcomes == (Outcome(),)
    assert not example.window.actions_by_key["outcome-remove"].isEnabled()


def test_undo_brings_the_field_of_another_outcome_into_view(three: Hands) -> None:
    """What was typed into one outcome comes back with that outcome and the cursor in its field."""
    three.write(three.window.printed.span, "2 years")
    three.write(three.window.patient.baseline, "12%")
    press_tab(three, 1)
    three.do("first-cell")
    three.do("undo")
    assert in_view(three) == "Falls"
    assert three.field == "starting_risk_text"
    three.do("undo")
    assert three.field == "span_text"
    press_tab(three, 2)
    three.do("redo")
    assert in_view(three) == "Falls"
    assert three.window.printed.span.text() == "2 years"


def test_only_commands_that_would_do_something_are_offered(three: Hands) -> None:
    """The ends offer no move beyond them, and a lone outcome no neighbour."""
    actions = three.window.actions_by_key
    assert not actions["outcome-left"].isEnabled()
    assert actions["outcome-right"].isEnabled()
    three.do("outcome-previous")
    assert actions["outcome-left"].isEnabled()
    assert not actions["outcome-right"].isEnabled()
    three.do("new")
    assert not any(actions[key].isEnabled() for key in ("outcome-next", "outcome-previous", "outcome-remove"))


def test_a_full_paper_says_so(open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands]) -> None:
    """Two hundred outcomes are the most; neither plus nor copy is offered then."""
    names = tuple(f"Outcome {place + 1}" for place in range(editing.MOST_OUTCOMES))
    hands = at(open_window(paper(names)))
    assert not hands.window.actions_by_key["outcome-add"].isEnabled()
    hands.window.outcomes.add()
    assert len(tabs(hands)) == editing.MOST_OUTCOMES
    assert hands.notice == "A paper holds 200 outcomes at most."
    assert hands.window.header.bar.width() <= hands.window.width()


def test_a_screen_reader_hears_which_outcome_of_how_many(three: Hands) -> None:
    """Each tab has its name and its place, and the plus says what it adds."""
    line = bar(three).tabs
    assert line.accessibleTabName(1) == "Poor sleep, 2 of 3"
    assert line.accessibleName() == "Outcomes"
    assert QAccessible.queryAccessibleInterface(bar(three).plus).text(QAccessible.Text.Name) == "Add an outcome"


@pytest.mark.parametrize("zoom", [1.0, 2.0])
@pytest.mark.parametrize("width", [480, 1024, 1280])
def test_many_outcomes_leave_room_for_the_title(three: Hands, width: int, zoom: float) -> None:
    """However many tabs there are, title, source and plus stay inside the window, and targets stay large."""
    window = three.window
    window.session.change_record(paper(tuple(f"A long name of outcome {place}" for place in range(12))))
    window.resize(width, 700)
    window.look.set_zoom(zoom)

    def fits() -> bool:
        plus, title = bar(three).plus, window.header.title
        right = plus.mapTo(window, plus.rect().topRight()).x()
        return right < window.width() and title.width() >= window.look.px(100) and plus.width() >= 24

    three.qtbot.waitUntil(fits)


def test_a_long_notice_finds_its_room(three: Hands) -> None:
    """While a notice needs more than is free beside many tabs, the source steps aside, and comes back."""
    window = three.window
    window.session.change_record(paper(tuple(f"A long name of outcome {place}" for place in range(12))))
    window.resize(1024, 700)
    window.header.tell("Nothing copied: the table is not whole.")
    three.qtbot.waitUntil(lambda: window.header.notice.width() >= window.header.notice.sizeHint().width())
    assert not window.header.source.isVisible()
    window.header.tell("")
    assert window.header.source.isVisible()
