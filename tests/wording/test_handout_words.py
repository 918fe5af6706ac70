"""The page's own words: what is compared, in one metric, and in small print all that a copy has to say."""

from __future__ import annotations

from collections.abc import Callable
from datetime import date

import pytest
from msgspec.structs import replace

from fourcount.appraisal.findings import OutcomeFindings, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from fourcount.wording.handout import HandoutWords, file_name, handout_words, why_no_page
from fourcount.wording.standing import STANDING_FULL
from patient_outcomes import AT_TWELVE, HARM, TRIAL

TODAY = date(2026, 12, 1)


@pytest.fixture
def page(findings_of: Callable[[Outcome], OutcomeFindings]) -> Callable[..., HandoutWords]:
    """The page's words for outcomes drawn on some denominators."""

    def words(
        *outcomes: Outcome,
        drawn: tuple[int | None, ...] = (100,),
        persons: tuple[bool, ...] = (True,),
        today: date = TODAY,
        **texts: str,
    ) -> HandoutWords:
        record = Record(**texts)
        patients = [findings_of(outcome).patient for outcome in outcomes]
        pages = [(o, p) for o, p in zip(outcomes, patients, strict=True) if isinstance(p, PatientFindings)]
        return handout_words(record, pages, drawn, ["A sentence."] * len(pages), persons, "9.8.7", today)

    return words


def test_the_small_print_says_all_that_a_copy_has_to(page: Callable[..., HandoutWords]) -> None:
    """Source, date, version, what the figures rest on, and the whole caution block."""
    words = page(AT_TWELVE, title_text="Night lights", source_text="table 2")
    foot = " ".join(words.foot)
    assert "Source: Night lights, table 2." in foot
    assert "Made on 1 December 2026 with Fourcount 9.8.7." in foot
    assert "Starting risk 12%" in foot
    assert all(sentence in foot for sentence in STANDING_FULL)
    assert words.foot[0] == "Based on one study. Talk it over with your clinician."


class Foreign(date):
    """A day that a machine of another language writes out."""

    def strftime(self, form: str) -> str:
        return f"Dezember ({form})"

    __format__ = strftime


@pytest.mark.parametrize(("month", "name"), [(1, "January"), (3, "March"), (12, "December")])
def test_the_date_is_english_wherever_the_page_is_made(
    page: Callable[..., HandoutWords], month: int, name: str
) -> None:
    """Months have English names, although a window takes over the machine's language for dates."""
    foot = " ".join(page(TRIAL, today=Foreign(2026, month, 1)).foot)
    assert f"Made on 1 {name} 2026 with" in foot


def test_a_page_without_a_source_says_so(page: Callable[..., HandoutWords]) -> None:
    """Nothing typed is no silence."""
    assert "Source: not given." in page(TRIAL).foot


def test_what_figures_rest_on_is_said_once_where_it_is_the_same(page: Callable[..., HandoutWords]) -> None:
    """Two outcomes at the study's own risk share the sentence; at different risks each has its own."""
    same = " ".join(page(TRIAL, HARM, drawn=(100, 100)).foot)
    assert same.count("At the study’s own starting risk.") == 1
    other = " ".join(page(AT_TWELVE, HARM, drawn=(100, 100)).foot)
    assert "Falls: Starting risk 12%" in other
    assert "Bleeding: At the study’s own starting risk." in other


@pytest.mark.parametrize(
    ("drawn", "said"),
    [
        ((100,), "The picture shows 100 people."),
        ((1_000, 1_000), "Each picture shows 1,000 people"),
        ((100, 1_000), "The pictures do not all show the same number of people"),
    ],
)
def test_the_metric_is_said(page: Callable[..., HandoutWords], drawn: tuple[int, ...], said: str) -> None:
    """Of how many people the pictures are, loudest where they differ."""
    outcomes = (TRIAL, HARM)[: len(drawn)]
    assert said in page(*outcomes, drawn=drawn).lead


def test_the_heading_names_what_is_compared(page: Callable[..., HandoutWords]) -> None:
    """Both groups; the paper's title where the outcomes compare different ones."""
    assert page(TRIAL).heading == "Usual care or night lights"
    other = replace(HARM, first_label_text="Honey")
    assert page(TRIAL, other, drawn=(100, 100), title_text="A paper").heading == "A paper"
    assert page(TRIAL).title == "Usual care or night lights"
    assert page(TRIAL, title_text="A paper").title == "A paper"


@pytest.mark.parametrize(
    ("persons", "said"), [((True, True), "figure is"), ((False,), "mark is"), ((True, False), "figure or mark is")]
)
def test_the_lead_says_what_an_icon_is(page: Callable[..., HandoutWords], persons: tuple[bool, ...], said: str) -> None:
    """Figures are called figures and blocks marks, on the page and in its description; a title stays as typed."""
    words = page(TRIAL, persons=persons, title_text="Each figure is one person.")
    assert words.title == "Each figure is one person"
    assert f"Each {said} one person." in words.lead
    assert f"Each {said} one person." in words.description


@pytest.mark.parametrize(
    ("title", "name"),
    [
        ("Night lights: a trial?", "Night lights a trial"),
        ("../../etc/passwd", "etc passwd"),
        ("", "handout"),
        ("  ", "handout"),
        ("x" * 300, "x" * 80),
        ("転倒", "転倒"),
    ],
)
def test_the_file_is_named_after_the_paper(title: str, name: str) -> None:
    """The paper's title without what file systems refuse, never longer than 80 letters."""
    assert file_name(Record(title_text=title)) == name


def test_no_page_says_the_first_reason() -> None:
    """Where no outcome is ready, the reason of the one in view is said."""
    assert why_no_page(["", "Fill in the time span."]).endswith("Fill in the time span.")
