"""How the picture is drawn: people, blocks or dots, two pictures, one or bars, with more beside it on demand."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from fourcount.face.settings import Settings
from fourcount.ink.picture import Picture
from fourcount.picture.options import PictureOptions

if TYPE_CHECKING:
    from conftest import Hands
    from fourcount.face.window import MainWindow


def options(hands: Hands) -> PictureOptions:
    """How the picture on screen is drawn."""
    drawn = hands.window.patient.figures.drawn
    assert isinstance(drawn, Picture)
    return drawn.options


def take(hands: Hands, key: str) -> None:
    """Choose an entry of the picture's menu by what it stands for."""
    next(action for action in hands.window.menus["picture"].actions() if action.data() == key).trigger()


@pytest.mark.parametrize("icons", ["block", "dot", "person"])
def test_people_blocks_and_dots(example: Hands, icons: str) -> None:
    """The menu changes what one person is drawn as, and nothing else."""
    before = options(example)
    take(example, icons)
    assert options(example) == before._replace(icons=icons)


def test_one_picture_of_all_three(example: Hands) -> None:
    """One array has what happens anyway and what is avoided; bars lead back to it."""
    take(example, "one")
    assert options(example).arrangement == "one"
    example.do("bars")
    assert options(example).arrangement == "bars"
    example.do("bars")
    assert options(example).arrangement == "one"
    example.do("bars")
    take(example, "two")
    assert options(example).arrangement == "two"
    assert not example.window.actions_by_key["bars"].isChecked()


def test_uncertainty_is_drawn_only_when_asked_for(example: Hands) -> None:
    """Off at the start; its key draws the interval and takes it away."""
    assert not options(example).uncertainty
    example.do("uncertainty")
    assert options(example).uncertainty
    example.do("uncertainty")
    assert not options(example).uncertainty


def test_the_relative_figure_stands_after_the_absolute_one(example: Hands) -> None:
    """Asked for, it is a picture of its own under the first, with a sentence of its own."""
    figures = example.window.patient.figures
    assert not figures.relative.isVisible()
    example.do("relative")
    assert figures.relative.isVisible()
    assert figures.relative.accessibleDescription()
    assert figures.relative.accessibleName() != figures.picture.accessibleName()
    example.qtbot.waitUntil(lambda: figures.relative.y() > figures.picture.y() + figures.picture.height() - 1)
    example.do("relative")
    assert not figures.relative.isVisible()


def test_the_next_start_draws_as_the_last(
    open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands], folder: Path
) -> None:
    """Icons and arrangement are remembered; what is shown on demand is not."""
    hands = at(open_window())
    for key in ("dot", "one"):
        take(hands, key)
    for command in ("bars", "uncertainty", "relative"):
        hands.do(command)
    hands.window.close()
    again = at(open_window())
    again.count("38", "374", "70", "339")
    assert options(again) == PictureOptions(icons="dot", arrangement="one")
    assert Settings(folder).drawing() == ("dot", "one")


@pytest.mark.parametrize("written", ["", "faces", "bars"])
def test_settings_that_make_no_sense_draw_as_usual(folder: Path, written: str) -> None:
    """A damaged setting never stops a window."""
    settings = Settings(folder)
    settings.keep(icons=written, arrangement=written)
    assert Settings(folder).drawing() == ("person", "two")


def test_the_words_of_the_table_are_the_pictures(example: Hands) -> None:
    """A screen reader hears the same numbers as a table, with heads, and both frames in the picture's sentence."""
    example.write(example.window.patient.baseline, "12%")
    said = example.window.patient.figures.table.accessibleDescription()
    for part in ("12", "6 (4 to 9)", "6 fewer (3 to 8)", "NNTB 19 (14 to 38)"):
        assert part in said
    assert example.window.patient.figures.table.isVisible()


def test_three_starting_risks_are_three_rows_under_the_sentence(example: Hands) -> None:
    """Low, usual and high stand beside each other before the buttons; one stands after them."""
    patient = example.window.patient
    table, button = patient.figures.table, patient.figures.show_patient
    example.qtbot.waitUntil(lambda: table.y() > button.y())
    example.choose(patient.start.kind, "Low to high")
    for field, text in zip(patient.start.shown, ("8%", "12%", "25%"), strict=True):
        example.write(field, text)
    said = table.accessibleDescription()
    assert [said.index(rank) for rank in ("Low, 8%", "Usual, 12%", "High, 25%")] == sorted(
        said.index(rank) for rank in ("Low, 8%", "Usual, 12%", "High, 25%")
    )
    example.qtbot.waitUntil(lambda: table.y() < button.y())


def test_effects_are_offered_with_their_estimates(example: Hands) -> None:
    """An adjusted effect outside trials is the usual one, and the crude ones can be chosen."""
    window = example.window
    example.choose(window.printed.design, "cohort study")
    rare = window.printed.rare
    assert rare.optional is not None
    example.click(rare.optional.links["adjusted"])
    example.write(rare.optional.rows["adjusted"].fields[0], "OR 0.60 (0.40 to 0.90)")
    effect = window.patient.effect
    assert effect.itemText(0) == "adjusted odds ratio 0.60, kept constant"
    assert effect.currentIndex() == 0
    example.choose(effect, "risk ratio 0.54, kept constant")
    assert window.session.outcome.patient.effect == "risk_ratio"
    assert effect.currentText() == "risk ratio 0.54, kept constant"
    window.session.undo()
    assert effect.currentIndex() == 0
