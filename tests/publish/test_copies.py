"""What every copy has in common: its people, its cautions, and what was typed as data."""

from __future__ import annotations

import re

import msgspec
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from copies import NUMBER, OUTCOME, letter, on_screen, outcome_of, sheet_of, table_of
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap
from fourcount.publish.listing import WIDTH
from fourcount.publish.plain_text import one_line
from fourcount.record.outcome import DESIGNS, PAIRED_DESIGNS, Outcome, Patient
from fourcount.record.paper import FAMILIES, Choices
from fourcount.wording.cautions import STANDING, STANDING_FULL, caution_text
from fourcount.wording.exports import SHEET_HEAD
from fourcount.wording.gaps import gap_text

UNPAIRED = tuple(design for design in DESIGNS if design not in PAIRED_DESIGNS)
COUNTS = st.tuples(*[st.integers(0, 30)] * 4)
HOSTILE = [
    "=1+1",
    "+1",
    "-1",
    "@SUM(A1)",
    "\t=1",
    "\uff1d1",
    '"open',
    "'=1",
    "a\tb\nc\rd",
    "\u202eevil",
    "\x00\x1b[31m",
]


@pytest.mark.parametrize("design", UNPAIRED)
def test_every_export_carries_the_cautions(design: str) -> None:
    """Each caution that holds, and the standing block, is in the letter, the sheet and the listing."""
    outcome = outcome_of((3, 97, 0, 100), design=design, risk="12%")
    findings = appraise(outcome, Choices())
    texts = [letter(outcome), sheet_of(outcome), " ".join(on_screen(outcome).split())]
    assert findings.cautions
    for caution in findings.cautions:
        assert all(one_line(caution_text(caution)) in text for text in texts)
    assert all(sentence in text for sentence in STANDING_FULL for text in texts[:2])
    assert STANDING in texts[2]


def test_a_shared_reason_is_said_once() -> None:
    """What a case-control study withholds is explained once in a letter and once in a listing."""
    outcome = outcome_of((38, 374, 70, 339), design="case-control")
    findings = appraise(outcome, Choices())
    gap = findings.measures["risk_index"]
    assert isinstance(gap, Gap)
    assert gap == findings.measures["risk_ratio"]
    reason = gap_text(gap)
    assert letter(outcome).count(reason) == 1
    survey = letter(outcome_of((38, 374, 70, 339), design="survey", risk="12%"))
    assert survey.count("gives no number needed to treat") == 1
    assert " ".join(on_screen(outcome).split()).count(reason) == 1


@pytest.mark.parametrize("welcome", [True, False])
@pytest.mark.parametrize("named", ["left_words_text", "right_words_text", "span_text"])
@pytest.mark.parametrize(("counted", "without", "with_"), [("left", 51, 60), ("right", 49, 40)])
def test_every_copy_counts_the_same_people(welcome: bool, named: str, counted: str, without: int, with_: int) -> None:
    """Counts, headline and patient of the letter, and the sheet, stand beside the words of one and the same column."""
    plain = outcome_of((60, 40, 51, 49), risk=f"{without}%")
    outcome = msgspec.structs.replace(plain, counted=counted, left_welcome=welcome, **{named: "xyz"})
    words = {
        ("left", "left_words_text"): "xyz",
        ("right", "left_words_text"): "did not have the outcome “xyz”",
        ("left", "right_words_text"): "did not have the outcome “xyz”",
        ("right", "right_words_text"): "xyz",
        ("left", "span_text"): "had the event",
        ("right", "span_text"): "did not have the event",
    }[counted, named]
    text = letter(outcome)
    assert f"Reference group: {without} {words}, " in text
    assert f"Index group: {with_} {words}, " in text
    assert f"Of 100 people in the reference group about {without} {words}" in text
    assert f"Of 100 people in the reference group {without} {words}" in text
    assert f"of 100 in the index group {with_} (95% interval " in text
    assert (f"People in the index group who {words}", str(with_), "", "", "", "") in table_of(outcome)


def test_a_given_starting_risk_is_in_every_export() -> None:
    """The patient's figures follow wherever a starting risk was typed."""
    outcome = outcome_of((38, 374, 70, 339), risk="12%")
    assert "For one patient" in letter(outcome)
    assert "For one patient" in on_screen(outcome)
    assert sum(row[0].startswith("For one patient, 12%") for row in table_of(outcome) if row[1]) == 5
    assert any(row[0] == "For one patient, 12%: NNTB" for row in table_of(outcome))
    assert not any(row[0].startswith("For one patient") for row in table_of(OUTCOME))
    assert "For one patient" not in on_screen(OUTCOME)


def test_every_copy_says_what_the_patients_figures_rest_on() -> None:
    """The starting risk, its source and the effect carried to it are in the letter, the sheet and the listing."""
    patient = Patient(starting_risk_text="12%", starting_risk_source_text="ward audit 2025")
    outcome = msgspec.structs.replace(OUTCOME, patient=patient)
    rests = "tarting risk 12% (ward audit 2025), risk ratio 0.54 (0.37 to 0.78) kept constant."
    assert rests in letter(outcome)
    assert rests in " ".join(on_screen(outcome).split())
    assert sum(rests in row[0] for row in table_of(outcome)) == 1
    assert "at the study’s own starting risk." in letter(OUTCOME)


def test_a_table_that_is_not_whole_says_so() -> None:
    """An empty table gives a sentence and the standing block, and no figure."""
    empty = Outcome(patient=Patient(starting_risk_text="x"))
    assert STANDING_FULL[0] in letter(empty)
    assert " ".join(on_screen(empty).split()).endswith(STANDING)
    assert all(row[1:4] == ("", "", "") for row in table_of(empty)[1:])


@settings(max_examples=60)
@given(COUNTS, st.sampled_from(DESIGNS), st.sampled_from(FAMILIES), st.sampled_from(["", "12%", "0%", "100%", "x"]))
def test_every_table_can_be_exported(counts: tuple[int, ...], design: str, family: str, risk: str) -> None:
    """Any table gives a letter, a listing within its width and a sheet whose numbers are numbers."""
    choices = msgspec.convert({"family": family}, Choices)
    outcome = outcome_of(counts, design=design, risk=risk)
    assert letter(outcome, choices).endswith(".\n")
    assert all(len(line) <= WIDTH for line in on_screen(outcome, choices).splitlines())
    for row in table_of(outcome, choices)[1:]:
        assert len(row) == len(SHEET_HEAD)
        for cell in row[1:4]:
            assert cell == "" or NUMBER.fullmatch(cell.removeprefix("NNTB ").removeprefix("NNTH "))


@pytest.mark.parametrize("label", HOSTILE, ids=ascii)
def test_what_was_typed_cannot_break_out(label: str) -> None:
    """No label becomes a formula, a new cell or a new row, nor moves a terminal's cursor."""
    outcome = outcome_of((38, 374, 70, 339), label=label, risk="12%")
    sheet = sheet_of(outcome)
    lines = sheet.split("\n")
    assert lines.pop() == ""
    assert len(lines) == len(table_of(outcome))
    for line in lines:
        cells = line.split("\t")
        assert len(cells) == len(SHEET_HEAD)
        for cell in cells:
            assert NUMBER.fullmatch(cell) or not cell.startswith(("=", "+", "-", "@", "\uff1d", '"'))
    for text in (sheet, letter(outcome), on_screen(outcome)):
        assert not re.search("[\x00-\x08\x0b-\x1f\x7f\u202a-\u202e\u2066-\u2069]", text)
