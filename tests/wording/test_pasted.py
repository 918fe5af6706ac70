"""What a paste was understood as, in words."""

from __future__ import annotations

import pytest

from fourcount.record.entry.pasted.doubts import PASTE_DOUBTS
from fourcount.record.entry.readings import Pasted, PastedGroup
from fourcount.record.outcome import FORMS, Outcome
from fourcount.wording import labels, pasted


def groups(*pairs):
    return tuple(PastedGroup(left_text=left, right_text=right, label=label) for left, right, label in pairs)


def test_every_doubt_has_a_sentence():
    """No doubt is told by its key, and none has two sentences."""
    assert set(pasted.DOUBTS) == set(PASTE_DOUBTS)
    assert all(text.endswith(".") for text in pasted.DOUBTS.values())
    assert len(set(pasted.DOUBTS.values())) == len(PASTE_DOUBTS)


@pytest.mark.parametrize(
    ("form", "left", "right", "line"),
    [
        ("events-and-others", "38", "374", "A: 38 with, 374 without"),
        ("events-of-total", "38", "412", "A: 38 of 412"),
        ("percent-of-total", "9.2%", "412", "A: 9.2% of 412"),
        ("person-time", "38", "4,120", "A: 38 in 4,120 person-years"),
        ("risk-at-time", "9%", "6 to 12", "A: 9% (6 to 12)"),
    ],
)
def test_a_group_is_told_in_the_manner_of_its_form(form, left, right, line):
    """Each form of print has its own line."""
    unit = "person-years" if form == "person-time" else ""
    told = pasted.understood(Pasted(form=form, groups=groups((left, right, "A")), unit=unit), Outcome())
    assert told == [line]


def test_pairs_are_told_as_pairs():
    """Both, the first side only, the second side only, neither."""
    told = pasted.understood(Pasted(form="pairs", groups=groups(("12", "21", ""), ("9", "58", ""))), Outcome())
    assert told == ["Pairs: 12 both, 21 first only, 9 second only, 58 neither"]


def test_strata_are_told_with_their_labels():
    """Each line says its stratum and its group."""
    found = Pasted(
        form="strata",
        groups=groups(("1", "9", "A"), ("2", "8", "B"), ("3", "7", "A"), ("4", "6", "B")),
        stratum_labels=("young", "old"),
    )
    assert pasted.understood(found, Outcome())[2] == "old, A: 3 of 7"


def test_groups_without_a_name_have_that_of_the_record():
    """A label that stands there already tells which group it would be."""
    outcome = Outcome(first_label_text="Night lights")
    told = pasted.understood(Pasted(form="events-of-total", groups=groups(("1", "9", ""), ("2", "", ""))), outcome)
    assert told == ["Night lights: 1 of 9", "second group: 2 of ?"]


def test_the_notice_names_what_changed():
    """Only what is another one than before is told."""
    before = Outcome()
    assert pasted.filled(before, before) == labels.NOTHING_PASTED
    assert pasted.filled(before, Outcome(span_text="2 years", paper_text="0.5")) == "Pasted: time span, printed result."


def test_every_form_has_its_words():
    """Specimen, note and command of each form."""
    assert list(labels.FORMS) == list(labels.FORM_NOTES) == list(FORMS)
    assert all(f"form-{form}" in labels.COMMANDS for form in FORMS)
