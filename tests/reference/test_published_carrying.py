"""Every figure of published_carrying.json and oracle_carrying.json, and printed limits put back as margins.

A published figure is tested twice: to the digits that its source prints, and to an independent value of 17 digits.
Sources and provenance stand beside each ("from memory" is said there). The oracle's are printed nowhere: they are
those of make_carrying_oracle.py.
"""

from __future__ import annotations

import json
import math
from collections.abc import Callable, Mapping
from pathlib import Path
from typing import Any

import pytest

from fourcount.stats.conversion import risk_ratio_from_odds_ratio, risk_with
from fourcount.stats.margins import margin_p
from fourcount.stats.overall_risk import starting_risk_from_overall
from fourcount.stats.propagation import Limits, Propagated, StartLimits, limits_of_counts, propagated
from fourcount.stats.results import Counts, Gap, Interval
from reference_command import reference_command

FOLDER = Path(__file__).parent
ENTRIES: dict[str, dict[str, Any]] = {
    entry["id"]: entry for entry in json.loads((FOLDER / "published_carrying.json").read_text("utf-8"))["entries"]
}
ORACLE: list[dict[str, Any]] = json.loads((FOLDER / "oracle_carrying.json").read_text("utf-8"))["entries"]
PRINTED_LIMITS: dict[str, dict[str, Any]] = {
    entry["id"]: entry
    for entry in json.loads((FOLDER / "published.json").read_text("utf-8"))["entries"]
    if entry["kind"].endswith("/miettinen-nurminen")
}

Inputs = Mapping[str, Any]
Figures = Mapping[str, float]


def _number(value: float | Gap) -> float:
    assert isinstance(value, float), value
    return value


def _needed(difference: float) -> int:
    """Rounded up, after the float's own noise is taken off."""
    return math.ceil(1 / difference * (1 - 1e-9))


def _carried(inputs: Inputs) -> Figures:
    fewer = inputs["start"] - _number(risk_with(inputs["effect"], inputs["value"], inputs["start"]))
    return {"fewer_per_1000": 1000 * fewer, "number_needed": _needed(fewer)}


def _hazard(inputs: Inputs) -> Figures:
    start = 1 - inputs["surviving"]
    return {"number_needed": 1 / (start - _number(risk_with("hazard_ratio", inputs["value"], start)))}


def _converted(inputs: Inputs) -> Figures:
    return {"risk_ratio": risk_ratio_from_odds_ratio(inputs["odds_ratio"], inputs["start"])}


def _from_risks(inputs: Inputs) -> Figures:
    index, reference = inputs["index"], inputs["reference"]
    odds_ratio = index / (1 - index) / (reference / (1 - reference))
    return {"odds_ratio": odds_ratio, "risk_ratio": risk_ratio_from_odds_ratio(odds_ratio, reference)}


def _overall(inputs: Inputs) -> Figures:
    found = starting_risk_from_overall(inputs["measure"], inputs["effect"], inputs["overall"], inputs["exposed"])
    return {"start": _number(found)}


def _propagated(inputs: Inputs) -> Figures:
    start = limits_of_counts(inputs["events"], inputs["total"])
    assert isinstance(start, StartLimits)
    interval = Interval(low=inputs["low"], high=inputs["high"])
    found = propagated(inputs["effect"], inputs["estimate"], interval, 0.95, start)
    assert isinstance(found, Propagated)
    limits: Limits = found.difference
    return {"lower": _number(limits.low), "upper": _number(limits.high)}


GIVEN_BY: dict[str, Callable[[Inputs], Figures]] = {
    "carried": _carried,
    "hazard": _hazard,
    "risk-ratio-from-odds-ratio": _converted,
    "risk-ratio-from-two-risks": _from_risks,
    "overall": _overall,
    "propagated": _propagated,
}
"""The kind of an entry -> its figures, from the functions of ``stats``."""


@pytest.mark.parametrize("key", ENTRIES)
def test_figure_agrees_with_its_source(key: str) -> None:
    """Each figure agrees with an independent value of 17 digits and to its printed digits."""
    entry = ENTRIES[key]
    values = GIVEN_BY[entry["kind"]](entry["inputs"])
    assert set(values) == set(entry["figures"])
    for name, figure in entry["figures"].items():
        assert values[name] == pytest.approx(float(figure["recomputed"]), rel=1e-10), name
        assert abs(values[name] - float(figure["printed"])) <= figure["tolerance"] * (1 + 1e-9), name


@pytest.mark.parametrize(
    "entry", ORACLE, ids=lambda entry: "-".join((entry["kind"], *map(str, entry["inputs"].values())))
)
def test_figure_agrees_with_fifty_digits(entry: dict[str, Any]) -> None:
    """What no source prints is what the same formulas give at 50 digits, written a second time."""
    values = GIVEN_BY[entry["kind"]]({name: _value(text) for name, text in entry["inputs"].items()})
    assert set(values) == set(entry["figures"])
    for name, figure in entry["figures"].items():
        assert values[name] == pytest.approx(float(figure), rel=1e-10), name


def _value(given: str | int) -> str | float:
    """An input as ``stats`` takes it: a name, or a number that the oracle holds as a text of all its digits."""
    try:
        return float(given)
    except ValueError:
        return given


def test_the_oracle_is_what_its_command_makes() -> None:
    """No figure of it was typed."""
    assert reference_command("make_carrying_oracle").entries() == ORACLE


@pytest.mark.parametrize("key", PRINTED_LIMITS)
def test_a_printed_limit_as_a_margin_has_half_of_what_its_level_leaves(key: str) -> None:
    """Half a printed digit to either side of Miettinen and Nurminen's limits p lies on either side of (1 - level)/2."""
    entry = PRINTED_LIMITS[key]
    measure = entry["kind"].partition("/")[0]
    counts, tail = Counts(**entry["inputs"]), (1 - entry["level"]) / 2
    ends = (-1.0, 1.0) if measure == "risk_difference" else (0.0, math.inf)
    for name, side in (("lower", "fewer"), ("upper", "more")):
        figure = entry["figures"][name]
        limit, half_digit = float(figure["printed"]), figure["tolerance"] * (1 + 1e-6)
        if limit in ends or "not_reproduced" in entry:
            continue
        inner = limit + half_digit if side == "fewer" else limit - half_digit
        outer = limit - half_digit if side == "fewer" else limit + half_digit
        assert (
            _number(margin_p(measure, counts, outer, side)) <= tail <= _number(margin_p(measure, counts, inner, side))
        )
