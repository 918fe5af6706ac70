"""The published dictionary of every form: its measures, strata, extras, and strict JSON throughout."""

from __future__ import annotations

import json
import math
from typing import Any

import pytest

from contract_checks import check_figure, check_number, check_number_needed, withheld
from contract_keys import METHOD_KEYS, PAIR_METHOD_KEYS, POOLED_METHOD_KEYS, RATE_METHOD_KEYS
from forms import EVERY_FORM, at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import PAIR_MEASURES, POOLED_MEASURES, RATE_MEASURES, TIMED_MEASURES
from fourcount.publish.answer import answer
from fourcount.publish.contract import PUBLISHED, contract
from fourcount.record.outcome import Design, Outcome
from fourcount.record.paper import FAMILIES, Choices, Family

EVERYWHERE = ["format", "design", "level", "intervals", "form", "measures", "methods", "adjusted_methods"]
EVERYWHERE += ["conditional_odds_ratio", "tests", "conversion", "extras", "cautions"]
KEYS_OF = {**METHOD_KEYS, **PAIR_METHOD_KEYS, **RATE_METHOD_KEYS, **POOLED_METHOD_KEYS}
SOMEWHERE = {"unit", "printed_level", "strata", "patient"}
METHODS_OF = {
    "pair_risk_index": "risk",
    "pair_risk_reference": "risk",
    "risk_index": "risk",
    "risk_reference": "risk",
    "rate_index": "rate",
    "rate_reference": "rate",
}


def published(outcome: Outcome, family: Family = "score") -> Any:
    choices = Choices(family=family)
    return contract(outcome, choices, appraise(outcome, choices))


@pytest.mark.parametrize("family", FAMILIES)
@pytest.mark.parametrize("name", EVERY_FORM)
def test_every_form_is_strict_json_with_the_same_frame(name: str, family: Family) -> None:
    """No nan, infinities as strings, and the keys that programs rely on are there in every form."""
    found = published(EVERY_FORM[name], family)
    assert json.loads(json.dumps(found, allow_nan=False)) == found
    assert [key for key in found if key not in SOMEWHERE] == EVERYWHERE
    for key, measure in found["measures"].items():
        if key == "number_needed":
            check_number_needed(measure)
        else:
            check_figure(measure)


@pytest.mark.parametrize(
    ("outcome", "form", "measures"),
    [
        (of_total(), "events-of-total", PUBLISHED),
        (paired(), "pairs", PAIR_MEASURES),
        (person_time(), "person-time", RATE_MEASURES),
        (at_time(), "risk-at-time", TIMED_MEASURES),
        (effect_only(), "effect-only", ("hazard_ratio",)),
        (strata(), "strata", PUBLISHED),
    ],
)
def test_each_form_has_the_measures_of_its_own(outcome: Outcome, form: str, measures: tuple[str, ...]) -> None:
    """Under the same name in every version."""
    found = published(outcome)
    assert found["form"] == form
    assert tuple(found["measures"]) == measures


@pytest.mark.parametrize(
    "outcome", [paired(), person_time(), strata(), of_total(icc_text="0.1", cluster_size_text="9")]
)
@pytest.mark.parametrize("family", FAMILIES)
def test_a_measure_stands_by_its_own_method(outcome: Outcome, family: Family) -> None:
    """The interval of a measure is the one of the method it names, and every method of the table is there."""
    found = published(outcome, family)
    for measure, figure in found["measures"].items():
        if measure == "number_needed" or withheld(figure) or withheld(figure["low"]):
            continue
        methods = found["methods"][measure]
        assert set(methods) == KEYS_OF[METHODS_OF.get(measure, measure)]
        assert methods[figure["method"]] == [figure["low"], figure["high"]]


def test_pairs_are_answered_from_their_counts() -> None:
    """Both, index only, reference only, neither: 20/40 by whole numbers, and the others as pairs."""
    found: Any = answer(30, 20, 40, 110, design="paired")
    assert found["measures"]["pair_odds_ratio"]["estimate"] == pytest.approx(0.5)
    assert found["conditional_odds_ratio"] == pytest.approx(0.5)
    assert found["measures"]["pair_difference"]["estimate"] == pytest.approx(-0.1)
    assert set(found["tests"]) == {"mcnemar-exact", "mcnemar-mid-p", "mcnemar", "mcnemar-corrected"}
    assert withheld(found["conversion"])


def test_a_matched_study_withholds_all_but_its_odds_ratio() -> None:
    """In measures and in methods."""
    found: Any = answer(30, 20, 40, 110, design="matched")
    for measure in PAIR_MEASURES[:-1]:
        assert withheld(found["measures"][measure])
        if measure != "number_needed":
            assert all(withheld(method) for method in found["methods"][measure].values())
    assert not withheld(found["measures"]["pair_odds_ratio"])


def test_the_pairs_that_differ_are_enough_for_an_odds_ratio() -> None:
    """What needs the others is withheld with that reason."""
    found = published(paired("matched", ("", 20, 40, "")))
    assert found["measures"]["pair_odds_ratio"]["estimate"] == pytest.approx(0.5)
    assert found["conditional_odds_ratio"] == pytest.approx(0.5)


def test_person_time_says_its_unit() -> None:
    """Rates are events in one of it, unrounded."""
    found = published(person_time())
    assert found["unit"] == "person-years"
    assert found["measures"]["rate_index"]["estimate"] == 38 / 4120


@pytest.mark.parametrize(("outcome", "level"), [(at_time(level="90%"), 0.9), (effect_only(), 0.95)])
def test_what_is_printed_says_the_level_of_the_print(outcome: Outcome, level: float) -> None:
    """The record's own level stands beside it."""
    found = published(outcome)
    assert found["printed_level"] == pytest.approx(level)
    assert found["level"] == pytest.approx(0.95)


def test_strata_are_nested_beside_the_crude_measures() -> None:
    """Pooled measures, tests, and each stratum with its counts."""
    found = published(strata())
    nested = found["strata"]
    assert tuple(nested["pooled"]) == POOLED_MEASURES
    for figure in nested["pooled"].values():
        check_figure(figure)
    assert nested["test"]["method"] == "cmh"
    assert nested["homogeneity"]["degrees"] == 1
    check_number(nested["homogeneity"]["p"], 0, 1)
    assert tuple(nested["interactions"]) == POOLED_MEASURES
    for apart in nested["interactions"].values():
        check_number(apart["p"], 0, 1)
        check_figure({key: value for key, value in apart.items() if key != "p"})
    assert [stratum["label"] for stratum in nested["strata"]] == ["under 65", "65 and over"]
    assert nested["strata"][0]["counts"]["index_events"] == 10
    assert set(found["methods"]) >= set(POOLED_MEASURES)
    assert set(found["tests"]) == {"cmh", "cmh-corrected"}


def test_extras_hold_what_stands_beside_the_table() -> None:
    """Losses by scenario, clusters, the printed adjusted effect in its own unit."""
    outcome = of_total(
        first_lost_text="20", second_lost_text="10", icc_text="0.02", cluster_size_text="21",
        adjusted_text="0.61 (0.42 to 0.88)", adjusted_for_text="age",
    )  # fmt: skip
    extras = published(outcome)["extras"]
    assert extras["clusters"]["design_effect"] == pytest.approx(1.4)
    assert set(extras["losses"]["scenarios"]) == {"none", "all", "worst", "best"}
    check_figure(extras["losses"]["scenarios"]["worst"]["risk_difference"], -1, 1)
    assert (extras["adjusted"]["estimate"], extras["adjusted"]["low"]) == (0.61, 0.42)
    assert withheld(extras["fragility"])
    alone = published(effect_only())["extras"]
    assert alone["recovered"]["standard_error"] == pytest.approx(0.1312, abs=5e-5)
    assert published(of_total(design="cohort"))["extras"]["e_value"]["of"] == "risk_ratio"
    assert published(of_total())["extras"]["fragility"]["changes"] == 13


@pytest.mark.parametrize(
    "outcome",
    [paired(counts=("", "", "", "")), person_time(("", "", "", "")), at_time(("", "", "", "")), strata(rows=())],
)
def test_a_form_that_is_not_whole_is_withheld(outcome: Outcome) -> None:
    """Before its numbers are there, everything is withheld with that reason."""
    found = published(outcome)
    for part in (*found["measures"].values(), found["methods"], found["tests"], found["conversion"]):
        assert withheld(part)


@pytest.mark.parametrize("design", ["matched", "paired"])
def test_pairs_that_differ_alone_have_all_methods_and_tests(design: Design) -> None:
    """12 against 5 by hand: McNemar's chi-square (7²/17) has p 0.0896; the odds ratio's log limits 2.4 exp(±1.96 s)."""
    found = published(paired(design, ("", 12, 5, "")))
    low, high = found["methods"]["pair_odds_ratio"]["log"]
    spread = math.exp(1.959964 * math.sqrt(1 / 12 + 1 / 5))
    assert (low, high) == (pytest.approx(2.4 / spread), pytest.approx(2.4 * spread))
    assert found["tests"]["mcnemar"] == pytest.approx(math.erfc(math.sqrt(49 / 17 / 2)))
    assert set(found["tests"]) == {"mcnemar", "mcnemar-corrected", "mcnemar-exact", "mcnemar-mid-p"}
    reason = "design-matched" if design == "matched" else "concordant-pairs-unknown"
    assert found["methods"]["pair_difference"]["tango"]["withheld"] == reason
    swapped = published(paired(design, ("", 12, 5, ""), index_group="second"))
    assert swapped["methods"]["pair_odds_ratio"]["log"][0] == pytest.approx(1 / high)
