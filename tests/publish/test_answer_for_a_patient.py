"""What is asked for a patient by name: of the function, and in the dictionary. All figures are invented."""

from __future__ import annotations

import json
from typing import Any

import pytest

from contract_checks import check_patient, withheld
from contract_keys import LINE_KEYS, LINE_KEYS_OF_A_MARGIN
from forms import EVERY_FORM
from fourcount.appraisal.appraise import appraise
from fourcount.publish.answer import answer, asked
from fourcount.publish.answer_file import file_json, file_listing
from fourcount.publish.contract import contract
from fourcount.publish.listing import listing
from fourcount.record.outcome import DESIGNS, Outcome, Patient
from fourcount.record.paper import Choices, Record
from fourcount.wording.example import worked_example

TABLE = (38, 374, 70, 339)
STARTS: dict[str, dict[str, Any]] = {
    "bare": {"baseline": 0.12},
    "limits": {"baseline": "12% (90% CI 9-15)"},
    "counts": {"baseline": "24 of 200"},
    "three": {"baseline": "12%", "low": 0.05, "high": "90%"},
    "rate": {"rate": "12 per 100 person-years", "span": "12 months"},
    "overall": {"overall": 0.12, "exposed": "30%"},
    "span": {"span": "12 months", "other_span": "5 years"},
    "odds": {"baseline": "60%", "effect": "odds-ratio"},
    "difference": {"baseline": "5%", "effect": "risk_difference"},
    "adjusted": {"effect": "adjusted", "adjusted": "OR 0.45 (0.30 to 0.70)"},
    "nothing to carry": {"other_span": "5 years"},
}


ODDS_ALONE = ("case-control", "matched")
"""Designs that carry nothing but an odds ratio."""


@pytest.mark.parametrize(
    ("design", "start"),
    [(d, s) for d in DESIGNS for s in STARTS if (d, s) not in {(odds, "difference") for odds in ODDS_ALONE}],
)
def test_every_start_in_every_design_keeps_to_the_structure(design: str, start: str) -> None:
    """Strict JSON, and the keys of a patient are there whichever way the risk is given."""
    published: Any = answer(*TABLE, design=design, **STARTS[start])
    assert json.loads(json.dumps(published, allow_nan=False)) == published
    check_patient(published["patient"])


@pytest.mark.parametrize("name", EVERY_FORM)
@pytest.mark.parametrize("typed", ["12%", "24 of 200"])
def test_every_form_keeps_to_the_structure(name: str, typed: str) -> None:
    """The same of whatever is printed."""
    fields = {key: getattr(EVERY_FORM[name], key) for key in EVERY_FORM[name].__struct_fields__}
    outcome = Outcome(**{**fields, "patient": Patient(starting_risk_text=typed)})
    published: Any = contract(outcome, Choices(), appraise(outcome, Choices()))
    assert json.loads(json.dumps(published, allow_nan=False)) == published
    assert not withheld(published["patient"])
    check_patient(published["patient"])


def test_what_was_given_comes_back() -> None:
    """Where the risk is from, its own limits, the spans, and the two other risks of three."""
    counts: Any = answer(*TABLE, **STARTS["counts"])["patient"]
    assert (counts["start_from"], counts["range_from"]) == ("typed", "both")
    assert counts["start_interval"] == counts["risk_without_interval"] == pytest.approx([0.08198, 0.17234], abs=5e-6)
    span: Any = answer(*TABLE, **STARTS["span"])["patient"]
    assert span["study_span"] == {"value": 12.0, "unit": "month", "years": 1.0}
    assert span["other_span"] == {"value": 5.0, "unit": "year", "years": 5.0}
    three: Any = answer(*TABLE, **STARTS["three"])["patient"]
    assert [three["low"]["baseline"], three["baseline"], three["high"]["baseline"]] == [0.05, 0.12, 0.9]
    adjusted: Any = answer(*TABLE, **STARTS["adjusted"])["patient"]
    assert (adjusted["adjusted"], adjusted["carried"]["estimate"], adjusted["range_from"]) == (True, 0.45, "effect")


def test_without_a_wish_there_is_no_patient_and_no_line() -> None:
    """The study's own figures say it all."""
    assert not {"patient", "line"} & set(answer(*TABLE))


@pytest.mark.parametrize("design", DESIGNS)
@pytest.mark.parametrize("given", [{}, {"adjusted": "OR 1.8 (1.2 to 2.7)"}, STARTS["bare"]])
def test_text_and_dictionary_have_the_same_patient(design: str, given: dict[str, Any]) -> None:
    """Outside trials the usual effect is the paper's adjusted one, and then the figures are not the table's."""
    plain = {"design": design, "level": 0.95, "intervals": "score", "baseline": None, "unwelcome": True}
    question = asked(TABLE, **{**plain, **given})
    findings = appraise(question.outcome, question.choices)
    said = "For one patient" in listing(question.outcome, findings, question.choices)
    assert ("patient" in contract(question.outcome, question.choices, findings)) == said


def test_an_effect_that_is_asked_for_is_answered() -> None:
    """At the study's own risk too, where every crude effect gives the table's figures."""
    patient: Any = answer(*TABLE, effect="odds_ratio")["patient"]
    assert (patient["effect"], patient["range_from"]) == ("odds_ratio", "table")


@pytest.mark.parametrize(
    ("given", "allowed"),
    [
        ({"effect": "hazard_ratio"}, "risk_ratio, odds_ratio, risk_difference"),
        ({"effect": "adjusted", "design": "cohort"}, "risk_ratio, odds_ratio, risk_difference"),
        ({"effect": "risk_ratio", "design": "case-control", "baseline": "12%"}, "odds_ratio"),
        (
            {"effect": "hazard_ratio", "design": "cohort", "adjusted": "HR 0.6 (0.4 to 0.9)"},
            "adjusted, risk_ratio, odds_ratio, risk_difference",
        ),
    ],
)
def test_an_effect_that_is_not_there_is_refused(given: dict[str, Any], allowed: str) -> None:
    """Another effect in its place would answer another question; the sentence lists what there is."""
    with pytest.raises(ValueError, match=f"what can be carried is {allowed}.$"):
        answer(*TABLE, **given)


def test_where_nothing_can_be_carried_the_reason_stands() -> None:
    """A table of nobody has no effect to choose among."""
    found: Any = answer(0, 0, 0, 0, effect="odds_ratio")
    assert withheld(found["patient"])


@pytest.mark.parametrize("given", [{"low": "50%"}, {"high": "5%"}])
def test_a_risk_on_the_wrong_side_of_the_studys_own_is_refused(given: dict[str, Any]) -> None:
    """The usual one of three is the study's 17.1% where none is given."""
    with pytest.raises(ValueError, match=r"^The (low|high) risk cannot be used: .*\.$"):
        answer(*TABLE, **given)


@pytest.mark.parametrize(
    ("given", "measure", "value", "lies"),
    [
        ({"margin": "RD 2% more"}, "risk_difference", 0.02, "short"),
        ({"margin": "2 per 100"}, "risk_difference", 0.02, "short"),
        ({"margin": "RR 1.25"}, "risk_ratio", 1.25, "short"),
        ({"margin": "OR = 0.8"}, "odds_ratio", 0.8, "beyond"),
        ({"matters": "5 fewer per 100"}, "risk_difference", -0.05, "across"),
        ({"matters": "RD 5%"}, "risk_difference", -0.05, "across"),
        ({"matters": "2%", "unwelcome": False}, "risk_difference", 0.02, "short"),
    ],
)
def test_a_line_of_ones_own(given: dict[str, Any], measure: str, value: float, lies: str) -> None:
    """A margin is on the worse side unless it names one, a difference that matters on the better side."""
    line: Any = answer(*TABLE, **given)["line"]
    assert tuple(line) == (*LINE_KEYS, *(LINE_KEYS_OF_A_MARGIN if "margin" in given else ()))
    assert (line["measure"], line["value"], line["lies"]) == (measure, value, lies)


MISTAKES: list[dict[str, Any]] = [
    {"baseline": "120%"},
    {"baseline": ""},
    {"baseline": 1.2},
    {"low": "20%", "baseline": "12%"},
    {"high": "5%", "baseline": "12%"},
    {"low": True},
    {"rate": "x"},
    {"rate": 0.12},
    {"rate": "1% per year", "baseline": "12%"},
    {"rate": "1% per year", "overall": "12%", "exposed": "30%"},
    {"overall": "12%"},
    {"exposed": "30%"},
    {"overall": "12%", "exposed": "130%"},
    {"overall": "12%", "exposed": "30%", "baseline": "12%"},
    {"effect": "hr"},
    {"effect": 1},
    {"span": "some time"},
    {"span": ""},
    {"other_span": "0 years"},
    {"adjusted": "none"},
    {"margin": "1.25"},
    {"margin": "RR 1"},
    {"margin": "RD 200%"},
    {"margin": "x"},
    {"matters": 0.05},
    {"margin": "RR 1.25", "matters": "RD 5%"},
]


@pytest.mark.parametrize("given", MISTAKES, ids=[str(given) for given in MISTAKES])
def test_a_wish_that_cannot_be_met_is_one_sentence(given: dict[str, Any]) -> None:
    """It names what cannot be used."""
    with pytest.raises(ValueError, match=r"^[A-Z][^\n]*\.$"):
        answer(*TABLE, **given)


@pytest.mark.parametrize(
    ("given", "start"),
    [
        ({"matters": 0.05}, "The difference that matters must be"),
        ({"matters": "RD 200%"}, "The difference that matters cannot"),
        ({"adjusted": "x"}, "The adjusted effect must be"),
    ],
)
def test_a_sentence_calls_an_option_by_a_noun(given: dict[str, Any], start: str) -> None:
    """Not "the matters", nor "the adjusted"."""
    with pytest.raises(ValueError, match=f"^{start} "):
        answer(*TABLE, **given)


def test_an_argument_that_is_not_there() -> None:
    """A name that is misspelt is a mistake of the program that calls."""
    with pytest.raises(TypeError, match="basline"):
        answer(*TABLE, basline="12%")


def test_a_record_gives_the_same_of_each_outcome() -> None:
    """Each of them as one table alone, with its name."""
    record = worked_example()
    published: Any = file_json(record)
    assert json.loads(json.dumps(published, allow_nan=False)) == published
    assert (published["format"], len(published["outcomes"])) == (1, len(record.outcomes))
    for outcome, found in zip(record.outcomes, published["outcomes"], strict=True):
        alone = contract(outcome, record.choices, appraise(outcome, record.choices))
        assert found["name"] == outcome.name_text
        assert {key: found[key] for key in alone} == alone
        assert outcome.name_text in file_listing(record)


def test_an_empty_record_says_so() -> None:
    """Nothing typed yet is no mistake."""
    assert withheld(file_json(Record())["outcomes"][0]["measures"]["risk_ratio"])  # type: ignore[index]
    assert file_listing(Record())
