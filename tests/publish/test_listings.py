"""Listings for a terminal, and text that stays on its line."""

from __future__ import annotations

import msgspec
from hypothesis import given
from hypothesis import strategies as st

from copies import OUTCOME, on_screen, outcome_of
from forms import of_total
from fourcount.publish.listing import WIDTH
from fourcount.publish.plain_text import one_line
from fourcount.record.outcome import Patient


def test_a_listing_says_both_risks_of_a_patient() -> None:
    """In people and per cent, with their ranges; where a risk is not given, so much is said in its place."""
    listed = on_screen(msgspec.structs.replace(OUTCOME, patient=Patient(starting_risk_text="12%"))).splitlines()
    assert "  Without: usual care, 12 in 100 (12%)" in listed
    assert "  With: night lights, 6 in 100 (6%), 95% interval 4 to 9" in listed
    passing = on_screen(outcome_of((70, 339, 38, 374), risk="70%")).splitlines()
    assert "  Without: reference group, 70 in 100 (70%)" in passing
    assert "  With: index group, not given" in passing


def test_long_names_leave_the_figures_in_their_columns() -> None:
    """A label of any length is wrapped above its figures, and no line is wider than a terminal."""
    text = on_screen(outcome_of((38, 374, 70, 339), label="a very long name " * 20))
    assert all(len(line) <= WIDTH for line in text.splitlines())
    assert "0.49  0.32 to 0.75" in text


@given(st.text(st.characters(exclude_categories=())))
def test_one_line_is_one_line(text: str) -> None:
    """Whatever comes in, no break, tab or control character comes out, and nothing is put right twice."""
    line = one_line(text)
    assert len(line.splitlines()) <= 1
    assert "\t" not in line
    assert one_line(line) == line
    line.encode()


def test_words_joined_by_invisible_marks_stay_joined() -> None:
    """Letters of scripts that need a joiner keep it."""
    assert one_line("\u0645\u06cc\u200c\u0627\u0641\u062a\u062f") == "\u0645\u06cc\u200c\u0627\u0641\u062a\u062f"


def test_a_listing_says_a_caution_once() -> None:
    """What stands among the patient's figures is not said again among the cautions."""
    text = " ".join(on_screen(msgspec.structs.replace(OUTCOME, patient=Patient(starting_risk_text="12%"))).split())
    assert text.count("The interval leaves out that 12% is itself uncertain.") == 1
    assert text.index("is itself uncertain") < text.index("Cautions") < text.index("is assumed to be the same")


def test_a_reason_that_withholds_every_interval_is_listed_once() -> None:
    """Nine times the same sentence is a wall."""
    text = " ".join(on_screen(of_total(icc_text="1.5", cluster_size_text="21")).split())
    rows = text[text.index("Difference") : text.index("NNT in the study")]
    assert rows.count("an intracluster correlation from 0 to 1 is needed") == 1
    assert "relative reduction 46%" in rows
