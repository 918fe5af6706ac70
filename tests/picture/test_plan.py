"""Which denominator is taken for two risks, and how many icons of each state it holds."""

from __future__ import annotations

from fractions import Fraction
from math import floor

import pytest
from hypothesis import example, given
from hypothesis import strategies as st

from fourcount.picture.options import ARRANGEMENTS
from fourcount.picture.plan import (
    DENOMINATORS,
    STATES,
    Array,
    State,
    half_up,
    plan,
    plan_on,
    states_drawn,
)


@st.composite
def printed_risks(draw: st.DrawFn) -> Fraction:
    """A risk as counts give it: so many of so many."""
    total = draw(st.integers(1, 100_000) | st.sampled_from([100, 200, 1_000, 2_000, 10_000, 20_000, 100_000]))
    return Fraction(draw(st.integers(0, total)), total)


RISKS = printed_risks() | st.sampled_from([Fraction(0), Fraction(1), Fraction(1, 20_000), Fraction(19_999, 20_000)])


def in_so_many(risk: Fraction, people: int) -> int:
    """Whole icons of a risk, halves up, without floating point."""
    return floor(risk * people + Fraction(1, 2))


def holds(without: Fraction, with_: Fraction, people: int) -> bool:
    """The three-part rule in exact arithmetic."""
    apart = abs(with_ - without) * people
    drawn = abs(in_so_many(with_, people) - in_so_many(without, people))
    slip = abs(drawn - apart)
    never_nobody = all(risk == 0 or in_so_many(risk, people) > 0 for risk in (without, with_))
    never_everybody = all(risk == 1 or in_so_many(risk, people) < people for risk in (without, with_))
    return (without == with_ or apart >= 1) and (slip < Fraction(1, 2) or slip < apart / 10) and (
        never_nobody and never_everybody
    )  # fmt: skip


@pytest.mark.parametrize(
    ("without", "with_", "denominator"),
    [
        (0.12, 0.06, 100),
        (0.044, 0.056, 1_000),  # 4 and 6 in 100 would draw a difference of 2 for one of 1.2
        (0.095, 0.104, 1_000),  # 10 and 10 in 100 would draw no difference
        (0.024, 0.026, 1_000),  # 2 and 3 in 100 would draw a difference of 1 for one of 0.2
        (0.095, 0.105, 100),  # 10 and 11: one icon apart, as in truth
        (0.045, 0.060, 1_000),  # 5 and 6: half an icon is lost, which is not under half
        (0.045, 0.159, 100),  # 5 and 16 for 11.4: 0.4 of an icon
        (0.156, 0.102, 1_000),  # 16 and 10 for 5.4: 0.6 of an icon is a ninth of it
        (0.504, 0.446, 1_000),  # 50 and 45 for 5.8: 0.8 of an icon is no tenth of it
        (0.504, 0.346, 100),  # 50 and 35 for 15.8: 0.8 of an icon is under a tenth of it
        (0.17, 0.171, 1_000),
        (0.0001, 0.0002, 10_000),
        (0.0005, 0.0015, 1_000),
    ],
)
def test_the_first_denominator_that_is_honest_is_taken(without: float, with_: float, denominator: int) -> None:
    """Two risks get the smallest array that neither hides nor invents a difference."""
    assert plan(without, with_).denominator == denominator


@pytest.mark.parametrize(
    ("without", "with_"),
    [(0.00001, 0.00002), (0.5, 0.50001), (0.0, 0.00001), (0.99999, 1.0), (0.00001, 0.00001), (0.00001, 0.5)],
)
def test_what_no_array_can_show_gets_none(without: float, with_: float) -> None:
    """Risks too small or too close for ten thousand icons get no icons at all, and keep their risks."""
    result = plan(without, with_)
    nobody = Array(affected=0, avoided=0, added=0, others=0)
    assert result.denominator is None
    assert (result.without, result.with_) == (nobody, nobody)
    assert (result.without_risk, result.with_risk) == (without, with_)


@pytest.mark.parametrize(
    ("risk", "denominator"), [(0.0, 100), (0.12, 100), (0.005, 100), (0.0049, 1_000), (0.9951, 1_000), (1.0, 100)]
)
def test_equal_risks_need_no_distance(risk: float, denominator: int) -> None:
    """Equal risks are shown as equal, in the first array where somebody is not nobody and not everybody."""
    result = plan(risk, risk)
    assert result.denominator == denominator
    assert result.without == result.with_


@pytest.mark.parametrize(
    ("without", "with_", "denominator"),
    [
        (0.0, 1.0, 100),
        (1.0, 0.0, 100),
        (0.0, 0.01, 100),
        (0.0, 0.004, 1_000),
        (1.0, 0.996, 1_000),
        (0.0, 0.0001, 10_000),
        (1.0, 0.9999, 10_000),
    ],
)
def test_none_and_all_are_drawn_only_where_they_are_so(without: float, with_: float, denominator: int) -> None:
    """A risk of 0 draws none and a risk of 1 draws all, and no other risk does."""
    result = plan(without, with_)
    assert result.denominator == denominator
    assert result.without.affected == without * denominator
    assert result.with_.affected + result.with_.added == round(with_ * denominator)


def test_a_smaller_risk_draws_avoided_icons() -> None:
    """12% against 6%: six affected, six avoided, the others as before."""
    result = plan(0.12, 0.06)
    assert result.without == Array(affected=12, avoided=0, added=0, others=88)
    assert result.with_ == Array(affected=6, avoided=6, added=0, others=88)


def test_a_larger_risk_draws_added_icons() -> None:
    """6% against 12%: six affected, six added, the others are those of the second group."""
    result = plan(0.06, 0.12)
    assert result.without == Array(affected=6, avoided=0, added=0, others=94)
    assert result.with_ == Array(affected=6, avoided=0, added=6, others=88)


@pytest.mark.parametrize(("events", "total"), [(9, 200), (29, 200), (57, 200), (1, 200), (199, 200), (115, 1_000)])
def test_halves_go_up_whatever_the_float_says(events: int, total: int) -> None:
    """Risks on a half are rounded up, though the nearest float may lie under it."""
    assert half_up(events / total * 100) == in_so_many(Fraction(events, total), 100)


@given(RISKS, RISKS)
@example(Fraction(9, 200), Fraction(6, 100))
@example(Fraction(1, 40), Fraction(1, 100))
@example(Fraction(7, 10), Fraction(147, 200))
@example(Fraction(18, 1_000), Fraction(117, 1_000))
@example(Fraction(1, 20_000), Fraction(3, 20_000))
def test_the_rule_holds_for_the_chosen_and_fails_for_every_smaller(without: Fraction, with_: Fraction) -> None:
    """The chosen denominator is the first for which the rule holds in exact arithmetic, None if there is none."""
    expected = next((people for people in DENOMINATORS if holds(without, with_, people)), None)
    assert plan(float(without), float(with_)).denominator == expected


@given(RISKS, RISKS)
def test_icons_sum_to_the_denominator(without: Fraction, with_: Fraction) -> None:
    """Each group's icons are the whole denominator, none of them negative, and only one kind of change is drawn."""
    result = plan(float(without), float(with_))
    for array in (result.without, result.with_):
        icons = (array.affected, array.avoided, array.added, array.others)
        assert sum(icons) == (result.denominator or 0)
        assert min(icons) >= 0
    assert (result.without.avoided, result.without.added) == (0, 0)
    assert 0 in (result.with_.avoided, result.with_.added)


@given(RISKS, RISKS)
def test_both_groups_stand_on_the_same_people(without: Fraction, with_: Fraction) -> None:
    """Affected and avoided with the index group are those affected without it; affected and added are its own."""
    result = plan(float(without), float(with_))
    people = result.denominator or 0
    assert result.with_.affected + result.with_.avoided == max(result.without.affected, result.with_.affected)
    assert result.without.affected == in_so_many(without, people)
    assert result.with_.affected + result.with_.added == in_so_many(with_, people)


@given(st.floats(0, 1), st.floats(0, 1))
def test_captions_never_come_from_icons(without: float, with_: float) -> None:
    """The plan carries the very risks it was given, whatever was rounded to draw them."""
    result = plan(without, with_)
    assert (result.without_risk, result.with_risk) == (without, with_)


@given(RISKS, RISKS)
def test_the_order_of_the_groups_does_not_matter(one: Fraction, other: Fraction) -> None:
    """Two risks the other way round take the same denominator, with avoided and added changed over."""
    there, back = plan(float(one), float(other)), plan(float(other), float(one))
    assert there.denominator == back.denominator
    assert (there.with_.avoided, there.with_.added) == (back.with_.added, back.with_.avoided)


def icons(array: Array) -> list[State]:
    """The states of an array's icons, in the order of filling."""
    return [state for state, start, stop in array.runs() for _ in range(start, stop)]


@given(RISKS, RISKS)
def test_states_form_blocks_from_one_corner(without: Fraction, with_: Fraction) -> None:
    """Each state is one unbroken run: those who have the event first, the others last, and nobody between them."""
    result = plan(float(without), float(with_))
    for array in (result.without, result.with_):
        runs = list(array.runs())
        assert [start for _, start, _ in runs] == [0, *[stop for _, _, stop in runs]][: len(runs)]
        assert [state for state, _, _ in runs] == [state for state in STATES if state in {run[0] for run in runs}]


@given(RISKS, RISKS, RISKS, RISKS)
@example(Fraction(12, 100), Fraction(6, 100), Fraction(4, 100), Fraction(9, 100))
@example(Fraction(12, 100), Fraction(6, 100), Fraction(3, 100), Fraction(15, 100))
@example(Fraction(6, 100), Fraction(12, 100), Fraction(9, 100), Fraction(15, 100))
@example(Fraction(6, 100), Fraction(12, 100), Fraction(2, 100), Fraction(15, 100))
def test_uncertain_icons_stand_at_the_edge(without: Fraction, with_: Fraction, one: Fraction, other: Fraction) -> None:
    """Between the limits icons are uncertain; all others are what they are without the interval."""
    low, high = min(one, other), max(one, other)
    bare, edged = plan(float(without), float(with_)), plan(float(without), float(with_), float(low), float(high))
    people = bare.denominator or 0
    if not low <= with_ <= high:
        assert edged == bare
        return
    first, last = in_so_many(low, people), in_so_many(high, people)
    expected = ["uncertain" if first <= place < last else state for place, state in enumerate(icons(bare.with_))]
    assert icons(edged.with_) == expected
    assert (edged.denominator, edged.without) == (bare.denominator, bare.without)
    assert (edged.low, edged.high) == (float(low), float(high))


def test_uncertainty_is_off_unless_limits_are_given() -> None:
    """Without limits no icon is uncertain, and nothing is known of an interval."""
    result = plan(0.12, 0.06)
    assert (result.with_.uncertain, result.low, result.high) == (0, None, None)


@pytest.mark.parametrize(("low", "high"), [(None, 0.09), (0.04, None), (0.07, 0.09), (0.04, 0.05), (0.04, 1.2)])
def test_half_an_interval_draws_nothing(low: float | None, high: float | None) -> None:
    """A missing limit, one past 100%, or limits that do not hold the risk, leave the picture as it is."""
    assert plan(0.12, 0.06, low, high) == plan(0.12, 0.06)


def test_the_interval_of_a_decrease() -> None:
    """12% against 6% (4 to 9%): four affected, five open, three avoided, the others as before."""
    assert plan(0.12, 0.06, 0.04, 0.09).with_ == Array(affected=4, uncertain=5, avoided=3, added=0, others=88)


def test_the_interval_of_an_increase() -> None:
    """6% against 12% (9 to 15%): six affected, three surely added, six open."""
    assert plan(0.06, 0.12, 0.09, 0.15).with_ == Array(affected=6, uncertain=6, avoided=0, added=3, others=85)


@given(RISKS, RISKS)
def test_a_denominator_of_the_pages_own_is_taken(without: Fraction, with_: Fraction) -> None:
    """A plan on a given denominator has its icons on it; on its own one it is the usual plan."""
    usual = plan(float(without), float(with_))
    assert plan_on(usual.denominator, float(without), float(with_)) == usual
    finer = plan_on(10_000, float(without), float(with_))
    assert len(icons(finer.without)) == len(icons(finer.with_)) == 10_000


@pytest.mark.parametrize(
    ("without", "with_", "two", "one"),
    [
        (0.12, 0.06, ("affected", "avoided", "others"), ("affected", "avoided", "others")),
        (0.06, 0.12, ("affected", "added", "others"), ("affected", "added", "others")),
        (0.12, 0.12, ("affected", "others"), ("affected", "others")),
        (0.0, 0.3, ("added", "others"), ("added", "others")),
        (1.0, 0.9, ("affected", "avoided"), ("affected", "avoided")),
        (0.0, 1.0, ("added", "others"), ("added",)),
    ],
)
def test_exactly_the_states_drawn_are_explained(
    without: float, with_: float, two: tuple[State, ...], one: tuple[State, ...]
) -> None:
    """The key has a state where it is drawn in either array, and no other; bars have no states."""
    result = plan(without, with_)
    assert states_drawn(result, "two") == two
    assert states_drawn(result, "one") == one
    assert states_drawn(result, "bars") == ()


def test_the_uncertain_are_explained_where_they_are_drawn() -> None:
    """An interval adds its state to the key, between those who have the event and those who have not."""
    assert states_drawn(plan(0.12, 0.06, 0.04, 0.09), "two") == ("affected", "uncertain", "avoided", "others")


@given(RISKS, RISKS, st.sampled_from(ARRANGEMENTS))
def test_nothing_is_explained_of_what_is_too_small_to_draw(without: Fraction, with_: Fraction, how: str) -> None:
    """Where no denominator can be taken there is no icon, and so no key, in any arrangement."""
    result = plan(float(without), float(with_))
    assert bool(states_drawn(result, how)) == (result.denominator is not None and how != "bars")  # type: ignore[arg-type]
