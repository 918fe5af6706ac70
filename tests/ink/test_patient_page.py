"""The patient's page fills its room, never with text smaller than the window's, and says everything."""

from __future__ import annotations

import pytest
from msgspec.structs import replace
from PySide6.QtGui import QColor, QImage, QPainter

from fourcount.appraisal.appraise import appraise
from fourcount.ink.palette import PAPER, contrast
from fourcount.ink.paragraph import Run, draw_paragraph, paragraph_height
from fourcount.ink.patient_page import BELOW_HEADLINE, PatientPage
from fourcount.ink.plain_picture import Shown, picture_words, shown
from fourcount.picture.options import USUAL
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from patient_outcomes import AT_TWELVE, CASE_CONTROL, HARM, HAZARD, LONG, SHOWN, SMALL, TINY, TRIAL, WELCOME, of_counts

ROOMS = [(1280, 740), (1024, 640), (800, 560), (1920, 1020), (480, 360)]


def ready(outcome: Outcome, uncertainty: bool = False) -> Shown:
    """An outcome ready to be drawn."""
    it = shown(outcome, appraise(outcome, Choices()), USUAL._replace(uncertainty=uncertainty))
    assert it is not None
    return it


def drawn(outcome: Outcome, room: tuple[int, int], zoom: float = 1.0, below: int = 40) -> tuple[QImage, int]:
    """The page painted with white space below, and its height."""
    page, (width, height) = PatientPage(ready(outcome)), room
    style = page.style(width, height, zoom)
    tall = max(height, round(page.least_height(style, width)))
    image = QImage(width, tall + below, QImage.Format.Format_RGB32)
    image.fill(QColor("#FFFFFF"))
    painter = QPainter(image)
    page.draw(painter, style, width, tall)
    painter.end()
    return image, tall


def last_row(image: QImage) -> int:
    """The lowest row that holds anything but white."""
    blank = bytes(QImage(image.width(), 1, image.format()).constBits()) and b"\xff" * image.bytesPerLine()
    return max(y for y in range(image.height()) if bytes(image.constScanLine(y)) != blank)


@pytest.mark.parametrize("room", ROOMS, ids=str)
@pytest.mark.parametrize("name", SHOWN)
def test_all_of_the_page_is_inside_it(name: str, room: tuple[int, int]) -> None:
    """Whatever the outcome and the room, nothing is drawn below the page's own height."""
    image, tall = drawn(SHOWN[name], room)
    assert last_row(image) < tall


@pytest.mark.parametrize("zoom", [1.5, 2.0])
@pytest.mark.parametrize("room", ROOMS, ids=str)
@pytest.mark.parametrize("name", SHOWN)
def test_a_page_that_is_scrolled_holds_all_too(name: str, room: tuple[int, int], zoom: float) -> None:
    """With its headline first and its key above its people, nothing is drawn below the page's height either."""
    page, (width, height) = PatientPage(ready(SHOWN[name], uncertainty=True)), room
    fit = page.fitted(width, height, zoom)
    assert fit.height >= height
    assert fit.headline_first == (fit.height > height)
    image = QImage(width, round(fit.height) + 60, QImage.Format.Format_RGB32)
    image.fill(QColor("#FFFFFF"))
    painter = QPainter(image)
    page.draw(painter, fit.style, width, fit.height, fit.headline_first)
    painter.end()
    assert last_row(image) < fit.height


def people_height(outcome: Outcome, room: tuple[int, int], zoom: float) -> int:
    """How much of the page its people take."""
    page, (width, height) = PatientPage(ready(outcome)), room
    fit = page.fitted(width, height, zoom)
    wide = page._wide(fit.style, width)
    picture = page._key_first if fit.headline_first else page._picture
    extra = fit.style.px(BELOW_HEADLINE) if fit.headline_first else 0
    left = fit.height - page._text_height(fit.style, wide) - extra
    return round(picture.people_height(fit.style, wide, left))


@pytest.mark.parametrize("outcome", [TRIAL, WELCOME, SMALL], ids=["hundred", "welcome", "thousand"])
@pytest.mark.parametrize("room", [(1280, 740), (1366, 700)], ids=str)
def test_people_are_no_smaller_at_larger_text(outcome: Outcome, room: tuple[int, int]) -> None:
    """At 150 and 200% text the arrays are at least as high as at 100%, and the page is scrolled instead."""
    usual = people_height(outcome, room, 1.0)
    for zoom in (1.5, 2.0):
        assert people_height(outcome, room, zoom) >= usual


@pytest.mark.parametrize("zoom", [1.0, 1.5, 2.0])
@pytest.mark.parametrize("outcome", [TRIAL, LONG], ids=["short", "long"])
def test_text_is_never_smaller_than_the_windows(outcome: Outcome, zoom: float) -> None:
    """At 100 to 200% text the page's body text has at least the 13 pixels of the window's, times the zoom."""
    for width, height in ROOMS:
        style = PatientPage(ready(outcome)).style(width, height, zoom)
        assert style.font("body").pixelSize() >= round(13 * zoom) - 1


def test_a_usual_screen_needs_no_scrolling() -> None:
    """At 1280 by 740 and 1024 by 640 every kind of outcome fits at 100% text."""
    for outcome in SHOWN.values():
        for width, height in ROOMS[:2]:
            page = PatientPage(ready(outcome))
            assert page.least_height(page.style(width, height), width) <= height


def test_a_larger_room_makes_a_larger_page() -> None:
    """A screen of 1920 by 1020 sets larger text than one of 1024 by 640."""
    page = PatientPage(ready(TRIAL))
    assert page.style(1920, 1020).scale > 1.3 * page.style(1024, 640).scale


def test_what_makes_a_difference_doubtful_cannot_be_missed() -> None:
    """That there may be none stands in the size and ink of the difference; what else may explain it comes next."""
    page = PatientPage(ready(replace(SMALL, design="cohort")))
    style = page.style(1280, 740)
    runs = {run.text: run for paragraph, _ in page._below(style, 1200) for run in paragraph}
    difference, *others = runs.values()
    doubts = [run for run in others if "leaves that open" in run.text]
    assert [(run.font, run.colour) for run in doubts] == [(difference.font, difference.colour)]
    explained = next(run for run in others if run.text.startswith("Other things"))
    assert explained.colour == PAPER.ink
    assert explained.font.pixelSize() > style.font("body").pixelSize()


@pytest.mark.parametrize("room", ROOMS[:2], ids=str)
def test_counts_stay_on_their_line(room: tuple[int, int]) -> None:
    """On a usual screen text is made somewhat smaller rather than that a count or its percentage wraps."""
    for outcome in (TRIAL, AT_TWELVE, WELCOME, HAZARD, CASE_CONTROL):
        page = PatientPage(ready(outcome))
        style = page.style(*room)
        assert not page._picture.counts_wrap(style, page._wide(style, room[0]))


def test_paper_colours_are_read_easily() -> None:
    """Ink and muted text have 4.5:1 on white, icons 3:1."""
    assert contrast(PAPER.ink, PAPER.page) >= 4.5
    assert contrast(PAPER.muted, PAPER.page) >= 4.5
    assert min(contrast(PAPER.accent, PAPER.page), contrast(PAPER.outline, PAPER.page)) >= 3


@pytest.mark.parametrize(
    ("outcome", "without", "affected"), [(AT_TWELVE, 12, 6), (CASE_CONTROL, 12, 6), (HAZARD, 20, 15)]
)
def test_the_plan_shows_the_patients_own_risks(outcome: Outcome, without: int, affected: int) -> None:
    """So many icons as the captions say, from whichever form the effect comes."""
    it = ready(outcome)
    assert it.plan.denominator == 100
    assert (it.plan.without.affected, it.plan.with_.affected) == (without, affected)
    assert it.words.without.number == f"{without} in 100"


def test_a_welcome_outcome_draws_the_others() -> None:
    """Of 45 and 60 in 100 who heal, 55 and 40 are filled."""
    it = ready(WELCOME)
    assert (it.plan.without.affected, it.plan.with_.affected, it.plan.with_.avoided) == (55, 40, 15)


def test_the_range_is_drawn_only_where_it_is_asked_for() -> None:
    """Half-toned icons stand between the limits that the sentence names."""
    plain, ranged = ready(TRIAL), ready(TRIAL, uncertainty=True)
    assert plain.plan.with_.uncertain == 0
    assert ranged.words.range_ == "With night lights, it could be from 7 to 12 in 100."
    assert ranged.plan.with_.uncertain == 12 - 7


@pytest.mark.parametrize("ranged", [False, True])
def test_the_key_has_no_number_that_the_range_would_change(ranged: bool) -> None:
    """Fewer of the difference's figures are drawn where the range takes their place; those spared do not "fall"."""
    for outcome, state, text in ((AT_TWELVE, "avoided", "spared, on balance"), (HARM, "added", "added, on balance")):
        key = {entry.state: entry.text for entry in picture_words(ready(outcome, ranged)).key}
        assert key[state] == text
        assert key["uncertain"] == "not settled by the study"


def test_one_array_says_what_it_shows_of_both_groups() -> None:
    """In one array, filled figures have it with both, and outlined ones with neither."""
    it = ready(AT_TWELVE)
    key = {
        entry.state: entry.text for entry in picture_words(it._replace(options=USUAL._replace(arrangement="one"))).key
    }
    assert key["affected"] == "fall at least once, with both"
    assert key["others"] == "do not fall, with both"
    assert {entry.text for entry in picture_words(it).key} >= {"fall at least once", "do not fall"}


@pytest.mark.parametrize(
    ("outcome", "said"), [(TRIAL, "Each figure is one person."), (SMALL, "Each mark is one person.")]
)
def test_what_an_icon_stands_for_is_said_as_it_is_drawn(outcome: Outcome, said: str) -> None:
    """A hundred are figures, a thousand marks, whichever icons were chosen."""
    page = PatientPage(ready(outcome))
    style = page.style(1280, 740)
    said_above = [run.text for runs, _ in page._above(style, 1200) for run in runs]
    assert said in said_above


def test_what_is_too_small_to_draw_speaks_of_whole_people() -> None:
    """Bars, and a number of people of whom whole ones can be told."""
    it = ready(TINY)
    assert it.plan.denominator is None
    assert it.words.without.number == "1 in 1,000,000"


def test_only_a_difference_can_be_too_small_to_draw() -> None:
    """50% against 50.00000001% are risks that could be drawn; the difference could not."""
    it = ready(of_counts(TRIAL, (500_000_100, 499_999_900, 500_000_000, 500_000_000)))
    assert picture_words(it).note.startswith("The difference is too small to draw as people.")
    assert picture_words(ready(TINY)).note.startswith("The risks are too small to draw as people.")


def test_a_paragraph_is_as_high_as_it_says() -> None:
    """Measured and drawn height agree, also for scripts without spaces and words wider than the line."""
    page = PatientPage(ready(TRIAL))
    style = page.style(800, 600)
    image = QImage(300, 600, QImage.Format.Format_RGB32)
    painter = QPainter(image)
    for text in ("夜間照明は転倒を減らす" * 5, "x" * 200, "الرعاية المعتادة في المستشفى", "a 🙂 b c"):
        runs = [Run(text, style.font("body"), "#000000"), Run("and more", style.font("figure"), "#000000")]
        assert draw_paragraph(painter, 0, 0, 200, runs) == paragraph_height(runs, 200) > 0
    painter.end()
