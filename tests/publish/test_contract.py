"""The published dictionary: its keys, its nesting, and that every table keeps to them."""

from __future__ import annotations

import json
from itertools import product
from typing import Any

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from contract_checks import check_figure, check_number, check_number_needed, check_ordered, check_patient, withheld
from contract_keys import METHOD_KEYS, TEST_KEYS
from fourcount.appraisal.appraise import appraise
from fourcount.publish.answer import answer
from fourcount.publish.contract import contract
from fourcount.record.outcome import DESIGNS, PAIRED_DESIGNS, Outcome, Patient
from fourcount.record.paper import FAMILIES, Choices

MEASURES = ["risk_index", "risk_reference", "risk_difference", "number_needed", "risk_ratio", "odds_ratio"]
METHODS = {
    "risk_index": METHOD_KEYS["risk"],
    "risk_reference": METHOD_KEYS["risk"],
    **{measure: METHOD_KEYS[measure] for measure in ("risk_difference", "risk_ratio", "odds_ratio")},
}
KEYS = ["format", "design", "level", "intervals", "form", "measures", "methods", "adjusted_methods"]
KEYS += ["conditional_odds_ratio", "tests", "conversion", "extras", "cautions"]
UNPAIRED = tuple(design for design in DESIGNS if design not in PAIRED_DESIGNS)

TABLES = [
    (15, 85, 5, 95),
    (38, 374, 70, 339),
    (0, 0, 0, 0),
    (0, 10, 0, 10),
    (10, 0, 10, 0),
    (10, 0, 0, 10),
    (0, 10, 10, 0),
    (0, 10, 3, 7),
    (3, 7, 0, 10),
    (3, 7, 10, 0),
    (5, 5, 5, 5),
    (0, 0, 3, 7),
    (3, 7, 0, 0),
    (1, 0, 0, 0),
    (10**6, 10**6, 10**5, 10**6),
]


def check_methods(published: dict[str, Any]) -> None:
    assert set(published["methods"]) == set(METHODS)
    for measure, methods in published["methods"].items():
        assert set(methods) == METHODS[measure]
        for pair in methods.values():
            if not withheld(pair):
                low, high = pair
                check_number(low)
                check_number(high)
                check_ordered(low, high)
    for measure, methods in published["adjusted_methods"].items():
        assert set(methods) <= METHODS[measure]
        assert set(methods.values()) == {"half"}


def check_all(published: dict[str, Any]) -> None:
    """The whole structure of one answer."""
    assert json.loads(json.dumps(published, allow_nan=False)) == published
    assert [key for key in published if key != "patient"] == KEYS
    assert published["format"] == 1
    assert list(published["measures"]) == MEASURES
    for measure in ("risk_index", "risk_reference"):
        check_figure(published["measures"][measure], 0, 1)
    check_figure(published["measures"]["risk_difference"], -1, 1)
    check_number_needed(published["measures"]["number_needed"])
    check_figure(published["measures"]["risk_ratio"], 0)
    check_figure(published["measures"]["odds_ratio"], 0)
    check_methods(published)
    check_number(published["conditional_odds_ratio"], 0)
    assert set(published["tests"]) == set(TEST_KEYS)
    for p in published["tests"].values():
        check_number(p, 0, 1)
    if not withheld(published["conversion"]):
        assert list(published["conversion"]) == ["baseline", "baseline_from", "risk_ratio"]
        assert published["conversion"]["baseline_from"] in ("reference", "given")
        check_figure(published["conversion"]["risk_ratio"], 0)
    if "patient" in published:
        check_patient(published["patient"])
    for caution in published["cautions"]:
        assert list(caution) == ["key", "text"]
        assert all(isinstance(word, str) and word for word in caution.values())


@pytest.mark.parametrize("counts", TABLES, ids=str)
def test_every_table_keeps_to_the_structure(counts: tuple[int, int, int, int]) -> None:
    """Zeros, empty groups and all events give the same keys as any other table, for every design."""
    for design, baseline in product(UNPAIRED, (None, 0.12)):
        published = answer(*counts, design=design, baseline=baseline)
        check_all(published)
        assert ("patient" in published) is (baseline is not None)


@pytest.mark.parametrize("family", FAMILIES)
def test_every_family_keeps_to_the_structure(family: str) -> None:
    """The chosen family changes which interval stands under the measures, not the structure."""
    for counts, level in product(TABLES[:10], (0.8, 0.999)):
        published = answer(*counts, intervals=family, level=level, baseline="30%", unwelcome=False)
        check_all(published)
        assert (published["intervals"], published["level"]) == (family, level)


@settings(max_examples=60)
@given(
    st.tuples(*[st.integers(0, 12)] * 4),
    st.sampled_from(UNPAIRED),
    st.sampled_from(FAMILIES),
    st.sampled_from([None, 0.0, 1.0, 0.05, 0.9, "1 in 8"]),
    st.booleans(),
)
def test_any_small_table_keeps_to_the_structure(
    counts: tuple[int, int, int, int], design: str, family: str, baseline: float | str | None, unwelcome: bool
) -> None:
    """No combination of small counts, design, family and starting risk leaves the structure."""
    check_all(answer(*counts, design=design, intervals=family, baseline=baseline, unwelcome=unwelcome))


@pytest.mark.parametrize("family", FAMILIES)
def test_a_measure_stands_by_its_own_method(family: str) -> None:
    """The interval of a measure is the one of the method it names, and corrections are named in both places."""
    for counts in TABLES:
        published: Any = answer(*counts, intervals=family)
        for measure, methods in published["methods"].items():
            figure = published["measures"][measure]
            if not withheld(figure) and not withheld(figure["low"]):
                assert methods[figure["method"]] == [figure["low"], figure["high"]]
                adjusted = published["adjusted_methods"].get(measure, {}).get(figure["method"])
                assert adjusted == figure.get("adjusted")


def test_infinities_are_strings() -> None:
    """A ratio against nobody is "inf", and so is its upper limit."""
    ratio: Any = answer(3, 7, 0, 10)["measures"]
    assert ratio["risk_ratio"]["estimate"] == "inf"
    assert ratio["risk_ratio"]["high"] == "inf"
    assert isinstance(ratio["risk_ratio"]["low"], float)


def test_an_estimate_alone_can_be_withheld() -> None:
    """No event in either group: the risk ratio is not determined, its interval is."""
    figure: Any = answer(0, 10, 0, 10)["measures"]
    assert withheld(figure["risk_ratio"]["estimate"])
    assert not withheld(figure["risk_ratio"]["low"])


def test_a_design_withholds_in_measures_and_methods() -> None:
    """A case-control study gives its odds ratio and nothing else, by any method."""
    published: Any = answer(38, 374, 70, 339, design="case-control")
    for measure in MEASURES[:-1]:
        assert withheld(published["measures"][measure])
    for measure in ("risk_index", "risk_reference", "risk_difference", "risk_ratio"):
        assert all(withheld(method) for method in published["methods"][measure].values())
    assert not withheld(published["measures"]["odds_ratio"])
    assert withheld(published["conversion"])


def test_a_correction_is_said() -> None:
    """Half a count added by the textbook family is named beside the figure and beside the methods."""
    published: Any = answer(0, 10, 3, 7, intervals="textbook")
    assert published["measures"]["odds_ratio"]["adjusted"] == "half"
    assert published["adjusted_methods"]["odds_ratio"]["woolf"] == "half"


def test_a_table_that_is_not_whole_is_withheld() -> None:
    """Before all four counts are there, every figure is withheld with that reason."""
    outcome = Outcome(patient=Patient(starting_risk_text="12%"))
    published: Any = contract(outcome, Choices(), appraise(outcome, Choices()))
    assert json.dumps(published, allow_nan=False)
    assert [key for key in published if key != "patient"] == KEYS
    for part in (*published["measures"].values(), published["methods"], published["tests"], published["patient"]):
        assert withheld(part)


def test_a_withheld_limit_stands_in_its_place_alone() -> None:
    """80% v 40% carried to 45%: the upper limit would pass 100%, and all else is given, the number needed too."""
    patient = answer(80, 20, 40, 60, baseline="45%")["patient"]
    assert isinstance(patient, dict)
    reason = "The upper limit of the risk would pass 100%, so the interval is open there."
    gone = {"withheld": "beyond-one", "text": reason}
    assert (patient["risk_with"]["high"], patient["difference"]["high"]) == (gone, gone)
    needed = patient["number_needed"]
    assert (needed["kind"], needed["low"], needed["through_infinity"]) == ("NNTH", gone, False)
    assert needed["estimate"] == pytest.approx(1 / 0.45)
    assert needed["high"]["value"] == pytest.approx(1 / (patient["risk_with"]["low"] - 0.45))


def test_at_the_own_risk_the_conversion_is_the_risk_ratio() -> None:
    """The same figure with the same method: nothing is converted."""
    published = answer(38, 374, 70, 339)
    conversion, measures = published["conversion"], published["measures"]
    assert isinstance(conversion, dict)
    assert isinstance(measures, dict)
    assert (conversion["baseline_from"], conversion["risk_ratio"]) == ("reference", measures["risk_ratio"])
