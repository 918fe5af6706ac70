"""Every figure of published_extras.json against the function of ``stats`` that should give it.

Each figure is tested twice: to the digits that its source prints, and to an independent value of 17 digits. Sources
and provenance stand beside each figure in published_extras.json ("from memory" is said there).
"""

from __future__ import annotations

import json
import math
from collections.abc import Callable, Mapping
from pathlib import Path
from typing import Any

import pytest

from fourcount.stats.attributable import exposed_fraction, levin
from fourcount.stats.e_value import e_value, e_value_of_limit
from fourcount.stats.estimates import risk_ratio
from fourcount.stats.fragility import FragilityIndex, fragility
from fourcount.stats.results import Counts, Gap

DOCUMENT = json.loads((Path(__file__).parent / "published_extras.json").read_text(encoding="utf-8"))
ENTRIES: dict[str, dict[str, Any]] = {entry["id"]: entry for entry in DOCUMENT["entries"]}

Inputs = Mapping[str, Any]
Figures = Mapping[str, float]


def _number(value: float | Gap) -> float:
    assert not isinstance(value, Gap), value
    return float(value)


def _e_value(inputs: Inputs) -> Figures:
    limit = e_value_of_limit(inputs["low"], inputs["high"])
    return {"estimate": _number(e_value(inputs["ratio"])), "limit": _number(limit)}


def _fragility(inputs: Inputs) -> Figures:
    found = fragility(Counts(**inputs))
    assert isinstance(found, FragilityIndex), found
    assert found.group == "index"
    return {"p_before": found.p_before, "p_after": found.p_after, "changes": found.changes}


def _exposed(inputs: Inputs) -> Figures:
    return {"percent": 100 * _number(exposed_fraction(_number(risk_ratio(Counts(**inputs)))))}


def _levin(inputs: Inputs) -> Figures:
    return {"percent": 100 * _number(levin(inputs["prevalence"], inputs["index_risk"] / inputs["reference_risk"]))}


GIVEN_BY: dict[str, Callable[[Inputs], Figures]] = {
    "e-value": _e_value,
    "fragility": _fragility,
    "attributable/exposed": _exposed,
    "attributable/levin": _levin,
}
"""The kind of an entry -> its figures, from the functions of ``stats``."""


def _agrees_in_print(figure: Mapping[str, Any], value: float) -> bool:
    return abs(value - float(figure["printed"])) <= float(figure["tolerance"]) * (1 + 1e-9)


@pytest.mark.parametrize("key", ENTRIES)
def test_figure_agrees_with_its_source(key: str) -> None:
    """Each figure agrees with an independent value of 17 digits and to its printed digits.

    The one that its own inputs do not give differs from the print, as its reason says.
    """
    entry = ENTRIES[key]
    values = GIVEN_BY[entry["kind"]](entry["inputs"])
    assert set(values) == set(entry["figures"])
    for name, figure in entry["figures"].items():
        assert math.isclose(values[name], float(figure["recomputed"]), rel_tol=1e-11), (name, figure, values[name])
        assert _agrees_in_print(figure, values[name]) == ("not_reproduced" not in entry), (name, figure, values[name])


def test_one_print_rounds_before_it_divides() -> None:
    """The printed 21.3% is 4.7 of 22.1; without that rounding its inputs give 21.1%."""
    inputs = ENTRIES["paf-gordis-pop"]["inputs"]
    overall = inputs["prevalence"] * inputs["index_risk"] + (1 - inputs["prevalence"]) * inputs["reference_risk"]
    excess = round(1000 * overall, 1) - 1000 * inputs["reference_risk"]
    assert round(100 * excess / round(1000 * overall, 1), 1) == 21.3
    assert round(_levin(inputs)["percent"], 1) == 21.1
    assert [key for key, entry in ENTRIES.items() if "not_reproduced" in entry] == ["paf-gordis-pop"]


def test_every_entry_names_its_source_and_provenance() -> None:
    """No figure stands without a source, and its provenance is one of the three that published.json explains."""
    for entry in ENTRIES.values():
        assert entry["source"]
        assert entry["provenance"] in {"seen", "from memory", "library"}
        assert (entry["provenance"] == "library") == ("library" in entry)
