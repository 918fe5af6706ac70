"""A patient's words for every kind of effect, start and span, from findings built by hand: read them aloud."""

from __future__ import annotations

import pytest

from carried_patients import carried, effect, findings_with, with_counts
from forms import at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap, Interval
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.basis import basis, range_note
from fourcount.wording.gaps import gap_text, limit_text
from fourcount.wording.patient import patient_words
from fourcount.wording.patient_sentence import AS_IN_THE_STUDY, patient_sentence
from fourcount.wording.patient_table import patient_table

RR, OR, HR = effect(0.54, 0.37, 0.78), effect(0.49, 0.32, 0.75), effect(0.72, 0.55, 0.92)
UP, RD = effect(1.86, 1.29, 2.69), effect(-0.079, -0.126, -0.033)
YEAR, FIVE_YEARS = Duration(value=12, unit="month"), Duration(value=5, unit="year")
AT_OWN = {"baseline_from": "reference", "start_from": "reference"}
ADJUSTED = {"design": "cohort", "adjusted_text": "OR 0.47 (0.30 to 0.72)", "adjusted_for_text": "age"}


OVERALL = Patient(start_kind="overall", overall_risk_text="12%", exposed_share_text="30%")


def typed(text="12%", **more):
    return Patient(starting_risk_text=text, **more)


def words_of(outcome, patient, *odds, denominator=100):
    return patient_words(outcome, findings_with(outcome, patient, *odds), Choices(), denominator)


BASES = [
    (
        "typed",
        of_total(patient=typed(starting_risk_source_text="ward audit")),
        carried("risk_ratio", RR, 0.12),
        "Starting risk 12% (ward audit), risk ratio 0.54 (0.37 to 0.78) kept constant.",
    ),
    (
        "counts",
        of_total(patient=typed("24 of 200", starting_risk_source_text="ward audit")),
        with_counts("risk_ratio", RR, 24, 200),
        (
            "Starting risk 12% (24 of 200, 95% interval 8.2 to 17.2%; ward audit), risk ratio 0.54 (0.37 to 0.78) kept "
            "constant."
        ),
    ),
    (
        "limits at their own level",
        of_total(patient=typed("12% (90% CI 9 to 15)")),
        carried("risk_ratio", RR, 0.12, start_interval=Interval(low=0.09, high=0.15), range_from="both"),
        "Starting risk 12% (90% interval 9 to 15%), risk ratio 0.54 (0.37 to 0.78) kept constant.",
    ),
    (
        "rate",
        person_time(patient=Patient(start_kind="rate", rate_text="12 per 1,000 person-years")),
        carried("rate_ratio", RR, 0.1130795, start_from="rate", study_span=Duration(value=10, unit="year")),
        (
            "Starting risk 11.3% (from 12 per 1,000 person-years over 10 years), rate ratio 0.54 (0.37 to 0.78) kept "
            "constant."
        ),
    ),
    (
        "overall",
        of_total(design="cohort", patient=OVERALL),
        carried("risk_ratio", RR, 0.139, start_from="overall"),
        (
            "Starting risk 13.9% (from an overall risk of 12%, 30% of people in the group “Night lights”), "
            "risk ratio 0.54 (0.37 to 0.78) kept constant."
        ),
    ),
    (
        "adjusted at the study's own",
        of_total(**ADJUSTED),
        carried("odds_ratio", effect(0.47, 0.30, 0.72), 0.17115, adjusted=True, **AT_OWN),
        "At the study’s own starting risk of 17.1%, adjusted odds ratio 0.47 (0.30 to 0.72) kept constant.",
    ),
    (
        "another span",
        effect_only(risk="20%"),
        carried("hazard_ratio", HR, 0.2, study_span=YEAR, other_span=FIVE_YEARS),
        (
            "Starting risk 20% over 12 months, hazard ratio 0.72 (0.55 to 0.92) kept constant, carried to 5 years "
            "as if hazards stayed constant."
        ),
    ),
    (
        "own over another span",
        at_time(),
        carried("risk_ratio", RR, 0.171, range_from="table", study_span=YEAR, other_span=FIVE_YEARS, **AT_OWN),
        "At the study’s own starting risk of 17.1% over 12 months, carried to 5 years as if hazards stayed constant.",
    ),
    (
        "usual of three",
        of_total(patient=typed(start_kind="three")),
        carried("risk_ratio", RR, 0.12, rank="usual"),
        "Usual starting risk 12%, risk ratio 0.54 (0.37 to 0.78) kept constant.",
    ),
    (
        "pairs",
        paired(patient=typed()),
        carried("risk_ratio", RR, 0.12, measure="pair_ratio"),
        "Starting risk 12%, paired risk ratio 0.54 (0.37 to 0.78) kept constant.",
    ),
    (
        "odds of pairs",
        paired("matched", patient=typed()),
        carried("odds_ratio", OR, 0.12, measure="pair_odds_ratio"),
        "Starting risk 12%, odds ratio of the pairs 0.49 (0.32 to 0.75) kept constant.",
    ),
    (
        "strata",
        strata(risk="12%"),
        carried("odds_ratio", OR, 0.12, measure="pooled_odds_ratio"),
        "Starting risk 12%, pooled odds ratio 0.49 (0.32 to 0.75) kept constant.",
    ),
    (
        "difference",
        of_total(patient=typed("30%")),
        carried("risk_difference", RD, 0.3),
        "Starting risk 30%, risk difference 7.9 fewer per 100 (3.3 to 12.6) kept constant.",
    ),
    (
        "survey",
        of_total(design="survey", patient=typed()),
        carried("risk_difference", effect(0.02, 0.01, 0.03), 0.12),
        "Starting risk 12%, prevalence difference 2.0 more per 100 (1.0 to 3.0) kept constant.",
    ),
]


@pytest.mark.parametrize(("outcome", "patient", "said"), [case[1:] for case in BASES], ids=[case[0] for case in BASES])
def test_one_sentence_says_what_everything_rests_on(outcome, patient, said):
    """The start and where it is from, the effect kept constant, and another time span."""
    assert words_of(outcome, patient).basis == said
    assert basis(outcome, patient) == said


@pytest.mark.parametrize(
    ("outcome", "patient", "note"),
    [
        (of_total(), carried("risk_ratio", RR, 0.12), "The interval leaves out that 12% is itself uncertain."),
        (
            of_total(patient=typed("24 of 200", effect="hazard_ratio")),
            with_counts("hazard_ratio", HR, 24, 200),
            "The interval holds the imprecision of both the starting risk and the hazard ratio.",
        ),
        (
            of_total(design="cohort"),
            carried("risk_ratio", RR, 0.139, start_from="overall"),
            "The interval takes the overall risk and the share of people who have it as certain.",
        ),
        (
            of_total(patient=typed("30%")),
            carried("risk_difference", RD, 0.3),
            "A difference kept constant has the same interval at every starting risk.",
        ),
        (
            of_total(**ADJUSTED),
            carried("odds_ratio", OR, 0.17115, adjusted=True, **AT_OWN),
            "The interval leaves out that 17.1% is itself uncertain.",
        ),
    ],
)
def test_what_the_interval_holds_is_said(outcome, patient, note):
    """Of both, of the effect alone, or with something taken as certain."""
    assert range_note(outcome, patient) == note
    assert note in words_of(outcome, patient).detail
    assert note in patient_sentence(outcome, findings_with(outcome, patient), Choices())


def test_the_studys_own_interval_is_not_talked_about():
    """It has a name, which stays out of the column."""
    patient = carried("risk_ratio", RR, 0.171, range_from="table", **AT_OWN)
    assert range_note(of_total(), patient) == "The interval is the study’s own."
    assert "own" not in words_of(of_total(), patient).detail
    assert patient_sentence(of_total(), findings_with(of_total(), patient), Choices()) == AS_IN_THE_STUDY


def test_each_risk_has_its_range():
    """Without, with and difference, in people of the picture."""
    words = words_of(of_total(patient=typed("24 of 200")), with_counts("risk_ratio", RR, 24, 200))
    assert (words.without_interval, words.with_interval) == ("95% interval 8 to 17", "95% interval 4 to 11")
    assert words.summary == "over 12 months, 95% interval 2 to 9"
    bare = words_of(of_total(patient=typed()), carried("risk_ratio", RR, 0.12))
    assert (bare.without_interval, bare.with_interval) == ("", "95% interval 4 to 9")


def test_another_span_is_the_span_of_every_sentence():
    """The study's own is named once, behind its starting risk."""
    outcome = effect_only(risk="20%")
    patient = carried("hazard_ratio", HR, 0.2, study_span=YEAR, other_span=FIVE_YEARS)
    words = words_of(outcome, patient)
    assert words.summary.startswith("over 5 years, ")
    assert " fell at least once within 5 years and " in words.picture_sentence
    assert "12 months" not in words.picture_sentence + words.summary + words.detail


def test_the_adjusted_effect_beside_counts_keeps_its_level():
    """Its printed level, whatever was chosen for the table."""
    outcome = of_total(design="cohort", adjusted_text="OR 0.47 (90% CI 0.30 to 0.72)", patient=typed())
    patient = carried("odds_ratio", effect(0.47, 0.30, 0.72), 0.12, adjusted=True, level=0.9)
    words = patient_words(outcome, findings_with(outcome, patient), Choices(level=0.99), 100)
    assert "90% interval" in words.summary
    assert "90% interval" in words.with_interval


def test_a_rate_is_a_risk_over_any_span():
    """Without a span of the study nothing is carried from one span to another."""
    start = Patient(start_kind="rate", rate_text="12 per 1,000 person-years", other_span_text="10 years")
    outcome = person_time(span_text="", patient=start)
    words = patient_words(outcome, appraise(outcome, Choices()), Choices(), 100)
    assert words.basis.startswith("Starting risk 11.3% (from 12 per 1,000 person-years over 10 years), rate ratio 0.54")
    assert words.basis.endswith("kept constant.")


@pytest.mark.parametrize(
    ("odds", "said"),
    [
        ((OR,), "The risk would pass 100% here; the odds ratio can be carried instead."),
        ((), "The risk would pass 100% here."),
    ],
)
def test_odds_are_offered_only_where_there_are_any(odds, said):
    """A printed risk ratio alone has no odds ratio to carry."""
    outcome = effect_only("risk_ratio", "1.86 (1.29 to 2.69)", risk="70%")
    words = words_of(outcome, carried("risk_ratio", UP, 0.7), *odds)
    assert words.detail == said
    assert words.with_interval == ""


@pytest.mark.parametrize("key", ["beyond-one", "carried-beyond-zero"])
def test_a_bare_reason_promises_nothing(key):
    """Where nobody knows what else could be carried, as in JSON, no odds ratio is offered."""
    assert "odds" not in gap_text(Gap(key)) + limit_text(Gap(key))


def test_a_difference_below_nobody_is_withheld():
    """Its estimate, or one limit of the risk, falls below 0%."""
    outcome = of_total(patient=typed("5%"))
    assert words_of(outcome, carried("risk_difference", RD, 0.05)).detail == "The risk would fall below 0% here."
    words = words_of(of_total(patient=typed()), carried("risk_difference", RD, 0.12), OR)
    assert words.with_interval == "95% interval below 0% to 9"
    assert "would fall below 0%, so the interval is open there; carrying the odds ratio avoids it." in words.detail


@pytest.mark.parametrize("kind", ["risk_ratio", "odds_ratio", "hazard_ratio"])
def test_of_nobody_there_is_no_interval_and_no_relative_figure(kind):
    """At a starting risk of 0% every ratio gives nobody: nothing is as wide as nothing, or 46% lower."""
    outcome = of_total(patient=typed("0%"))
    words = words_of(outcome, carried(kind, RR, 0.0, risk_ratio=RR))
    assert words.detail == "NNT at this starting risk ∞."
    assert (words.summary, words.with_interval) == ("over 12 months", "")
    (row,) = patient_table(findings_with(outcome, carried(kind, RR, 0.0, risk_ratio=RR)), Choices())
    assert row == ("0%", "0", "0", "the same number", "NNT ∞")


def test_no_effect_is_the_same_number():
    """A ratio of 1 keeps its range on both sides, and has no relative words."""
    outcome = of_total(patient=typed())
    patient = carried("risk_ratio", effect(1.0, 0.7, 1.4), 0.12)
    words = words_of(outcome, patient)
    assert words.summary_bold == "The same number in 100 fell at least once"
    assert "relative" not in words.detail
    (row,) = patient_table(findings_with(outcome, patient), Choices())
    assert row.difference == "the same number (4 fewer to 5 more)"


LOW, HIGH = carried("risk_ratio", RR, 0.05, rank="low"), carried("risk_ratio", RR, 0.25, rank="high")
THREE = of_total(patient=typed(start_kind="three", low_risk_text="5%", high_risk_text="25%"))


def test_a_letter_says_all_of_it():
    """Both risks with their ranges, the change, the number needed, the relative figure after them, low and high."""
    patient = carried("odds_ratio", OR, 0.12, rank="usual", low=LOW, high=HIGH)
    said = patient_sentence(THREE, findings_with(THREE, patient), Choices())
    order = (
        "with usual care",
        "with night lights",
        " fewer in ",
        "NNTB",
        "In relative words",
        "At the low",
        "At the high",
    )
    places = [said.index(part) for part in order]
    assert places == sorted(places)


def test_a_letter_of_a_carried_risk_ratio_has_its_relative_figure_in_front():
    """The ratio is what was kept constant, so its relative words are not repeated."""
    said = patient_sentence(of_total(), findings_with(of_total(), carried("risk_ratio", RR, 0.12)), Choices())
    assert "relative words" not in said
