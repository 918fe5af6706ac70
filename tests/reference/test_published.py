"""Every figure of published.json against the function of ``stats`` that should give it.

Each figure is tested twice: to the digits that its source prints, and to an independent value of 17 digits.
Sources and provenance stand beside each figure in published.json ("from memory" is said there).
"""

from __future__ import annotations

import json
import math
from collections.abc import Callable, Mapping
from pathlib import Path
from statistics import NormalDist
from typing import Any, Literal

import pytest

from fourcount.stats import (
    association,
    baptista_pike,
    conditional,
    conversion,
    difference,
    estimates,
    fisher,
    normal,
    odds,
    ratio,
    risk,
)
from fourcount.stats.number_needed import NumberNeeded, number_needed, whole_number_needed
from fourcount.stats.results import Counts, Gap, Interval

DOCUMENT = json.loads((Path(__file__).parent / "published.json").read_text(encoding="utf-8"))
ENTRIES: dict[str, dict[str, Any]] = {entry["id"]: entry for entry in DOCUMENT["entries"]}

SKIPPED = {
    "p1-wald-cc-81-263": "Wald with a continuity correction is not among the methods",
    "p1-wald-cc-0-20": "Wald with a continuity correction is not among the methods",
    "p1-wald-cc-1-29": "Wald with a continuity correction is not among the methods",
}
"""The entries that no function gives, with the reason."""

RELATIVE = 1e-11
LOOSER = {
    "x-1e6-or-midp": (1e-9, "a root over 10^6 a group in doubles: nine digits are promised"),
    "x-1e7-or-exact": (1e-9, "a root over 10^7 a group in doubles: nine digits are promised"),
    "x-z-underflow": (1e-8, "p at z=38 is subnormal: a double keeps 8 digits of it"),
}
"""Entries whose 17 digits a double cannot be held to, with the tolerance and the reason."""

Figures = Mapping[str, float]


def _limits(interval: Interval | Gap) -> Figures:
    assert isinstance(interval, Interval), interval
    return {"lower": interval.low, "upper": interval.high}


def _of_risk(function: Callable[..., Interval | Gap]) -> Callable[[dict[str, Any]], Figures]:
    return lambda entry: _limits(function(entry["inputs"]["events"], entry["inputs"]["total"], entry["level"]))


def _of_counts(
    function: Callable[..., Interval | Gap], estimate: Callable[[Counts], float | Gap]
) -> Callable[[dict[str, Any]], Figures]:
    def figures(entry: dict[str, Any]) -> Figures:
        counts = Counts(**entry["inputs"])
        return {**_limits(function(counts, entry["level"])), "estimate": _number(estimate(counts))}

    return figures


def _number(value: float | Gap) -> float:
    assert not isinstance(value, Gap), value
    return float(value)


def _wald_difference(entry: dict[str, Any]) -> Figures:
    """Wald's limits; where the printed interval has no width ours is a gap, and the bare formula is tested."""
    counts = Counts(**entry["inputs"])
    interval = difference.wald(counts, entry["level"])
    if not isinstance(interval, Gap):
        return _limits(interval)
    assert interval.key == "zero-width"
    first, second = counts.index_events / counts.index_total, counts.reference_events / counts.reference_total
    variance = first * (1 - first) / counts.index_total + second * (1 - second) / counts.reference_total
    half = normal.quantile(entry["level"]) * math.sqrt(variance)
    return {"lower": first - second - half, "upper": first - second + half}


def _risk_ratio(entry: dict[str, Any]) -> Figures:
    return {"estimate": _number(estimates.risk_ratio(Counts(**entry["inputs"])))}


def _odds_ratio(entry: dict[str, Any]) -> Figures:
    counts = Counts(**entry["inputs"])
    value = _number(estimates.odds_ratio(counts))
    return {
        "estimate": value,
        "reciprocal": 1 / value,
        "log": math.log(value),
        "risk1_pct": 100 * _number(estimates.risk(counts.index_events, counts.index_total)),
        "risk2_pct": 100 * _number(estimates.risk(counts.reference_events, counts.reference_total)),
    }


def _fisher(entry: dict[str, Any]) -> Figures:
    counts = Counts(**entry["inputs"])
    return {
        "p_two": _number(fisher.fisher(counts)),
        "p_less": _number(fisher.fisher_less(counts)),
        "p_greater": _number(fisher.fisher_greater(counts)),
        "estimate": _number(conditional.conditional_odds_ratio(counts)),
    }


def _chi_square(entry: dict[str, Any]) -> Figures:
    """The chi-square that Pearson's p belongs to, since the function answers in p."""
    p = _number(association.pearson(Counts(**entry["inputs"])))
    return {"chi2": NormalDist().inv_cdf(p / 2) ** 2}


def _carried(effect: Literal["risk_ratio", "odds_ratio"], key: str) -> Callable[[dict[str, Any]], Figures]:
    """Fewer per 1000 and the number needed, rounded up, of an effect at an assumed risk."""

    def figures(entry: dict[str, Any]) -> Figures:
        baseline = entry["inputs"]["acr"]
        change = _number(conversion.risk_with(effect, entry["inputs"][key], baseline)) - baseline
        needed = number_needed(change, Interval(low=change, high=change), True)
        assert needed.kind == "NNTB"
        return {"per1000": -1000 * change, "nnt_ceiling": math.ceil(needed.estimate)}

    return figures


def _relative_reduction(entry: dict[str, Any]) -> Figures:
    """The printed example: 3% against 4%, a risk ratio of 0.75."""
    value = _number(estimates.risk_ratio(_of_hundred(3, 4)))
    assert math.isclose(value, entry["inputs"]["rr"])
    return {"rrr_pct": 100 * (1 - value)}


def _of_hundred(index: int, reference: int, total: int = 100) -> Counts:
    return Counts(
        index_events=index,
        index_non_events=total - index,
        reference_events=reference,
        reference_non_events=total - reference,
    )


def _through_infinity(entry: dict[str, Any]) -> Figures:
    """The printed reduction of 10% (-5% to 25%) is a difference of -10% (-25% to 5%) of an unwelcome event."""
    inputs = entry["inputs"]
    interval = Interval(low=-inputs["arr_upper"], high=-inputs["arr_lower"])
    needed: NumberNeeded = number_needed(-inputs["arr"], interval, True)
    assert (needed.kind, needed.low.kind, needed.high.kind) == ("NNTB", "NNTB", "NNTH")
    assert needed.through_infinity
    return {"nntb": needed.estimate, "nntb_limit": needed.low.value, "nnth_limit": needed.high.value}


def _number_needed_of_risks(entry: dict[str, Any]) -> Figures:
    """Risks of 1000 people a group; the number needed is rounded up by integer arithmetic on the counts."""
    inputs = entry["inputs"]
    counts = _of_hundred(round(1000 * inputs["p_active"]), round(1000 * inputs["p_control"]), 1000)
    value = _number(estimates.risk_ratio(counts))
    whole = whole_number_needed(counts)
    assert whole is not None
    reduction = -_number(estimates.risk_difference(counts))
    return {"risk_ratio": value, "rrr": 1 - value, "arr": reduction, "nnt_ceiling": whole}


def _conversion_of_risks(entry: dict[str, Any]) -> Figures:
    inputs = entry["inputs"]
    counts = _of_hundred(round(1000 * inputs["p1"]), round(1000 * inputs["p0"]), 1000)
    value = _number(estimates.odds_ratio(counts))
    return {
        "odds_ratio": value,
        "risk_ratio": _number(estimates.risk_ratio(counts)),
        "rr_zhang_yu": conversion.risk_ratio_from_odds_ratio(value, inputs["p0"]),
    }


def _conversion(entry: dict[str, Any]) -> Figures:
    return {"risk_ratio": conversion.risk_ratio_from_odds_ratio(entry["inputs"]["or"], entry["inputs"]["p0"])}


def _conversion_at_edges(entry: dict[str, Any]) -> Figures:
    cases = zip("abc", entry["inputs"]["cases"], strict=True)
    return {key: conversion.risk_ratio_from_odds_ratio(value, baseline) for key, (value, baseline) in cases}


def _per_thousand(entry: dict[str, Any]) -> Figures:
    counts = Counts(**entry["inputs"])
    return {
        "r1": 1000 * _number(estimates.risk(counts.index_events, counts.index_total)),
        "r0": 1000 * _number(estimates.risk(counts.reference_events, counts.reference_total)),
        "ar": 1000 * _number(estimates.risk_difference(counts)),
    }


def _upper_limits(entry: dict[str, Any]) -> Figures:
    inputs = (entry["inputs"]["events"], entry["inputs"]["total"], entry["level"])
    return {
        "wilson_upper": _limits(risk.wilson(*inputs))["upper"],
        "cp_upper": _limits(risk.clopper_pearson(*inputs))["upper"],
    }


def _normal_tails(entry: dict[str, Any]) -> Figures:
    return {f"p{z}": normal.two_sided_p(z) for z in entry["inputs"]["z"]}


GIVEN_BY: dict[str, Callable[[dict[str, Any]], Figures]] = {
    "risk/wald": _of_risk(risk.wald),
    "risk/wilson": _of_risk(risk.wilson),
    "risk/wilson-continuity": _of_risk(risk.wilson_continuity),
    "risk/clopper-pearson": _of_risk(risk.clopper_pearson),
    "risk/mid-p": _of_risk(risk.mid_p),
    "risk/agresti-coull": _of_risk(risk.agresti_coull),
    "risk/upper-limits": _upper_limits,
    "risk_difference/wald": _wald_difference,
    "risk_difference/mee": _of_counts(difference.mee, estimates.risk_difference),
    "risk_difference/miettinen-nurminen": _of_counts(difference.miettinen_nurminen, estimates.risk_difference),
    "risk_difference/newcombe": _of_counts(difference.newcombe, estimates.risk_difference),
    "risk_difference/newcombe-continuity": _of_counts(difference.newcombe_continuity, estimates.risk_difference),
    "risk_difference/agresti-caffo": _of_counts(difference.agresti_caffo, estimates.risk_difference),
    "risk_ratio/estimate": _risk_ratio,
    "risk_ratio/katz": _of_counts(ratio.katz, estimates.risk_ratio),
    "risk_ratio/walter": _of_counts(ratio.walter, estimates.risk_ratio),
    "risk_ratio/koopman": _of_counts(ratio.koopman, estimates.risk_ratio),
    "odds_ratio/estimate": _odds_ratio,
    "odds_ratio/woolf": _of_counts(odds.woolf, estimates.odds_ratio),
    "odds_ratio/gart": _of_counts(odds.gart, estimates.odds_ratio),
    "odds_ratio/miettinen-nurminen": _of_counts(odds.miettinen_nurminen, estimates.odds_ratio),
    "odds_ratio/conditional-exact": _of_counts(conditional.conditional_exact, conditional.conditional_odds_ratio),
    "odds_ratio/conditional-mid-p": _of_counts(conditional.conditional_mid_p, conditional.conditional_odds_ratio),
    "odds_ratio/baptista-pike": _of_counts(baptista_pike.baptista_pike, conditional.conditional_odds_ratio),
    "test/fisher": _fisher,
    "test/pearson": _chi_square,
    "carried/risk-ratio": _carried("risk_ratio", "rr"),
    "carried/odds-ratio": _carried("odds_ratio", "or"),
    "relative-reduction": _relative_reduction,
    "number-needed/interval": _through_infinity,
    "number-needed/risks": _number_needed_of_risks,
    "conversion/risks": _conversion_of_risks,
    "conversion/formula": _conversion,
    "conversion/edges": _conversion_at_edges,
    "risks-per-thousand": _per_thousand,
    "normal/two-sided": _normal_tails,
}
"""The kind of an entry -> its figures, from the functions of ``stats``."""


def _agrees_in_print(figure: dict[str, Any], value: float) -> bool:
    if figure["printed"] == "<0":
        return value < 0
    if "tolerance" not in figure:  # figures below the normal doubles have a relative one
        return math.isclose(value, float(figure["printed"]), rel_tol=1e-8, abs_tol=5e-324)
    return abs(value - float(figure["printed"])) <= float(figure["tolerance"]) * (1 + 1e-9)


@pytest.mark.parametrize("key", [key for key in ENTRIES if key not in SKIPPED])
def test_figure_agrees_with_its_source(key: str) -> None:
    """Each figure agrees to its printed digits and with an independent value of 17 digits."""
    entry = ENTRIES[key]
    values = GIVEN_BY[entry["kind"]](entry)
    relative, _reason = LOOSER.get(key, (RELATIVE, ""))
    for name, figure in entry["figures"].items():
        assert _agrees_in_print(figure, values[name]), (name, figure, values[name])
        recomputed = float(figure["recomputed"])
        assert math.isclose(values[name], recomputed, rel_tol=relative, abs_tol=1e-15), (name, figure, values[name])


def test_skipped_entries_are_counted() -> None:
    """Three entries have no function of ours, each for a stated reason; all the others are tested."""
    assert len(SKIPPED) == 3
    assert set(SKIPPED) <= set(ENTRIES)
    assert len(ENTRIES) - len(SKIPPED) == 93


def test_every_entry_names_its_source_and_provenance() -> None:
    """No figure stands without a source, and its provenance is one of the three that the file explains."""
    for entry in ENTRIES.values():
        assert entry["source"]
        assert entry["provenance"] in {"seen", "from memory", "library"}
        assert (entry["provenance"] == "library") == ("library" in entry)
