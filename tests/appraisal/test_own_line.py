"""A line of the reader's own: where the interval lies against it, whose side it is on, and the p of a margin."""

from __future__ import annotations

import itertools
import math
from typing import Any

import msgspec
import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, Interval, OwnLine, Range
from fourcount.appraisal.own_line import MEASURES_OF, own_line, where_it_lies
from fourcount.record.outcome import CELLS, LINE_SCALES, EventsAndOthers, LineSide, Outcome
from fourcount.record.paper import FAMILIES, Choices, Family
from fourcount.stats import difference, odds, ratio
from fourcount.stats.estimates import odds_ratio, risk_difference, risk_ratio
from fourcount.stats.margins import margin_p, margin_p_from_interval
from fourcount.stats.results import Counts

COUNTS = Counts(index_events=38, index_non_events=374, reference_events=70, reference_non_events=339)
Measures = dict[str, Figure | AnyNumberNeeded | Gap]


def drawn(**changes: object) -> Outcome:
    """An outcome with a line of its own: 2 fewer per 100 that would matter, unless told otherwise."""
    plain = Outcome(table=EventsAndOthers(), line_kind="matters", line_text="2 per 100")
    return msgspec.structs.replace(plain, **changes)


def measures(level: float = 0.95) -> Measures:
    """Difference and ratios of the table with their score intervals."""
    found = {
        "risk_difference": (risk_difference(COUNTS), difference.miettinen_nurminen(COUNTS, level)),
        "risk_ratio": (risk_ratio(COUNTS), ratio.miettinen_nurminen(COUNTS, level)),
        "odds_ratio": (odds_ratio(COUNTS), odds.miettinen_nurminen(COUNTS, level)),
    }
    return {
        key: Figure(estimate=estimate, interval=interval, method="miettinen-nurminen")
        for key, (estimate, interval) in found.items()
    }


def line_of(outcome: Outcome, found: Measures | None = None, counts: Counts | None = COUNTS) -> OwnLine:
    line, marks = own_line(outcome, measures() if found is None else found, counts, 0.95)
    assert marks == ()
    assert isinstance(line, OwnLine), line
    return line


@pytest.mark.parametrize(
    ("low", "high", "value", "side", "lies"),
    [
        (-0.12, -0.03, -0.02, "fewer", "beyond"),
        (-0.12, -0.03, -0.05, "fewer", "across"),
        (-0.12, 0.03, -0.15, "fewer", "short"),
        (0.02, 0.09, -0.01, "fewer", "short"),
        (0.03, 0.09, 0.02, "more", "beyond"),
        (-0.03, 0.09, 0.02, "more", "across"),
        (-0.03, 0.01, 0.02, "more", "short"),
        (1.3, math.inf, 1.2, "more", "beyond"),
        (0.8, math.inf, 1.2, "more", "across"),
        (0.0, 0.7, 0.8, "fewer", "beyond"),
        (0.0, 0.9, 0.8, "fewer", "across"),
    ],
)
def test_where_the_interval_lies(low: float, high: float, value: float, side: LineSide, lies: str) -> None:
    """Wholly past the line, wholly on the side of no effect, or on both sides, on either side of no effect."""
    assert where_it_lies(Interval(low=low, high=high), value, side) == lies


@pytest.mark.parametrize(("low", "high", "side"), [(-0.12, -0.02, "fewer"), (-0.02, 0.1, "fewer")])
def test_a_limit_on_the_line_is_on_neither_side(low: float, high: float, side: LineSide) -> None:
    """Only what lies past the line, or short of it, lies wholly there."""
    assert where_it_lies(Interval(low=low, high=high), -0.02, side) == "across"


def test_a_withheld_limit_decides_nothing() -> None:
    """The limit that is there may tell by itself; otherwise the reason for the withheld one stands."""
    gap = Gap("beyond-one")
    assert where_it_lies(Range(low=0.05, high=gap), 0.02, "more") == "beyond"
    assert where_it_lies(Range(low=0.01, high=gap), 0.02, "more") == gap
    assert where_it_lies(Range(low=-0.01, high=gap), -0.02, "fewer") == "short"
    assert where_it_lies(Range(low=-0.05, high=gap), -0.02, "fewer") == gap
    assert where_it_lies(gap, -0.02, "fewer") == gap


def test_no_line_without_a_kind_or_a_value() -> None:
    """A line is drawn where its kind is chosen and its place typed."""
    for outcome in (drawn(line_kind="none"), drawn(line_text="  "), drawn(line_kind="none", line_text="rubbish")):
        assert own_line(outcome, measures(), COUNTS, 0.95) == (None, ())


def test_what_cannot_be_read_marks_its_field() -> None:
    """The field is marked with the reason, and no line is drawn."""
    line, marks = own_line(drawn(line_text="a little"), measures(), COUNTS, 0.95)
    assert line == Gap("line-unreadable")
    assert [(mark.field, mark.key, mark.used) for mark in marks] == [("line_text", "not-a-margin", False)]


def test_the_smallest_difference_that_matters_has_no_p() -> None:
    """2 fewer per 100 beside 7.9 (3.2 to 12.5) fewer: the interval lies wholly past it."""
    line = line_of(drawn())
    assert line == OwnLine(
        kind="matters", measure="risk_difference", value=-0.02, lies="beyond", worse_side=False, level=0.95
    )


@pytest.mark.parametrize(
    ("welcome", "side", "worse"),
    [(False, "more", True), (False, "fewer", False), (True, "fewer", True), (True, "more", False)],
)
def test_the_worse_side_is_that_of_the_outcome(welcome: bool, side: LineSide, worse: bool) -> None:
    """More of a harm is worse, and fewer of a welcome outcome."""
    assert line_of(drawn(left_welcome=welcome, line_side=side)).worse_side is worse


@pytest.mark.parametrize(
    ("scale", "text", "side", "value"),
    [
        ("risk_difference", "2 per 100", "more", 0.02),
        ("risk_difference", "5%", "fewer", -0.05),
        ("risk_ratio", "1.25", "more", 1.25),
        ("odds_ratio", "0.8", "fewer", 0.8),
    ],
)
def test_a_margin_of_counts_has_the_score_p(scale: str, text: str, side: LineSide, value: float) -> None:
    """Miettinen and Nurminen's statistic on the line's own scale, against what is worse than the margin."""
    margin = drawn(line_kind="margin", line_scale=scale, line_text=text, line_side=side)
    line = line_of(margin)
    assert line.value == pytest.approx(value)
    assert (line.measure, line.method) == (scale, "margin-score")
    assert line.p == margin_p(scale, COUNTS, line.value, "more")  # type: ignore[arg-type]
    welcome = line_of(msgspec.structs.replace(margin, left_welcome=True))
    assert welcome.p == margin_p(scale, COUNTS, line.value, "fewer")  # type: ignore[arg-type]


@pytest.mark.parametrize("text", ["1 per 100", "0.5 per 100", "3 per 100", "4%"])
def test_the_p_of_a_margin_and_its_side_agree(text: str) -> None:
    """p is below 0.025 exactly where the 95% score interval lies wholly on the better side of the margin."""
    for side, welcome in itertools.product(("fewer", "more"), (True, False)):
        line = line_of(drawn(line_kind="margin", line_text=text, line_side=side, left_welcome=welcome))
        assert isinstance(line.p, float)
        assert (line.p < 0.025) == (line.lies == ("short" if line.worse_side else "beyond"))


def test_interval_and_p_of_different_methods_may_part() -> None:
    """2 of 50 v 0 of 50 by the textbook formula: all of the interval is better than 10 more, and p is 0.080."""
    tight = margin_of((2, 48, 0, 50), "textbook")
    assert (tight.lies, tight.worse_side, tight.parted) == ("short", True, True)
    assert tight.p == pytest.approx(0.080, abs=5e-4)
    score = margin_of((2, 48, 0, 50), "score")
    assert (score.lies, score.parted) == ("across", False)


@given(st.tuples(*[st.integers(0, 30)] * 4), st.sampled_from(FAMILIES), st.sampled_from(["RD", "RR", "OR"]))
def test_a_margin_says_wherever_its_interval_and_its_p_part(counts: Any, family: Family, scale: str) -> None:
    """Wherever p is small and the interval does not lie on the better side, or the other way round; by score never."""
    line = margin_of(counts, family, scale)
    if isinstance(line, OwnLine) and isinstance(line.p, float):
        assert line.parted == ((line.p < 0.025) != (line.lies == "short"))
        assert not line.parted or (family, scale) not in (("score", "RD"), ("score", "RR"))


def margin_of(counts: tuple[int, int, int, int], family: Family, scale: str = "RD") -> Any:
    """A margin of 10 more per 100, or of a ratio of 1.5, beside four counts."""
    scales = {"RD": "risk_difference", "RR": "risk_ratio", "OR": "odds_ratio"}
    outcome = Outcome(
        table=EventsAndOthers(**dict(zip(CELLS, map(str, counts), strict=True))),
        line_kind="margin",
        line_scale=scales[scale],  # type: ignore[arg-type]
        line_side="more",
        line_text="10 per 100" if scale == "RD" else "1.5",
    )
    return appraise(outcome, Choices(family=family)).line


@pytest.mark.parametrize("key", ["pooled_risk_ratio", "pair_ratio", "risk_ratio"])
def test_without_counts_the_p_is_that_of_the_interval(key: str) -> None:
    """Pooled, paired and printed ratios have the normal p on the log scale."""
    figure = Figure(estimate=0.8, interval=Interval(low=0.6, high=1.07), method="printed")
    line = line_of(
        drawn(line_kind="margin", line_scale="risk_ratio", line_text="1.2", line_side="more"), {key: figure}, None
    )
    assert (line.measure, line.method, line.lies) == (key, "margin-printed", "short")
    assert line.p == margin_p_from_interval(0.8, 0.6, 1.07, 0.95, 1.2, "more", "log")


def test_a_difference_without_counts_is_on_the_plain_scale() -> None:
    """A pooled or paired difference has the normal p without logarithms."""
    figure = Figure(estimate=-0.01, interval=Interval(low=-0.03, high=0.01), method="sato")
    line = line_of(
        drawn(line_kind="margin", line_text="2 per 100", line_side="more"), {"pooled_risk_difference": figure}, None
    )
    assert line.p == margin_p_from_interval(-0.01, -0.03, 0.01, 0.95, 0.02, "more", "plain")


def test_pooled_figures_come_before_crude_ones() -> None:
    """Of strata the line is drawn on the pooled measure, whose p is not that of the crude counts."""
    pooled = Figure(estimate=0.8, interval=Interval(low=0.6, high=1.07), method="greenland-robins")
    line = line_of(
        drawn(line_kind="margin", line_scale="risk_ratio", line_text="0.5", line_side="fewer"),
        {**measures(), "pooled_risk_ratio": pooled},
    )
    assert (line.measure, line.method) == ("pooled_risk_ratio", "margin-printed")


def test_a_scale_that_is_not_here_says_so() -> None:
    """A hazard ratio's line has no place beside four counts; a rate ratio takes it as it is carried like one."""
    hazard = drawn(line_scale="hazard_ratio", line_text="0.8")
    assert own_line(hazard, measures(), COUNTS, 0.95) == (Gap("line-scale-not-here"), ())
    rates: Measures = {"rate_ratio": Figure(estimate=0.6, interval=Interval(low=0.5, high=0.7), method="score")}
    assert line_of(hazard, rates, None).measure == "rate_ratio"


def test_what_the_design_withholds_has_no_line() -> None:
    """The reason for which the measure, or its interval, is not given stands in the line's place."""
    gap = Gap("design-case-control")
    assert own_line(drawn(), {**measures(), "risk_difference": gap}, COUNTS, 0.95) == (gap, ())
    follows = Figure(estimate=-0.08, interval=Gap("follows"), method="conditional-exact")
    assert own_line(drawn(), {"risk_difference": follows}, COUNTS, 0.95) == (Gap("follows"), ())


def test_every_scale_has_its_measures() -> None:
    """No scale of a line is without a measure to draw it on."""
    assert set(MEASURES_OF) == set(LINE_SCALES)
    assert all(MEASURES_OF.values())
