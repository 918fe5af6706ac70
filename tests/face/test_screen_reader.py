"""A screen reader's walk through the window: names, order, the picture and its table, focus that is seen.

Qt for Python offers no handler of accessibility events, so that what is sent when figures change cannot be caught. Qt
sends "name changed" and "description changed" with every name and description that is set on a widget, and "data
changed" with every cell of a table: what is held here is that names, descriptions and cells are those of the figures.
"""

from __future__ import annotations

from collections.abc import Iterator
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt
from PySide6.QtGui import QAccessible, QGuiApplication
from PySide6.QtWidgets import QComboBox, QLineEdit, QWidget

from fourcount.face.look import APPEARANCES
from fourcount.record.outcome import FORMS
from screen_reader import Role, faults, names, one_of, reading_order, rows_of_table, tab_order, tree
from seen_focus import unseen_focus

if TYPE_CHECKING:
    from conftest import Hands


def open_all_rows(hands: Hands) -> None:
    """Open every row that few papers need."""
    optional = hands.window.printed.rare.optional
    assert optional is not None
    for link in (*optional.links.values(), *hands.window.patient.quiet.links.values()):
        if link.isVisible():
            link.click()
    hands.do("own-line")


def show_all_measures(hands: Hands) -> None:
    """Every measure, the working of one, and the relative figure as a picture."""
    hands.do("more")
    hands.row("risk_ratio").click()
    hands.do("relative")


def paste(hands: Hands) -> None:
    """Paste a table, and leave what was understood on screen."""
    QGuiApplication.clipboard().setText("38\t412\n70\t409")
    hands.do("paste")


def tell(hands: Hands) -> None:
    """Have a notice and a banner on screen."""
    hands.do("copy-text")
    hands.window.tell_unexpected("ValueError", "/a/place")


def run_across(hands: Hands) -> None:
    """Turn the table over."""
    hands.do("layout")


def narrow(hands: Hands) -> None:
    """Make the window as narrow as it goes."""
    hands.window.resize(hands.window.minimumSize())


def enlarge(hands: Hands) -> None:
    """Set all text at 200%."""
    while hands.window.look.zoom < 2:
        hands.do("bigger")


ARRANGED = {
    "all measures": show_all_measures,
    "paste": paste,
    "told": tell,
    "across": run_across,
    "narrow": narrow,
    "200%": enlarge,
}


def bring_about(hands: Hands, state: str) -> None:
    """Put the window into a state that somebody can meet it in."""
    if state != "first start":
        hands.do("example")
    if state in FORMS:
        hands.do("outcome-copy")
        hands.fill(state)  # type: ignore[arg-type]
        open_all_rows(hands)
    elif state in ("three", "rate", "overall"):
        hands.window.commands.choose("start_kind", state)
        for field, text in zip(hands.window.patient.start.shown, ("5%", "12%", "25%"), strict=False):
            hands.write(field, text)
    elif state == "case-control":
        hands.choose(hands.window.printed.design, "case-control study")
        hands.write(hands.window.patient.baseline, "2%")
    elif state == "wrong":
        hands.write(hands.window.printed.grid.cells["first_left_text"], "abc")
        hands.write(hands.window.patient.baseline, "120%")
    elif state in ARRANGED:
        ARRANGED[state](hands)


TYPED = (*FORMS, "three", "rate", "overall", "case-control", "wrong")
STATES = ("first start", "example", *TYPED, *ARRANGED)


@pytest.mark.parametrize("state", STATES)
def test_the_window_is_heard_as_it_is_seen(hands: Hands, state: str) -> None:
    """Everything has a name of its own in words, can be seen and hit, and is heard column by column, as Tab goes."""
    bring_about(hands, state)
    assert faults(hands.window) == []
    read = reading_order(hands.window)
    assert len(read) > 20
    assert names(tab_order(hands.window)) == names(read)
    columns = [hands.window.printed, hands.window.says, hands.window.patient, hands.window.cautions]
    first = [next(place for place, one in enumerate(read) if _in(column, one)) for column in columns]
    assert first == sorted(first)


def test_the_order_follows_by_itself(hands: Hands) -> None:
    """At a pause after parts were made they are told in the order in which they stand, though nobody asked for it."""
    hands.do("example")
    printed = hands.window.printed
    study, outcome = printed._names["design"], printed._names["name_text"]
    wanted = [study, printed.design, outcome, printed.name]
    hands.qtbot.waitUntil(lambda: [part for part in printed.children() if part in wanted] == wanted)


def test_what_is_told_is_heard(hands: Hands) -> None:
    """The banner and the short notice are in the tree while they are there, and only then."""
    bring_about(hands, "told")
    told = {one.name for one in tree(hands.window)}
    assert hands.window.banner.words.text() in told
    assert hands.window.header.notice.text() in told
    hands.click(hands.window.banner.dismiss)
    hands.window.header.tell("")
    kinds = [one.kind for one in tree(hands.window)]
    assert "Banner" not in kinds
    assert faults(hands.window) == []


def _in(column: QWidget, widget: QWidget) -> bool:
    return widget is column or column.isAncestorOf(widget)


def test_every_field_is_labelled(hands: Hands) -> None:
    """A label that stands beside a field is tied to it; a field without one says itself what it is."""
    bring_about(hands, "events-and-others")
    fields = [one for one in hands.window.findChildren(QWidget) if isinstance(one, QComboBox | QLineEdit)]
    shown = [one for one in fields if one.isVisible()]
    assert len(shown) > 10
    assert [one for one in shown if not one.accessibleName()] == []
    tied = {one.label for one in tree(hands.window) if one.label}
    assert {"Study", "Outcome", "People who", "Time span", "Printed as", "Paper says", "Its source"} <= tied


@pytest.mark.parametrize("arrangement", ["two", "one", "bars"])
def test_the_picture_is_one_object(hands: Hands, arrangement: str) -> None:
    """However it is drawn: a title, a sentence with the counts of both groups, and nothing inside to stumble over."""
    hands.do("example")
    if arrangement == "bars":
        hands.do("bars")
    else:
        menu = hands.window.menus["picture"]
        next(action for action in menu.actions() if action.data() == arrangement).trigger()
    picture = one_of(tree(hands.window), "PictureView")
    assert picture.name == "Picture: 8 fewer in 100 fell at least once"
    assert "Of 100 people with usual care 17 (17%) fell" in picture.description
    assert "and 83 did not fall; of 100 with night lights 9 (9%) fell at least once and 91 did not fall" in picture.said
    assert picture.children == 0
    assert picture.focusable


def test_the_same_numbers_are_a_table(hands: Hands) -> None:
    """Each cell is read with the head of its column and of its row, which say of how many people."""
    bring_about(hands, "three")
    rows = rows_of_table(hands.window, "PatientTable")
    assert [cells[0][2] for cells in rows] == ["Low, 5%", "Usual, 12%", "High, 25%"]
    assert rows[1][1:] == [
        ("Usual, 12%", "Without: usual care, in 100 (95% interval)", "12"),
        ("Usual, 12%", "With: night lights, in 100 (95% interval)", "6 (4 to 9)"),
        ("Usual, 12%", "Difference, in 100 (95% interval)", "6 fewer (3 to 8)"),
        ("Usual, 12%", "Number needed (95% interval)", "NNTB 19 (14 to 38)"),
    ]


def test_figures_that_cannot_be_given_are_told_in_the_table(hands: Hands) -> None:
    """A starting risk at which the effect would pass 100% has its reason where its figures would stand."""
    bring_about(hands, "three")
    hands.do("swap")
    hands.write(hands.window.patient.start.shown[2], "80%")
    high = rows_of_table(hands.window, "PatientTable")[2]
    assert "100%" in high[2][2]
    assert all(text for _, _, text in high)


def test_arrows_go_through_the_table_and_tab_leaves_it(hands: Hands) -> None:
    """The focus is in one cell at a time."""
    bring_about(hands, "three")
    table = hands.window.patient.figures.table
    table.setFocus(Qt.FocusReason.TabFocusReason)
    hands.press("Right")
    hands.press("Down")
    assert (table.currentRow(), table.currentColumn()) == (1, 1)
    hands.press("Tab")
    assert hands.focus is hands.window.patient.figures.show_patient


def test_new_figures_are_told_everywhere(hands: Hands) -> None:
    """After a key the picture, its table, the sentence and the measures say the new figures, and none the old."""
    hands.do("example")
    before = tree(hands.window)
    hands.write(hands.window.printed.grid.cells["first_left_text"], "60")
    after = tree(hands.window)
    old, new = one_of(before, "PictureView"), one_of(after, "PictureView")
    assert old.name != new.name
    assert "of 100 with night lights 14 (14%) fell" in new.description
    assert rows_of_table(hands.window, "PatientTable")[0][1][2].startswith("14 (")
    told = {one.name for one in after}
    assert "Risk, night lights: 13.8%, 10.9 to 17.4%" in told
    assert "Night lights, total: 434" in told
    assert not told & {one.name for one in before if "9.2%" in one.name or "412" in one.name}


def test_a_new_name_is_in_the_heads_of_the_table(hands: Hands) -> None:
    """A group that is called otherwise is called so in every cell, though no figure changed."""
    hands.do("example")
    hands.write(hands.window.printed.grid.labels["first"], "Lamps")
    assert rows_of_table(hands.window, "PatientTable")[0][1][1] == "With: lamps, in 100 (95% interval)"


def test_menus_are_told_with_their_keys(hands: Hands) -> None:
    """Every entry has a name without the mark of its key, and those of one menu are called differently."""
    hands.do("example")
    for key, menu in hands.window.menus.items():
        entries = [one.text(QAccessible.Text.Name) for one in children(menu) if one.role() == Role.MenuItem]
        assert len(entries) > 1, key
        assert all(entry.strip() and "&" not in entry for entry in entries)
        assert len(set(entries)) == len(entries)


def children(widget: QWidget) -> Iterator[object]:
    """The things right under a widget in the tree."""
    found = QAccessible.queryAccessibleInterface(widget)
    yield from (found.child(place) for place in range(found.childCount()))


@pytest.mark.parametrize("appearance", APPEARANCES[1:])
def test_the_focus_is_seen_wherever_it_is(hands: Hands, appearance: str) -> None:
    """Every stop of Tab, and every text that a click puts the focus on, shows where the focus is."""
    hands.window.look.set_appearance(appearance)
    bring_about(hands, "events-and-others")
    hands.do("more")
    stops = [one for one in hands.window.findChildren(QWidget) if one.focusPolicy() != Qt.FocusPolicy.NoFocus]
    shown = [one for one in stops if one.isVisible() and one.isEnabled()]
    assert len(shown) > 60
    assert unseen_focus(shown) == []
