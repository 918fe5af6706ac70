"""What the people lost to follow-up could make of a table."""

from __future__ import annotations

import itertools
import math
from collections.abc import Callable
from fractions import Fraction

import pytest
from hypothesis import assume, given
from hypothesis import strategies as st

from fourcount.stats.estimates import difference_of_risks
from fourcount.stats.losses import SCENARIOS, Lost, imputed
from fourcount.stats.results import Counts, FractionalCounts, Gap
from tables import CELLS, counts_of

Table = Callable[..., Counts]
Cells = tuple[int, ...]

LOSS = st.integers(0, 40) | st.sampled_from([10**5, 10**9])
RATIO = st.floats(0, 5) | st.sampled_from([0.0, 1.0, 1e300])


def _given(found: FractionalCounts | Gap) -> FractionalCounts:
    assert isinstance(found, FractionalCounts), found
    return found


def _cells(counts: FractionalCounts) -> tuple[float, ...]:
    return counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events


def _risks(counts: FractionalCounts) -> tuple[Fraction, Fraction]:
    a, b, c, d = map(Fraction, _cells(counts))
    return a / (a + b), c / (c + d)


@given(cells=CELLS, index=LOSS, reference=LOSS, first=RATIO, second=RATIO)
def test_everybody_is_there_again(cells: Cells, index: int, reference: int, first: float, second: float) -> None:
    """Each group holds the people followed and those lost, and no cell shrinks, in every scenario."""
    counts = counts_of(cells)
    lost = Lost(index=index, reference=reference, index_ratio=first, reference_ratio=second)
    for key in SCENARIOS:
        table = _given(imputed(counts, lost, key))
        assert table.index_total == pytest.approx(counts.index_total + index, rel=1e-15)
        assert table.reference_total == pytest.approx(counts.reference_total + reference, rel=1e-15)
        assert all(now >= before for now, before in zip(_cells(table), _cells(counts), strict=True))
        assert isinstance(table, Counts) == (key != "ratio")


@given(cells=CELLS, index=LOSS, reference=LOSS, first=RATIO, second=RATIO)
def test_ratio_is_the_published_formula(cells: Cells, index: int, reference: int, first: float, second: float) -> None:
    """(events + lost min(1, k events/followed)) / (followed + lost), in fractions."""
    counts = counts_of(cells)
    lost = Lost(index=index, reference=reference, index_ratio=first, reference_ratio=second)
    found = _given(imputed(counts, lost, "ratio"))
    for risk, events, followed, people, k in (
        (found.index_events / found.index_total, cells[0], cells[0] + cells[1], index, first),
        (found.reference_events / found.reference_total, cells[2], cells[2] + cells[3], reference, second),
    ):
        share = min(Fraction(1), Fraction(k) * Fraction(events, followed))
        assert risk == pytest.approx(float((events + people * share) / (followed + people)), rel=1e-12, abs=1e-15)


@given(cells=CELLS, index=LOSS, reference=LOSS)
def test_ratios_at_their_ends(cells: Cells, index: int, reference: int) -> None:
    """k = 0 is none, k = 1 leaves both risks where they were, and a large k is all where there was an event."""
    counts = counts_of(cells)
    nobody = _given(imputed(counts, Lost(index=index, reference=reference, index_ratio=0, reference_ratio=0), "ratio"))
    assert _cells(nobody) == _cells(_given(imputed(counts, Lost(index=index, reference=reference), "none")))
    same = _given(imputed(counts, Lost(index=index, reference=reference), "ratio"))
    assert [float(risk) for risk in _risks(same)] == pytest.approx([float(risk) for risk in _risks(counts)], rel=1e-9)
    many = Lost(index=index, reference=reference, index_ratio=1e12, reference_ratio=1e12)
    everybody = _given(imputed(counts, Lost(index=index, reference=reference), "all"))
    if cells[0] and cells[2]:
        assert _cells(_given(imputed(counts, many, "ratio"))) == _cells(everybody)


def _every_split(cells: Cells, index: int, reference: int) -> list[Fraction]:
    a, b, c, d = cells
    return [
        Fraction(a + first, a + b + index) - Fraction(c + second, c + d + reference)
        for first, second in itertools.product(range(index + 1), range(reference + 1))
    ]


SMALL = st.tuples(*[st.integers(0, 9)] * 4).filter(lambda cells: cells[0] + cells[1] > 0 < cells[2] + cells[3])


@given(cells=SMALL, index=st.integers(0, 6), reference=st.integers(0, 6))
def test_worst_and_best_are_the_ends_of_all_that_could_have_happened(cells: Cells, index: int, reference: int) -> None:
    """Of every way in which the lost may have fared, none goes farther against the observed direction, or along it."""
    counts = counts_of(cells)
    index_risk, reference_risk = _risks(counts)
    assume(index_risk != reference_risk)
    sign = 1 if index_risk > reference_risk else -1
    splits = [sign * difference for difference in _every_split(cells, index, reference)]
    lost = Lost(index=index, reference=reference)
    for key, end in (("worst", min(splits)), ("best", max(splits))):
        first, second = _risks(_given(imputed(counts, lost, key)))  # type: ignore[arg-type]
        assert sign * (first - second) == end


@given(cells=SMALL, index=st.integers(0, 6), reference=st.integers(0, 6))
def test_worst_of_equal_risks_parts_them_farthest(cells: Cells, index: int, reference: int) -> None:
    """Without a direction the worst case is the farthest that the lost can part the groups; best is the other split."""
    a, b, _c, _d = cells
    counts = counts_of((a, b, 2 * a, 2 * b))
    assume(a + b > 0)
    lost = Lost(index=index, reference=reference)
    worst, best = (_risks(_given(imputed(counts, lost, key))) for key in ("worst", "best"))  # type: ignore[arg-type]
    splits = _every_split((a, b, 2 * a, 2 * b), index, reference)
    assert abs(worst[0] - worst[1]) == max(map(abs, splits))
    assert {worst[0] - worst[1], best[0] - best[1]} == {min(splits), max(splits)}


def test_worst_of_equal_groups_without_a_direction(table: Table) -> None:
    """Where both splits part equal risks alike, the index group takes the events."""
    worst = _given(imputed(table(5, 5, 5, 5), Lost(index=2, reference=2), "worst"))
    assert _cells(worst) == (7, 5, 5, 7)


def test_worst_turns_with_groups_and_with_the_counted_column(table: Table) -> None:
    """Swapping the groups swaps the scenario's groups; counting the other column gives the same people."""
    lost, swapped = Lost(index=20, reference=5), Lost(index=5, reference=20)
    worst = _cells(_given(imputed(table(38, 374, 70, 339), lost, "worst")))
    assert worst == (58, 374, 70, 344)
    assert _cells(_given(imputed(table(70, 339, 38, 374), swapped, "worst"))) == (70, 344, 58, 374)
    assert _cells(_given(imputed(table(374, 38, 339, 70), lost, "worst"))) == (374, 58, 344, 70)


@given(cells=CELLS, index=LOSS, reference=LOSS)
def test_worst_and_best_mirror(cells: Cells, index: int, reference: int) -> None:
    """Best never lies farther against the observed direction than worst, also at 10^9."""
    counts = counts_of(cells)
    lost = Lost(index=index, reference=reference)
    worst, best = (difference_of_risks(_given(imputed(counts, lost, key))) for key in ("worst", "best"))  # type: ignore[arg-type]
    observed = difference_of_risks(counts)
    assert (best - worst) * observed >= 0


def test_nobody_lost_changes_nothing(table: Table) -> None:
    """Without losses every scenario is the table itself."""
    counts = table(38, 374, 70, 339)
    nobody = Lost(index=0, reference=0)
    assert {_cells(_given(imputed(counts, nobody, key))) for key in SCENARIOS} == {_cells(counts)}


def test_gaps(table: Table) -> None:
    """A group of which nobody was followed has no risk; a ratio below 0, infinite or nan is none."""
    for key in SCENARIOS:
        assert imputed(table(0, 0, 4, 5), Lost(index=3, reference=1), key) == Gap("empty-index-group")
    for k in (-0.5, math.inf, math.nan):
        for lost in (Lost(index=3, reference=1, index_ratio=k), Lost(index=3, reference=1, reference_ratio=k)):
            assert imputed(table(3, 4, 4, 5), lost, "ratio") == Gap("loss-ratio-out-of-range")
            assert isinstance(imputed(table(3, 4, 4, 5), lost, "all"), Counts)
