"""What copies say of a patient: every range, low and high starting risks, another span, the reader's own line."""

from __future__ import annotations

from datetime import date

import msgspec
import pytest

from carried_patients import carried, effect, findings_with, with_counts
from copies import record_of
from forms import effect_only, of_total, paired
from fourcount.appraisal.findings import Gap, OutcomeFindings, OwnLine, PatientFindings
from fourcount.publish.listing import WIDTH, listing
from fourcount.publish.prose import prose
from fourcount.publish.sheet import Row, rows
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Outcome, Patient
from fourcount.record.paper import Choices
from fourcount.wording.own_line import line_sentence

RR, UP = effect(0.54, 0.37, 0.78), effect(1.86, 1.29, 2.69)
TYPED = of_total(patient=Patient(starting_risk_text="12%"))
LOW, HIGH = carried("risk_ratio", RR, 0.05, rank="low"), carried("risk_ratio", RR, 0.25, rank="high")
THREE = carried("risk_ratio", RR, 0.12, rank="usual", low=LOW, high=HIGH)


def letter(outcome: Outcome, found: OutcomeFindings) -> str:
    return prose(record_of(outcome), outcome, found, version="9.9", today=date(2030, 5, 1))


def sheet(outcome: Outcome, patient: PatientFindings) -> dict[str, Row]:
    found = findings_with(outcome, patient)
    table = rows(record_of(outcome), outcome, found, version="9.9", today=date(2030, 5, 1))
    return {row[0]: row for row in table}


def test_a_letter_says_each_thing_of_a_patient_once() -> None:
    """What the interval leaves out stands in the paragraph, and is no caution beside it."""
    text = letter(TYPED, findings_with(TYPED, carried("risk_ratio", RR, 0.12)))
    assert text.count("The interval leaves out that 12% is itself uncertain.") == 1


def test_low_and_high_stand_in_every_copy() -> None:
    """In the letter as sentences, in the listing as lines, in the sheet as rows in this order."""
    found = findings_with(TYPED, THREE)
    text = letter(TYPED, found)
    assert "At the low starting risk of 5%: 50 in 1,000 without and 27 with, 23 fewer in 1,000 (95% interval" in text
    assert "Of 1,000 people with usual care 120 fell" in text
    listed = listing(TYPED, found, Choices())
    assert "  At the high starting risk of 25%:" in listed
    names = [name for name in sheet(TYPED, THREE) if name.startswith("For one patient, ") and "risk with" in name]
    assert [name.split(": ")[0] for name in names if name.endswith("risk with")] == [
        "For one patient, low, 5%",
        "For one patient, usual, 12%",
        "For one patient, high, 25%",
    ]


def test_a_sheet_has_both_risks_with_their_limits() -> None:
    """Unrounded, at a starting risk with counts of its own."""
    table = sheet(TYPED, with_counts("risk_ratio", RR, 24, 200))
    without = table["For one patient, 12%: risk without"]
    assert without[1] == "0.12"
    assert float(without[2]) == pytest.approx(0.0820, abs=5e-4)
    assert float(without[3]) == pytest.approx(0.1723, abs=5e-4)
    assert float(table["For one patient, 12%: risk with"][2]) < 0.045
    assert any("holds the imprecision of both" in name for name in table)


def test_a_rank_that_gives_nothing_has_its_reason_in_the_note() -> None:
    """No figure, and no row that looks like one."""
    patient = msgspec.structs.replace(THREE, low=Gap("baseline-unreadable"))
    row = sheet(TYPED, patient)["For one patient, low starting risk"]
    assert row[1:5] == ("", "", "", "")
    assert row[5].startswith("The starting risk cannot be read")


def test_another_span_is_said_in_every_copy() -> None:
    """The assumption too."""
    outcome = effect_only(risk="20%")
    spans = {"study_span": Duration(value=12, unit="month"), "other_span": Duration(value=5, unit="year")}
    patient = carried("hazard_ratio", effect(0.72, 0.55, 0.92), 0.2, **spans)
    found = findings_with(outcome, patient)
    for copy in (letter(outcome, found), listing(outcome, found, Choices()), " ".join(sheet(outcome, patient))):
        assert "carried to 5 years as if hazards stayed constant" in " ".join(copy.split())
    assert "fell at least once within 5 years" in letter(outcome, found)


def test_the_studys_own_patient_takes_no_rows() -> None:
    """All its figures stand above, until a low or a high starting risk stands beside it."""
    own = carried("risk_ratio", RR, 0.171, baseline_from="reference", start_from="reference", range_from="table")
    found = findings_with(of_total(), own)
    assert not any(name.startswith("For one patient") for name in sheet(of_total(), own))
    assert "For one patient" not in listing(of_total(), found, Choices())
    both = msgspec.structs.replace(own, low=LOW)
    assert sum(name.startswith("For one patient, low") for name in sheet(of_total(), both)) == 6
    assert "For one patient\n  At the low starting risk of 5%" in listing(
        of_total(), findings_with(of_total(), both), Choices()
    )


def test_the_measure_names_the_method_of_a_pairs_figure() -> None:
    """The key of the effect is that of its form, so its method has its title."""
    outcome = paired(patient=Patient(starting_risk_text="12%"))
    figure = msgspec.structs.replace(RR, method="bonett-price")
    patient = carried(
        "risk_ratio", figure, 0.12, measure="pair_ratio", with_=msgspec.structs.replace(RR, method="bonett-price")
    )
    assert sheet(outcome, patient)["For one patient, 12%: risk with"][4].startswith("Bonett")


@pytest.mark.parametrize("kind", ["matters", "margin"])
def test_the_readers_own_line_is_in_every_copy(kind: str) -> None:
    """One sentence, after the figures."""
    line = OwnLine(
        kind=kind, measure="risk_difference", value=0.02, lies="short", worse_side=True, p=0.001, method="margin-score"
    )
    found = msgspec.structs.replace(findings_with(TYPED, carried("risk_ratio", RR, 0.12)), line=line)
    said = line_sentence(TYPED, line)
    assert said in letter(TYPED, found)
    assert said in " ".join(listing(TYPED, found, Choices()).split())
    table = rows(record_of(TYPED), TYPED, found, version="9.9", today=date(2030, 5, 1))
    assert any(row[5] == said for row in table)


def test_a_listing_of_low_and_high_keeps_its_width() -> None:
    """The lines are wrapped as all others."""
    text = listing(TYPED, findings_with(TYPED, THREE), Choices())
    assert all(len(line) <= WIDTH for line in text.splitlines())


def test_a_risk_past_all_is_a_sentence_in_every_copy() -> None:
    """Nothing is cut off, and what could be carried instead is said."""
    outcome = of_total(index_group="second", patient=Patient(starting_risk_text="70%"))
    found = findings_with(outcome, carried("risk_ratio", UP, 0.7), effect(2.0, 1.3, 3.0))
    for copy in (letter(outcome, found), listing(outcome, found, Choices())):
        assert "The risk would pass 100% here; the odds ratio can be carried instead." in " ".join(copy.split())
