"""When the cautions of an effect that is carried hold. All figures are invented."""

from __future__ import annotations

import pytest

from forms import at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.cautions import caution_text

ADJUSTED = {"adjusted_text": "OR 0.45 (90% CI 0.30 to 0.70)"}
HAZARDS = {"adjusted_text": "HR 0.6 (0.4 to 0.9)"}
OVERALL = {"start_kind": "overall", "overall_risk_text": "12%", "exposed_share_text": "30%"}
OF_CARRYING = {
    "effect-kept-constant", "effect-kept-elsewhere", "difference-kept-constant", "baseline-far", "baseline-uncertain",
    "hazard-ratio", "constant-rates", "other-span", "solved-from-overall", "from-a-rate",
    "within-pairs", "adjusted-opposite", "adjusted-turned", "carried-level", "adjusted-converted",
    "rests-on-baseline", "controls-over-time", "observational", "crude-beside-adjusted",
}  # fmt: skip


def facts(make, *arguments, patient=None, **fields):
    """The facts of the cautions about carrying that hold, by key; each has a sentence without a hole."""
    outcome = make(
        *arguments, **fields, patient=Patient(**({"starting_risk_text": "12%"} if patient is None else patient))
    )
    held = [one for one in appraise(outcome, Choices()).cautions if one.key in OF_CARRYING]
    for one in held:
        said = caution_text(one)
        assert said.endswith(".")
        assert not {"{", "…", "this starting risk"} & {
            word for word in ("{", "…", "this starting risk") if word in said
        }
    return {one.key: one.facts for one in held}


def test_an_effect_kept_constant_is_named():
    """A ratio at a bare risk near the study's own: kept constant, and the range leaves the start out."""
    assert set(facts(of_total)) == {"effect-kept-constant", "baseline-uncertain"}


@pytest.mark.parametrize("typed", ["24 of 200", "12% (9 to 15)"])
def test_a_starting_risk_with_limits_leaves_nothing_out(typed):
    """The range holds both imprecisions, and the odds ratio's limits are not converted as if it were certain."""
    found = facts(of_total, patient={"starting_risk_text": typed, "effect": "odds_ratio"})
    assert set(found) == {"effect-kept-constant"}


def test_a_difference_kept_constant_is_doubted_more_than_a_ratio():
    """Differences vary with the starting risk; of it, the interval leaves nothing out."""
    found = facts(of_total, patient={"starting_risk_text": "12%", "effect": "risk_difference"})
    assert set(found) == {"difference-kept-constant"}
    assert found["difference-kept-constant"]["study"] == pytest.approx(70 / 409)
    assert facts(effect_only, "risk_difference", "-8% (-13% to -3%)") == {
        "difference-kept-constant": {"baseline": 0.12}
    }


def test_three_risks_are_each_looked_at_for_their_distance():
    """5% and 40% lie outside half to twice 17.1%, 12% does not."""
    typed = {"start_kind": "three", "low_risk_text": "5%", "starting_risk_text": "12%", "high_risk_text": "40%"}
    outcome = of_total(patient=Patient(**typed))
    far = [one.facts["baseline"] for one in appraise(outcome, Choices()).cautions if one.key == "baseline-far"]
    assert far == [0.05, 0.4]


@pytest.mark.parametrize(
    ("make", "rest", "key"),
    [
        (effect_only, {}, "hazard-ratio"),
        (
            lambda **fields: of_total(design="cohort", adjusted_text="HR 0.6 (0.4 to 0.9)", **fields),
            {},
            "hazard-ratio",
        ),
        (person_time, {}, "constant-rates"),
        (of_total, {"other_span_text": "5 years"}, "other-span"),
        (of_total, {"starting_risk_text": "", "other_span_text": "5 years"}, "other-span"),
        (of_total, OVERALL, "solved-from-overall"),
        (of_total, {"start_kind": "rate", "rate_text": "12% per year"}, "from-a-rate"),
        (lambda **fields: paired("matched", **fields), {}, "within-pairs"),
        (lambda **fields: paired("paired", **fields), {"effect": "odds_ratio"}, "within-pairs"),
        (lambda **fields: paired("matched", **fields), {}, "rests-on-baseline"),
        (lambda **fields: paired("matched", **fields), {}, "controls-over-time"),
        (paired, {}, "effect-kept-constant"),
        (at_time, {}, "effect-kept-constant"),
        (person_time, {}, "effect-kept-elsewhere"),
        (lambda **fields: of_total(design="cohort", **ADJUSTED, **fields), {}, "adjusted-converted"),
    ],
)
def test_what_each_way_of_carrying_assumes(make, rest, key):
    """It is said where it is assumed, and of a table's own risk ratio at a bare risk only that it is kept constant."""
    assert key in facts(make, patient={"starting_risk_text": "12%", **rest})
    assert (key in facts(of_total)) == (key == "effect-kept-constant")


def test_a_hazard_ratio_that_is_carried_says_what_that_takes_for_granted():
    """One caution says it, in other words where the hazard ratio is only shown."""
    assert facts(effect_only)["hazard-ratio"] == {"value": 0.72, "carried": "hazard_ratio"}
    assert facts(effect_only, patient={})["hazard-ratio"] == {"value": 0.72}


def test_a_rate_over_another_span_is_said_to_be_constant_once():
    """That hazards go on as they are says it of both groups."""
    typed = {"start_kind": "rate", "rate_text": "12% per year", "other_span_text": "5 years"}
    assert "from-a-rate" not in facts(of_total, patient=typed)


def test_an_adjusted_odds_ratio_at_the_studys_own_risk_names_it_as_the_study_does():
    """70 of 409 is 17.1% in the table and in the caution."""
    outcome = of_total(design="cohort", **ADJUSTED)
    (said,) = [caution_text(one) for one in appraise(outcome, Choices()).cautions if one.key == "adjusted-converted"]
    assert "at 17.1% as if" in said


def test_a_solved_starting_risk_is_no_bare_one():
    """What its range leaves out is said in its own words."""
    assert "baseline-uncertain" not in facts(of_total, patient=OVERALL)


@pytest.mark.parametrize(
    ("make", "crude"),
    [
        (lambda **fields: of_total(design="cohort", **fields), "risk_ratio"),
        (strata, "risk_ratio"),
        (lambda **fields: paired("matched", **fields), "odds_ratio"),
        (lambda **fields: effect_only("odds_ratio", design="cohort", **fields), "odds_ratio"),
    ],
)
def test_a_crude_effect_that_is_carried_outside_trials_is_called_crude_once(make, crude):
    """The caution about confounding names it; at the study's own risk no effect is carried, and none is named."""
    carried = facts(make)["observational"]
    assert (carried["effect"], carried["baseline"], "beside" in carried) == (crude, 0.12, False)
    assert "effect" not in facts(make, patient={})["observational"]


def test_beside_an_adjusted_effect_the_crude_one_says_what_could_be_carried_instead():
    """Confounding is said of both, and that the figures are crude where the adjusted one is named."""
    odds = {"starting_risk_text": "12%", "effect": "odds_ratio"}
    crude = facts(of_total, design="cohort", patient=odds, **ADJUSTED)
    assert crude["observational"] == {"design": "cohort", "beside": "adjusted"}
    assert (crude["crude-beside-adjusted"]["effect"], "carriable" in crude["crude-beside-adjusted"]) == (
        "odds_ratio",
        True,
    )
    adjusted = facts(of_total, design="cohort", **ADJUSTED)
    assert "effect" not in adjusted["crude-beside-adjusted"]
    rates = facts(
        of_total, design="cohort", adjusted_text="rate difference -2 (-3 to -1)", adjusted_measure="rate_difference"
    )
    assert ("effect" in rates["crude-beside-adjusted"], "carriable" in rates["crude-beside-adjusted"]) == (True, False)


@pytest.mark.parametrize(
    ("make", "fields"),
    [(of_total, {}), (effect_only, {"design": "trial"}), (paired, {})],
)
def test_no_crude_effect_in_trials(make, fields):
    """Randomisation deals with it."""
    assert not {"observational", "crude-beside-adjusted"} & set(facts(make, **fields))


def test_a_case_control_study_says_each_thing_once():
    """With a starting risk: what all rests on, how controls were sampled, and confounding; no more."""
    said = [
        one.key
        for one in appraise(
            of_total(design="case-control", patient=Patient(starting_risk_text="12%")), Choices()
        ).cautions
    ]
    assert said == ["baseline-uncertain", "rests-on-baseline", "controls-over-time", "observational"]
    printed = appraise(
        effect_only("odds_ratio", design="case-control", patient=Patient(starting_risk_text="12%")), Choices()
    )
    assert {"effect-kept-elsewhere", "totals-are-sampled"}.isdisjoint(one.key for one in printed.cautions)


@pytest.mark.parametrize(
    ("typed", "key", "risk"),
    [
        ({"start_kind": "rate", "rate_text": "12 per 100 person-years"}, "from-a-rate", "11.3%"),
        (OVERALL, "solved-from-overall", "13.9%"),
        ({"starting_risk_text": "11.31%"}, "effect-kept-constant", "11.31%"),
    ],
)
def test_a_starting_risk_that_was_worked_out_has_a_computed_ones_digits(typed, key, risk):
    """What was typed is said as typed."""
    outcome = of_total(patient=Patient(**typed))
    (said,) = [caution_text(one) for one in appraise(outcome, Choices()).cautions if one.key == key]
    assert f" {risk} " in said


def test_no_span_is_left_where_only_one_is_known():
    """A hazard ratio at a rate over five years, the study's span unknown: nothing is carried between spans."""
    typed = {"start_kind": "rate", "rate_text": "1% per year", "other_span_text": "5 years"}
    found = facts(effect_only, patient=typed, span_text="")
    assert ("other-span" in found, "from-a-rate" in found) == (False, True)


@pytest.mark.parametrize("span", ["", "5 years"])
def test_that_rates_stay_constant_is_said_once(span):
    """Of a rate ratio at a rate, over one span or two."""
    found = facts(person_time, patient={"start_kind": "rate", "rate_text": "12% per year", "other_span_text": span})
    assert len({"other-span", "constant-rates", "from-a-rate"} & set(found)) == 1


def test_an_adjusted_effect_on_the_other_side_is_called_out():
    """The table says fewer and the print more: perhaps it is of the other group against this one."""
    found = facts(of_total, design="cohort", adjusted_text="OR 2.2 (1.4 to 3.3)")
    assert found["adjusted-opposite"] == {"effect": "odds_ratio", "first": "Night lights", "second": "Usual care"}
    assert "adjusted-opposite" not in facts(of_total, design="cohort", **ADJUSTED)


@pytest.mark.parametrize(
    ("fields", "turned"),
    [
        ({}, False),
        ({"index_group": "second"}, True),
        ({"counted": "right"}, True),
        ({"index_group": "second", "counted": "right"}, False),
    ],
)
def test_an_adjusted_effect_that_was_turned_says_so(fields, turned):
    """It is taken as printed of the first group and the left outcome."""
    assert turned == ("adjusted-turned" in facts(of_total, design="cohort", **ADJUSTED, **fields))


def test_an_adjusted_effect_keeps_the_level_of_its_print():
    """90% limits stay 90% limits beside a record at 95%."""
    assert facts(of_total, design="cohort", **ADJUSTED)["carried-level"] == {"level": 0.90, "chosen": 0.95}
    assert "carried-level" not in facts(of_total, design="cohort", adjusted_text="OR 0.45 (0.30 to 0.70)")
