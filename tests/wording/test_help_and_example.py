"""Help from the tables, the worked example, and what importing the words costs."""

from __future__ import annotations

import subprocess
import sys

import pytest

from fourcount.appraisal.check import check
from fourcount.stats.entries.carrying import CARRYING
from fourcount.stats.entries.extras import EXTRAS
from fourcount.stats.entries.margins import MARGINS
from fourcount.stats.entries.print_only import PRINT_METHODS, PRINT_TESTS
from fourcount.stats.entries.recovery import RECOVERIES
from fourcount.stats.methods import (
    HOMOGENEITY_TESTS,
    METHODS,
    PAIR_METHODS,
    PAIR_TESTS,
    RATE_METHODS,
    RATE_TESTS,
    STRATA_METHODS,
    STRATA_TESTS,
    TESTS,
    TIMED_METHODS,
)
from fourcount.wording.example import worked_example
from fourcount.wording.help import (
    HEADINGS,
    LETTERS,
    PRINT_ONLY_HEADING,
    entering,
    limits_of_the_program,
    methods_and_sources,
    terms,
)
from fourcount.wording.labels import FORMS

ALL_METHODS = (*METHODS, *PAIR_METHODS, *RATE_METHODS, *STRATA_METHODS, *TIMED_METHODS)
CALCULATIONS = (*EXTRAS, *CARRYING, *MARGINS, *RECOVERIES)
SHOWN = (*ALL_METHODS, *TESTS, *PAIR_TESTS, *RATE_TESTS, *STRATA_TESTS, *HOMOGENEITY_TESTS, *CALCULATIONS)
LIGHT = ("cautions", "facts", "gaps", "names", "numbers")
OTHERS = (
    "basis", "carried", "example", "extras", "form", "headlines", "p_value", "pairs", "person_time", "printed",
    "headline", "help", "limits", "lines", "meanings", "patient", "patient_sentence", "patient_table",
    "picture_sentence", "ranks", "spans", "starts", "subject", "effects",
    "sentence", "working",
)  # fmt: skip


def test_help_lists_every_method_and_every_test_once():
    """Straight from the tables, in their order."""
    sections = methods_and_sources()
    listed = [entry[0] for heading, entries in sections for entry in entries if heading != PRINT_ONLY_HEADING]
    assert sorted(listed) == sorted(entry.title for entry in SHOWN)
    assert len(dict(sections)[PRINT_ONLY_HEADING]) == len(PRINT_METHODS) + len(PRINT_TESTS)
    assert all(title and formula and source for _, entries in sections for title, formula, source, _ in entries)


def test_every_measure_with_methods_has_a_heading():
    """A new measure needs its words."""
    assert {entry.measure for entry in ALL_METHODS} == set(HEADINGS)


def test_every_letter_of_a_formula_is_explained():
    """Those of pairs, of person-time and of strata too."""
    for letter in (
        "e have",
        "f on the index side",
        "g on the reference side",
        "h on neither",
        "x1",
        "t2",
        "Σ",
        "l and u",
    ):
        assert letter in LETTERS


@pytest.mark.parametrize("specimen", FORMS.values())
def test_every_form_of_entry_is_explained_by_its_specimen(specimen):
    """In the words of the choice itself, in whole sentences."""
    assert dict(entering())[specimen].endswith(".")
    assert terms()[: len(entering())] == entering()


@pytest.mark.parametrize(
    "name",
    ["paste", "what the paper prints", "the patient’s starting risk", "a time span for the patient", "your own line"],
)
def test_the_paste_and_the_check_are_explained(name):
    """With what they take."""
    assert dict(entering())[name].endswith(".")


@pytest.mark.parametrize(
    "term",
    [
        "index group", "reference group", "event counted", "difference per 100", "NNTB", "NNTH", "through infinity",
        "risk ratio", "odds ratio", "as a risk ratio at 12%", "interval", "level", "score", "textbook", "exact",
        "starting risk", "on balance", "avoided", "added", "pairs that differ", "rate", "hazard ratio",
        "risk at a time", "strata", "pooled", "crude", "adjusted", "add up", "lost", "fragility", "E-value",
        "attributable", "design effect", "kept constant", "low, usual, high", "overall risk", "another time span",
        "what the interval holds", "margin", "smallest difference that matters",
    ],
)  # fmt: skip
def test_every_word_of_the_window_is_explained(term):
    """Each term has an entry of its own, in whole sentences."""
    explained = [text for name, text in terms() if term in name]
    assert explained
    assert all(text[0].isupper() and text.endswith(".") for text in explained)


def test_the_rounding_of_a_number_needed_is_explained():
    """Up, for harm as for benefit."""
    assert "always rounded up, NNTB and NNTH alike" in dict(terms())["NNTB, NNTH"]


def test_the_limits_of_the_program_are_whole_sentences():
    """Each stands by itself."""
    assert all(text[0].isupper() and text.endswith(".") for text in limits_of_the_program())


def test_the_worked_example_says_that_it_is_invented():
    """In the line that every copy and page carries."""
    assert "invented" in worked_example().source_text


@pytest.mark.parametrize(("place", "counts"), [(0, (38, 374, 70, 339)), (1, (62, 350, 49, 360))])
def test_each_outcome_of_the_example_is_whole(place, counts, findings_of):
    """Four counts, and nothing is missing for a patient's page: names, words, both groups and one time span."""
    outcome = worked_example().outcomes[place]
    found = findings_of(outcome).counts
    seen = (found.index_events, found.index_non_events, found.reference_events, found.reference_non_events)
    assert seen == counts
    words = (
        outcome.name_text, outcome.left_words_text, outcome.right_words_text, outcome.plain_event_text,
        outcome.plain_other_text, outcome.first_label_text, outcome.second_label_text,
    )  # fmt: skip
    assert all(words)
    assert outcome.span_text == worked_example().outcomes[0].span_text


def test_the_example_sets_a_harm_beside_a_benefit(findings_of):
    """Of the same people: fewer fall and more sleep badly, and the paper's own results follow from the counts."""
    record = worked_example()
    benefit, harm = (findings_of(outcome) for outcome in record.outcomes)
    assert benefit.measures["risk_difference"].estimate < 0 < harm.measures["risk_difference"].estimate
    assert (benefit.totals.first, benefit.totals.second) == (harm.totals.first, harm.totals.second)
    for outcome in record.outcomes:
        assert all(figure.findings[0].agrees for figure in check(outcome, record.choices).figures)


@pytest.mark.parametrize(
    ("modules", "heavy"),
    [
        (LIGHT, {"numpy", "scipy", "PySide6", "matplotlib", "statistics", "fractions"}),
        (OTHERS, {"numpy", "scipy", "PySide6", "matplotlib"}),
    ],
)
def test_importing_the_words_loads_nothing_heavy(modules, heavy):
    """The window paints before numpy is there, and the words of an empty window need no method at all."""
    imports = ", ".join(f"fourcount.wording.{name}" for name in modules)
    code = f"import {imports}, sys; print(*{{name.split('.')[0] for name in sys.modules}})"
    run = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=True)
    assert not heavy & set(run.stdout.split())
