"""Whatever a method gives is found again in print, and no print stops the check."""

from __future__ import annotations

import json
import math

import msgspec
import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st

from drawn_forms import outcomes
from fourcount.appraisal.check import check, check_figures
from fourcount.appraisal.check.basis import of_counts
from fourcount.appraisal.check.candidate import Way
from fourcount.appraisal.check.unpaired import unpaired
from fourcount.appraisal.findings import FigureCheck
from fourcount.publish.printed import printed as published
from fourcount.record.entry.readings import PrintedFigure, PrintedNumber
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.entries.print_only import PRINT_METHODS
from fourcount.stats.methods import METHODS
from fourcount.stats.results import Counts
from fourcount.wording.check import check_lines, figure_lines
from tables import CELLS, counts_of

COMPARISONS = [entry for entry in METHODS + PRINT_METHODS if entry.measure != "risk"]
POSITIVE = st.tuples(*[st.integers(2, 400)] * 4)
NUMBERS = st.integers(-99999, 99999), st.integers(0, 4)


def written(value: float, decimals: int) -> PrintedNumber:
    text = f"{value:.{decimals}f}"
    return PrintedNumber(text=text, value=float(text), decimals=decimals)


def found(counts: Counts, figure: PrintedFigure) -> FigureCheck:
    return check_figures((figure,), of_counts(counts), Choices()).figures[0]


@pytest.mark.parametrize("entry", COMPARISONS, ids=lambda entry: f"{entry.measure} {entry.key}")
@settings(max_examples=25)
@given(cells=POSITIVE, level=st.sampled_from([0.9, 0.95, 0.99, 0.8]), decimals=st.integers(2, 4))
def test_each_method_is_found_in_its_own_print(
    entry: object, cells: tuple[int, ...], level: float, decimals: int
) -> None:
    """Its estimate and limits at a printed level, rounded: the check says that they follow, and names it."""
    counts = counts_of(cells)
    own = next(one for one in unpaired(counts, entry.measure) if one.named)  # type: ignore[attr-defined]
    way: Way = next(way for way in own.ways if way.key == entry.key)  # type: ignore[attr-defined]
    limits, value = own.limits(way, level), own.value()
    assume(limits is not None and math.isfinite(limits[1]) and limits[1] < 1e6)
    assert limits is not None
    assert value is not None
    figure = PrintedFigure(
        measure=entry.measure,  # type: ignore[attr-defined]
        text="",
        estimate=written(float(value), decimals),
        low=written(limits[0], decimals),
        high=written(limits[1], decimals),
        level=level,
    )
    finding = found(counts, figure).findings[0]
    assert finding.key == "reproduced"
    assert entry.key in str(finding.facts["methods"]).split()  # type: ignore[attr-defined]
    assert finding.facts["level"] == level


@settings(max_examples=150)
@given(
    cells=CELLS,
    measure=st.sampled_from(
        ["risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio", "risk_difference", "relative_reduction",
         "number_needed", "risk", "p"]
    ),
    numbers=st.lists(st.none() | st.tuples(*NUMBERS), min_size=4, max_size=4),
    unit=st.sampled_from(["one", "percent", "per-1000"]),
    adjusted=st.booleans(),
)  # fmt: skip
def test_no_print_stops_the_check(
    cells: tuple[int, ...], measure: str, numbers: list[tuple[int, int] | None], unit: str, adjusted: bool
) -> None:
    """Any digits beside any table: no exception, and sentences that end."""
    estimate, low, high, p = (None if one is None else written(one[0] / 10 ** one[1], one[1]) for one in numbers)
    figure = PrintedFigure(
        measure=measure,  # type: ignore[arg-type]
        text="",
        estimate=estimate,
        low=low,
        high=high,
        p=None if p is None or not 0 <= p.value <= 1 else p,
        unit=unit,  # type: ignore[arg-type]
        adjusted=adjusted,
    )
    for line in figure_lines(found(counts_of(cells), figure)):
        assert line.text.endswith(".")
        assert "nan" not in line.text


@settings(max_examples=60)
@given(
    outcome=outcomes(),
    text=st.sampled_from(
        ["OR 2.5 (0.9 to ∞)", "RR 0.5 (0.3 to 0.8), P = 0", "HR 0.5 (0.3 to ∞)", "-8% (3 to 13)", "p = 0.4"]
    ),
    family=st.sampled_from(["score", "textbook", "exact"]),
)
def test_no_form_stops_the_check(outcome: Outcome, text: str, family: str) -> None:
    """Any table of any form beside odd prints: whole sentences, and nothing that JSON cannot hold."""
    checked = check(msgspec.structs.replace(outcome, paper_text=text), Choices(family=family))  # type: ignore[arg-type]
    for line in check_lines(checked):
        assert line.text.endswith(".")
        assert "nan" not in line.text
        assert "…" not in line.text
        assert line.text.count("(") == line.text.count(")")
    json.dumps(published(checked), allow_nan=False)


@given(cells=POSITIVE)
def test_swapping_what_was_entered_swaps_what_is_said(cells: tuple[int, ...]) -> None:
    """A print that follows as read follows the other way round from the swapped groups."""
    counts = counts_of(cells)
    own = next(one for one in unpaired(counts, "risk_ratio") if one.named)
    limits, value = own.limits(own.ways[0], 0.95), own.value()
    assume(limits is not None and value is not None and abs(math.log(float(value))) > 0.2)
    assert limits is not None
    assert value is not None
    figure = PrintedFigure(
        measure="risk_ratio",
        text="",
        estimate=written(float(value), 4),
        low=written(limits[0], 4),
        high=written(limits[1], 4),
    )
    swapped = counts_of((*cells[2:], *cells[:2]))
    sides = {match.orientation for match in found(swapped, figure).matches if match.fit == "all"}
    assert "groups-swapped" in sides
