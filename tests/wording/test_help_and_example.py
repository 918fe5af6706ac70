"""Help from the tables, the worked example, and what importing the words costs."""

from __future__ import annotations

import subprocess
import sys

import pytest

from fourcount.stats.methods import METHODS, TESTS
from fourcount.wording.example import worked_example
from fourcount.wording.help import HEADINGS, limits_of_the_program, methods_and_sources, terms

LIGHT = ("cautions", "facts", "gaps", "names", "numbers")
OTHERS = (
    "basis", "carried", "example", "headline", "help", "limits", "lines", "meanings", "patient", "patient_sentence",
    "sentence", "working",
)  # fmt: skip


def test_help_lists_every_method_and_every_test_once():
    """Straight from the tables, in their order."""
    sections = methods_and_sources()
    listed = [entry[0] for _, entries in sections for entry in entries]
    assert sorted(listed) == sorted([m.title for m in METHODS] + [t.title for t in TESTS])
    assert all(title and formula and source for _, entries in sections for title, formula, source, _ in entries)


def test_every_measure_with_methods_has_a_heading():
    """A new measure needs its words."""
    assert {method.measure for method in METHODS} <= set(HEADINGS)


@pytest.mark.parametrize(
    "term",
    [
        "index group", "reference group", "event counted", "difference per 100", "NNTB", "NNTH", "through infinity",
        "risk ratio", "odds ratio", "as a risk ratio at 12%", "interval", "level", "score", "textbook", "exact",
        "starting risk", "on balance", "avoided", "added",
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


def test_the_worked_example_is_whole_and_says_that_it_is_invented(findings_of):
    """Nothing is missing for a patient's picture."""
    record = worked_example()
    assert "invented" in record.source_text
    (outcome,) = record.outcomes
    counts = findings_of(outcome).counts
    assert (counts.index_events, counts.index_non_events) == (38, 374)
    assert (counts.reference_events, counts.reference_non_events) == (70, 339)


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
