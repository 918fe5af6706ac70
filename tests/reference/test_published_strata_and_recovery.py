"""Every figure of published_strata_and_recovery.json against the function of ``stats`` that should give it.

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

from fourcount.stats import interaction, recovery, strata
from fourcount.stats.homogeneity import breslow_day
from fourcount.stats.normal import quantile, z_of_p
from fourcount.stats.results import Counts, Gap, HomogeneityTest, Interval
from tables import counts_of

DOCUMENT = json.loads((Path(__file__).parent / "published_strata_and_recovery.json").read_text(encoding="utf-8"))
ENTRIES: dict[str, dict[str, Any]] = {entry["id"]: entry for entry in DOCUMENT["entries"]}

RELATIVE = 1e-11

Figures = Mapping[str, float]


def _strata(entry: dict[str, Any]) -> list[Counts]:
    return [counts_of(cells) for cells in entry["inputs"]["strata"]]


def _number(value: float | Gap) -> float:
    assert not isinstance(value, Gap), value
    return value


def _limits(interval: Interval | Gap, prefix: str = "") -> dict[str, float]:
    assert isinstance(interval, Interval), interval
    return {f"{prefix}lower": interval.low, f"{prefix}upper": interval.high}


def _odds_ratio(entry: dict[str, Any]) -> Figures:
    tables = _strata(entry)
    p = _number(strata.cochran_mantel_haenszel_corrected(tables))
    found = {
        "odds_ratio": _number(strata.pooled_odds_ratio(tables)),
        **_limits(strata.robins_breslow_greenland(tables, entry["level"]), "odds_ratio_"),
        "p_corrected": p,
        "chi_square_corrected": NormalDist().inv_cdf(p / 2) ** 2,  # the test answers in p
    }
    homogeneity = breslow_day(tables)
    if isinstance(homogeneity, HomogeneityTest):
        found |= {"breslow_day": homogeneity.chi_square, "breslow_day_p": homogeneity.p}
    return found


def _risks(entry: dict[str, Any]) -> Figures:
    tables, level = _strata(entry), entry["level"]
    sato = _limits(strata.sato_difference(tables, level), "sato_")
    plain = _limits(strata.greenland_robins_difference(tables, level))
    return {
        "odds_ratio": _number(strata.pooled_odds_ratio(tables)),
        "risk_ratio": _number(strata.pooled_risk_ratio(tables)),
        "risk_difference": _number(strata.pooled_risk_difference(tables)),
        **_limits(strata.greenland_robins_ratio(tables, level), "risk_ratio_"),
        **sato,
        "standard_error_sato": (sato["sato_upper"] - sato["sato_lower"]) / (2 * quantile(level)),
        "standard_error_greenland_robins": (plain["upper"] - plain["lower"]) / (2 * quantile(level)),
    }


def _interaction(entry: dict[str, Any]) -> Figures:
    first, second = tuple(entry["inputs"]["first"]), tuple(entry["inputs"]["second"])
    found = interaction.ratio_of_ratios(first, second, entry["level"])
    assert isinstance(found, interaction.Interaction), found
    return {
        "log_ratio": math.log(found.estimate),
        "standard_error": found.standard_error,
        "z": found.z,
        "p": found.p,
        "ratio": found.estimate,
        "lower": found.low,
        "upper": found.high,
    }


def _approximate_from_p(entry: dict[str, Any]) -> Figures:
    inputs = entry["inputs"]
    interval = recovery.approximate_from_p(inputs["estimate"], inputs["p"], entry["level"], inputs["log_scale"])
    limits = _limits(interval)
    width = limits["upper"] - limits["lower"]
    if inputs["log_scale"]:
        width = math.log(limits["upper"] / limits["lower"])
    return {
        **limits,
        "z": recovery.approximate_z(inputs["p"]),
        "half_width": width / 2,
        "standard_error": width / (2 * quantile(entry["level"])),
    }


def _from_limits(entry: dict[str, Any]) -> Figures:
    found = recovery.from_limits(**entry["inputs"], level=entry["level"])
    assert isinstance(found, recovery.Recovery), found
    return {"p": found.p}


def _from_p(entry: dict[str, Any]) -> Figures:
    limits = _limits(recovery.from_p(**entry["inputs"], level=entry["level"]))
    error = (limits["upper"] - limits["lower"]) / (2 * quantile(entry["level"]))
    return {"z": z_of_p(entry["inputs"]["p"]), "standard_error": error}


GIVEN_BY: dict[str, Callable[[dict[str, Any]], Figures]] = {
    "strata/odds-ratio": _odds_ratio,
    "strata/risks": _risks,
    "interaction/ratios": _interaction,
    "recovery/approximate-from-p": _approximate_from_p,
    "recovery/from-limits": _from_limits,
    "recovery/from-p": _from_p,
}
"""The kind of an entry -> its figures, from the functions of ``stats``."""


def _assert_printed(entry: dict[str, Any], values: Figures) -> None:
    for name, figure in entry["figures"].items():
        within = float(figure["tolerance"]) * (1 + 1e-9)
        assert abs(values[name] - float(figure["printed"])) <= within, (name, figure, values[name])


@pytest.mark.parametrize("key", ENTRIES)
def test_figure_agrees_with_its_source(key: str) -> None:
    """Each figure agrees to its printed digits and with an independent value of 17 digits."""
    entry = ENTRIES[key]
    if "z" in entry:
        entry = {**entry, "level": math.erf(entry["z"] / math.sqrt(2))}
    values = GIVEN_BY[entry["kind"]](entry)
    _assert_printed(entry, values)
    for name, figure in entry["figures"].items():
        recomputed = float(figure["recomputed"])
        assert math.isclose(values[name], recomputed, rel_tol=RELATIVE, abs_tol=1e-15), (name, figure, values[name])


@pytest.mark.parametrize("key", ["interaction-altman", "interaction-altman-2", "p2ci-zinc", "p2ci-rr"])
def test_the_full_quantile_gives_the_digits_that_are_printed_by_1_96(key: str) -> None:
    """Where a paper works with 1.96, its printed digits are also those of the normal quantile in full."""
    _assert_printed(ENTRIES[key], GIVEN_BY[ENTRIES[key]["kind"]](ENTRIES[key]))


def test_every_entry_is_tested_and_names_its_source_and_provenance() -> None:
    """13 entries; none stands without a source, and its provenance is one of the three that are explained."""
    assert len(ENTRIES) == 13
    for entry in ENTRIES.values():
        assert entry["source"]
        assert entry["provenance"] in {"seen", "from memory", "library"}
        assert (entry["provenance"] == "library") == ("library" in entry)
