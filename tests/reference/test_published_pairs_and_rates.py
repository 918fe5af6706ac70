"""Every figure of published_pairs_and_rates.json against the function of ``stats`` that should give it.

As in test_published.py: to the digits that the source prints, and to an independent value of 17 digits.
"""

from __future__ import annotations

import json
import math
from collections.abc import Callable, Mapping
from pathlib import Path
from statistics import NormalDist
from typing import Any

import pytest

from fourcount.stats import mcnemar, pair_contrasts, pairs, rates, risk
from fourcount.stats.results import Gap, Interval, PairCounts, Rates

DOCUMENT = json.loads((Path(__file__).parent / "published_pairs_and_rates.json").read_text(encoding="utf-8"))
ENTRIES: dict[str, dict[str, Any]] = {entry["id"]: entry for entry in DOCUMENT["entries"]}

RULE_OF_THREE = "3/n stands for the exact bound, which is what the program gives"
SKIPPED = {
    ("rule3-14", "rule_pct"): RULE_OF_THREE,
    ("rule3-842", "a_per1000"): RULE_OF_THREE,
    ("rule3-842", "b_per10000"): RULE_OF_THREE,
}
"""The figures that no function gives, with the reason."""

RELATIVE = 1e-11

Figures = Mapping[str, float]


def _pairs(entry: dict[str, Any]) -> PairCounts:
    return PairCounts(**{"both": 0, "neither": 0, **entry["inputs"]})


def _number(value: float | Gap) -> float:
    assert not isinstance(value, Gap), value
    return value


def _limits(interval: Interval | Gap, prefix: str = "", low: str = "lower", high: str = "upper") -> Figures:
    assert isinstance(interval, Interval), interval
    return {prefix + low: interval.low, prefix + high: interval.high}


def _chi_square(p: float) -> float:
    """The chi-square of one degree of freedom that a p belongs to, since the tests answer in p."""
    return NormalDist().inv_cdf(p / 2) ** 2


def _mcnemar(entry: dict[str, Any]) -> Figures:
    counts = _pairs(entry)
    plain, corrected = _number(mcnemar.mcnemar(counts)), _number(mcnemar.mcnemar_corrected(counts))
    return {
        "p": plain,
        "chi2": _chi_square(plain),
        "pcc": corrected,
        "chi2cc": _chi_square(corrected),
        "exact": _number(mcnemar.mcnemar_exact(counts)),
        "midp": _number(mcnemar.mcnemar_mid_p(counts)),
        "estimate": _number(pairs.odds_ratio(counts)),
    }


def _of_pairs(
    method: Callable[[PairCounts, float], Interval | Gap], estimate: Callable[[PairCounts], float | Gap]
) -> Callable[[dict[str, Any]], Figures]:
    def figures(entry: dict[str, Any]) -> Figures:
        counts = _pairs(entry)
        return {"estimate": _number(estimate(counts)), **_limits(method(counts, entry["level"]))}

    return figures


def _discordant(entry: dict[str, Any]) -> Figures:
    counts, level = _pairs(entry), entry["level"]
    return {
        "estimate": _number(pairs.odds_ratio(counts)),
        **_limits(pairs.exact_discordant(counts, level)),
        **_limits(pairs.mid_p_discordant(counts, level), "midp_"),
    }


def _per_hundred_thousand(entry: dict[str, Any]) -> Figures:
    counts = Rates(**entry["inputs"])
    return {
        "rate1": 1e5 * _number(rates.rate(counts.index_events, counts.index_time)),
        "rate2": 1e5 * _number(rates.rate(counts.reference_events, counts.reference_time)),
    }


def _rate_ratio(entry: dict[str, Any]) -> Figures:
    counts, level = Rates(**entry["inputs"]), entry.get("level", 0.95)
    return {
        "rr": _number(rates.rate_ratio(counts)),
        **_limits(rates.log_ratio(counts, level), "log_", "lo", "hi"),
        **_limits(rates.exact_ratio(counts, level), "ex_", "lo", "hi"),
        **_limits(rates.mid_p_ratio(counts, level), "mid_", "lo", "hi"),
    }


def _one_sided(entry: dict[str, Any]) -> Figures:
    """The printed p is that of the smaller tail, ours twice that."""
    counts = Rates(**entry["inputs"])
    return {"exact": _number(rates.binomial_exact(counts)) / 2, "midp": _number(rates.binomial_mid_p(counts)) / 2}


def _no_events(entry: dict[str, Any]) -> Figures:
    """A one-sided bound of 95% is the upper limit of a two-sided interval of 90%."""
    return {"exact_pct": 100 * _limits(risk.clopper_pearson(0, entry["inputs"]["n"], 0.90))["upper"]}


GIVEN_BY: dict[str, Callable[[dict[str, Any]], Figures]] = {
    "pairs/mcnemar": _mcnemar,
    "pair_difference/newcombe": _of_pairs(pair_contrasts.newcombe_paired, pairs.difference),
    "pair_difference/tango": _of_pairs(pair_contrasts.tango, pairs.difference),
    "pair_difference/wald": _of_pairs(pair_contrasts.wald_paired, pairs.difference),
    "pair_ratio/bonett-price": _of_pairs(pair_contrasts.bonett_price, pairs.ratio),
    "pair_ratio/log": _of_pairs(pair_contrasts.wald_log_paired_ratio, pairs.ratio),
    "pair_odds_ratio/exact-and-mid-p": _discordant,
    "rates/per-100000": _per_hundred_thousand,
    "rate_ratio": _rate_ratio,
    "rates/one-sided": _one_sided,
    "risk/no-events": _no_events,
}
"""The kind of an entry -> its figures, from the functions of ``stats``."""

FIGURES = [(key, name) for key, entry in ENTRIES.items() for name in entry["figures"]]


@pytest.mark.parametrize(("key", "name"), [figure for figure in FIGURES if figure not in SKIPPED])
def test_figure_agrees_with_its_source(key: str, name: str) -> None:
    """Each figure agrees to its printed digits and with an independent value of 17 digits."""
    entry = ENTRIES[key]
    figure, value = entry["figures"][name], GIVEN_BY[entry["kind"]](entry)[name]
    assert abs(value - float(figure["printed"])) <= figure["tolerance"] * (1 + 1e-9), value
    assert math.isclose(value, float(figure["recomputed"]), rel_tol=RELATIVE), value


def test_every_figure_is_tested_or_skipped_for_a_reason() -> None:
    """Three figures of the rule of three are no figures of ours; the other 52 of 20 entries are tested."""
    assert set(SKIPPED) <= set(FIGURES)
    assert (len(ENTRIES), len(FIGURES) - len(SKIPPED)) == (20, 52)


def test_every_entry_names_its_source_and_provenance() -> None:
    """No figure stands without a source, and its provenance is one of the three that published.json explains."""
    for entry in ENTRIES.values():
        assert entry["source"]
        assert entry["provenance"] in {"seen", "from memory", "library"}
        assert (entry["provenance"] == "library") == ("library" in entry)
