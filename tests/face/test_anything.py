"""Whatever hands do in whatever order, the window shows the record, and the past leads back to the beginning."""

from __future__ import annotations

import random
from collections.abc import Callable
from typing import TYPE_CHECKING

import pytest
from PySide6.QtGui import QGuiApplication

from fourcount.appraisal.appraise import appraise
from fourcount.record.outcome import CELLS, FORMS, Outcome, Strata, form_of
from fourcount.record.paper import Record

if TYPE_CHECKING:
    from conftest import Hands

TYPED = ["0", "7", "38", "374", "1,204", "38/412", "38 (9.2%)", "-3", "4.5", "abc", "12%", "0.12", "", " ", "<b>", "=1+1", "1000000000", "999999999999"]  # fmt: skip  # noqa: E501
COMMANDS = [
    "new", "example", "undo", "redo", "copy-text", "copy-table", "copy-picture", "swap", "count-other",
    "layout", "first-cell", "baseline", "clear", "bigger", "smaller", "actual", "bars", "more", "paste", "paper",
    "add-row", "remove-row", "adopt", *(f"form-{form}" for form in FORMS),
]  # fmt: skip
PASTED = ["", "38", "38/412\n70/409", "38 374\n70 339", "0.54 (0.37 to 0.78)", "38 of 412 fell with A and 70 of 409 with B"]  # fmt: skip  # noqa: E501


def write_somewhere(hands: Hands, chance: random.Random) -> None:
    """Type something into a field on screen."""
    window = hands.window
    fields = [
        *(field for field in window.printed.fields if field.isVisible()), window.patient.baseline,
        window.patient.source, window.header.title, window.header.source,
    ]  # fmt: skip
    hands.write(chance.choice(fields), chance.choice(TYPED))


def choose_something(hands: Hands, chance: random.Random) -> None:
    """Take the first or the last entry of a choice on screen, but for the level that would be asked for."""
    window = hands.window
    boxes = [
        window.printed.design, window.printed.welcome, window.printed.form, window.printed.layout_choice,
        window.says.family, window.patient.effect,
    ]  # fmt: skip
    box = chance.choice([box for box in boxes if box.isEnabled() and box.isVisible()])
    hands.choose(box, box.itemText(chance.choice([0, box.count() - 1])))


def open_something(hands: Hands, chance: random.Random) -> None:
    """Press one of the quiet links, where they are."""
    optional = hands.window.printed.rare.optional
    links = [link for link in optional.links.values() if link.isVisible()] if optional else []
    if links:
        hands.click(chance.choice(links))


def press_something(hands: Hands, chance: random.Random) -> None:
    """Press a key wherever the focus is."""
    hands.press(chance.choice(["Tab", "Shift+Tab", "Return", "Escape", "Up", "Down", "Backspace", "9"]))


def give_command(hands: Hands, chance: random.Random) -> None:
    """Give a command by its menu, whether it has something to do or not."""
    QGuiApplication.clipboard().setText(chance.choice(PASTED))
    hands.window.actions_by_key[chance.choice(COMMANDS)].trigger()


ACTIONS: list[Callable[..., None]] = [write_somewhere, choose_something, press_something, give_command, open_something]


def text_of(outcome: Outcome, field: str) -> str:
    """What the record holds for a field on screen."""
    if field.startswith("strata."):
        assert isinstance(outcome.table, Strata)
        _, place, name = field.split(".")
        return str(getattr(outcome.table.strata[int(place)], name))
    return str(getattr(outcome.table, field, None) if hasattr(outcome.table, field) else getattr(outcome, field))


def assert_shown(hands: Hands) -> None:
    """Everything on screen is what the session's record says."""
    session, window = hands.window.session, hands.window
    outcome = session.outcome
    for field in window.printed.fields:
        if field.isVisible():
            assert field.text() == text_of(outcome, field.field)
    assert window.header.title.text() == session.record.title_text
    assert window.printed.event_words.text() == outcome.event_words_text
    assert window.printed.design.currentData() == outcome.design
    assert window.printed.form.currentData() == form_of(outcome.table)
    assert window.patient.baseline.text() == outcome.patient.starting_risk_text
    assert window.says.family.currentData() == session.record.choices.family
    assert session.findings is not None
    if window.printed.grid.isVisible():
        assert {field for field, cell in window.printed.grid.cells.items() if cell.marked} == {
            mark.field for mark in session.findings.marks if mark.field in CELLS
        }
    assert "nan" not in str(hands.rows).lower().replace("n-1", "")


@pytest.mark.parametrize("seed", range(6))
def test_any_order_of_actions_is_shown_and_can_be_undone(hands: Hands, seed: int) -> None:
    """After sixty actions the window shows its record, the findings are its own, and undo leads to the empty table."""
    chance = random.Random(seed)
    for _ in range(60):
        chance.choice(ACTIONS)(hands, chance)
        if hands.window.actions_by_key["more"].isChecked() and chance.random() < 0.2:
            hands.window.actions_by_key["more"].trigger()
        assert_shown(hands)
    session = hands.window.session
    hands.qtbot.waitUntil(lambda: session.findings == appraise(session.outcome, session.record.choices))
    last = session.record
    while session.can_undo:
        session.undo()
        assert_shown(hands)
    assert session.record == Record()
    while session.can_redo:
        session.redo()
    assert session.record == last or not session.can_undo
    assert_shown(hands)
