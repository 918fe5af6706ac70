"""Starting risks of other people: with limits, as counts, as three, as a rate, from an overall risk."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.entry.complement import complement_text
from fourcount.record.entry.readings import Blank, Proportion, RateReading, RiskReading, Unreadable
from fourcount.record.entry.risk import read_risk
from fourcount.record.entry.starting import read_share, read_starting_risk
from fourcount.record.entry.starts import StartReading, read_start
from fourcount.record.outcome import Patient
from nearly import ANY_TEXT, NEARLY

WITH_LIMITS = [
    ("12% (9 to 15)", 0.12, 0.09, 0.15, 0.95),
    ("12% (9-15)", 0.12, 0.09, 0.15, 0.95),
    ("12%(9\u201315%)", 0.12, 0.09, 0.15, 0.95),
    ("12% [9.1% to 15.2%]", 0.12, 0.091, 0.152, 0.95),
    ("12% (9, 15)", 0.12, 0.09, 0.15, 0.95),
    ("12%, 9 to 15", 0.12, 0.09, 0.15, 0.95),
    ("12% 9-15", 0.12, 0.09, 0.15, 0.95),
    ("12 (9-15)", 0.12, 0.09, 0.15, 0.95),
    ("0.8 (0.5 to 1.2)", 0.008, 0.005, 0.012, 0.95),
    ("12,5% (9,1-15,3)", 0.125, 0.091, 0.153, 0.95),
    ("12 per cent (9 to 15 per cent)", 0.12, 0.09, 0.15, 0.95),
    ("12% (90% CI 9-15)", 0.12, 0.09, 0.15, 0.9),
    ("12% (95% confidence interval: 9 to 15)", 0.12, 0.09, 0.15, 0.95),
    ("12% (99.9% CI, 9 to 15)", 0.12, 0.09, 0.15, 0.999),
    ("12% (CI 9 to 15)", 0.12, 0.09, 0.15, 0.95),
    ("12 in 100 (9 to 15)", 0.12, 0.09, 0.15, 0.95),
    ("12 per 1,000 (9 to 15)", 0.012, 0.009, 0.015, 0.95),
    ("12 in 1,000 (0.9% to 1.5%)", 0.012, 0.009, 0.015, 0.95),
    ("0% (0 to 3)", 0.0, 0.0, 0.03, 0.95),
    ("100% (97 to 100)", 1.0, 0.97, 1.0, 0.95),
    ("\u0661\u0662\u066a (\u0669 - \u0661\u0665)", 0.12, 0.09, 0.15, 0.95),
]
COUNTED = [
    ("24 of 200", 24, 200),
    ("24/200", 24, 200),
    ("24 out of 200", 24, 200),
    ("24/200 (12%)", 24, 200),
    ("24/200 (12)", 24, 200),
    ("1,204 of 10 532", 1204, 10532),
    ("0/7", 0, 7),
    ("7/7", 7, 7),
]
BARE = [
    "12%", "12", "12 in 100", "12 per 100", "12/100", "12 of 100", "12 out of 100", "120 of 1,000", "24 in 200", "0",
    "100%",
]  # fmt: skip
REFUSED = [
    ("0.12", "percent-or-fraction"),
    ("0.12 (0.09 to 0.15)", "percent-or-fraction"),
    ("120%", "risk-out-of-range"),
    ("120% (100 to 130)", "risk-out-of-range"),
    ("12% (9 to 150)", "risk-out-of-range"),
    ("-3%", "risk-out-of-range"),
    ("205 of 200", "risk-out-of-range"),
    ("205 of 200 (3%)", "risk-out-of-range"),
    ("12% (15 to 9)", "limits-disordered"),
    ("12% (13 to 15)", "limits-disordered"),
    ("12% (0.09 to 0.15)", "limits-disordered"),
    ("12% (50% CI 9 to 15)", "level-out-of-range"),
    ("24/200 (8 to 17)", "limits-need-sign"),
    ("24/200 (13%)", "risk-unlike-percent"),
    ("12% (9)", "not-a-risk"),
    ("12% (9,15)", "not-a-risk"),
    ("12-15%", "not-a-risk"),
    ("high", "not-a-risk"),
    ("9" * 5000, "not-a-risk"),
]


@pytest.mark.parametrize(("text", "value", "low", "high", "level"), WITH_LIMITS)
def test_a_risk_is_read_with_its_limits(text: str, value: float, low: float, high: float, level: float) -> None:
    """One sign speaks for all the numbers, and so does one above 1; so many in so many is its limits' unit as well."""
    assert read_starting_risk(text) == RiskReading(value=value, low=low, high=high, level=level)


@pytest.mark.parametrize(("text", "events", "total"), COUNTED)
def test_counts_tell_how_precise_a_risk_is(text: str, events: int, total: int) -> None:
    """Typed with "of" or a stroke; a percentage behind them has to be theirs."""
    assert read_starting_risk(text) == RiskReading(value=events / total, events=events, total=total)


@pytest.mark.parametrize("text", BARE)
def test_a_way_of_saying_a_risk_is_no_count(text: str) -> None:
    """So many in 100, or of 100, says a risk and not how many people were seen."""
    reading = read_starting_risk(text)
    assert isinstance(reading, RiskReading)
    assert reading == RiskReading(value=reading.value)


def test_counts_may_have_limits_too() -> None:
    """With their sign, since a number of people is as likely there."""
    assert read_starting_risk("24 of 200 (8% to 17%)") == RiskReading(
        value=0.12, low=0.08, high=0.17, events=24, total=200
    )


@pytest.mark.parametrize(("text", "key"), REFUSED)
def test_what_gives_no_starting_risk_is_refused_with_its_reason(text: str, key: str) -> None:
    """What a risk alone is refused for, and what is wrong with limits or counts."""
    reading = read_starting_risk(text)
    assert isinstance(reading, Unreadable)
    assert reading.key == key


@given(ANY_TEXT | NEARLY)
def test_whatever_is_read_as_a_risk_is_read_so_here(text: str) -> None:
    """Limits and counts are only ever an addition, and every text gets an answer."""
    risk, reading = read_risk(text), read_starting_risk(text)
    if isinstance(risk, Proportion):
        assert isinstance(reading, RiskReading)
        assert reading.value == risk.value
    if isinstance(risk, Blank):
        assert reading == Blank()
    if isinstance(reading, RiskReading) and reading.low is not None and reading.high is not None:
        assert 0 <= reading.low <= reading.value <= reading.high <= 1


NUMBERS = st.integers(0, 1000).map(lambda tenths: f"{tenths / 10:.1f}") | st.integers(0, 100).map(str)


@given(
    st.tuples(NUMBERS, NUMBERS, NUMBERS).map(lambda each: sorted(each, key=float)),
    st.sampled_from(("%", " %", " in 100", " per 100", " out of 100", " per cent")),
    st.sampled_from(("({} to {})", "({}-{})", "[90% CI {}% to {}%]", "(95% CI, {}, {})")),
)
def test_the_other_outcome_s_risk_has_the_other_outcome_s_limits(numbers: list[str], unit: str, brackets: str) -> None:
    """Turned once, low and high change places; turned twice, all is as it was."""
    low, value, high = numbers
    text = f"{value}{unit} {brackets.format(low, high)}"
    before, after = read_starting_risk(text), read_starting_risk(complement_text(text))
    assert isinstance(before, RiskReading)
    assert isinstance(after, RiskReading)
    assert before.low is not None
    assert before.high is not None
    assert (after.value, after.low, after.high) == pytest.approx((1 - before.value, 1 - before.high, 1 - before.low))
    assert after.level == before.level
    assert complement_text(complement_text(text)) == text


@pytest.mark.parametrize(
    ("text", "turned"),
    [
        ("12% (9 to 15)", "88% (85 to 91)"),
        ("12 (9-15)", "88% (85-91)"),
        ("12% [95% CI: 9.1% to 15.2%]", "88% [95% CI: 84.8% to 90.9%]"),
        ("12 in 1,000 (0.9% to 1.5%)", "988 in 1,000 (98.5% to 99.1%)"),
        ("12 per 1000 (9 to 15)", "988 per 1000 (985 to 991)"),
        ("24 of 200", "176 of 200"),
        ("24/200 (12%)", "176/200 (88%)"),
        ("24/200 (8% to 17%)", "176/200 (83% to 92%)"),
        ("12% (15 to 9)", "12% (15 to 9)"),
        ("24/200 (8 to 17)", "24/200 (8 to 17)"),
    ],
)
def test_the_other_outcome_s_risk_is_written_in_the_same_style(text: str, turned: str) -> None:
    """And what cannot be read stays as it was typed."""
    assert complement_text(text) == turned


@pytest.mark.parametrize(
    ("text", "reading"),
    [
        ("30%", Proportion(value=0.3)),
        ("3 in 10", Proportion(value=0.3)),
        ("0%", Proportion(value=0.0)),
        ("", Blank()),
        ("many", Unreadable(key="not-a-share", facts={"text": "many"})),
        ("130%", Unreadable(key="share-out-of-range", facts={"text": "130%"})),
        ("0.3", Unreadable(key="percent-or-fraction", facts={"text": "0.3"})),
    ],
)
def test_a_share_is_read_as_a_risk_and_refused_as_a_share(text: str, reading: object) -> None:
    """It is written alike and is no risk."""
    assert read_share(text) == reading


ALL = Patient(
    starting_risk_text="12% (9 to 15)",
    low_risk_text="5%",
    high_risk_text="20%",
    rate_text="12 per 1,000 person-years",
    overall_risk_text="10%",
    exposed_share_text="30%",
)
USUAL = RiskReading(value=0.12, low=0.09, high=0.15)


@pytest.mark.parametrize(
    ("kind", "reading"),
    [
        ("one", StartReading(usual=USUAL)),
        ("three", StartReading(usual=USUAL, low=Proportion(value=0.05), high=Proportion(value=0.2))),
        ("rate", StartReading(rate=RateReading(value=0.012, unit="year"))),
        ("overall", StartReading(overall=Proportion(value=0.1), share=Proportion(value=0.3))),
    ],
)
def test_only_the_fields_of_the_chosen_kind_are_read(kind: str, reading: StartReading) -> None:
    """The texts of the others wait."""
    assert read_start(patient(start_kind=kind)) == reading


def patient(**changes: str) -> Patient:
    """A patient with something in every field, and some of it changed."""
    held = {name: getattr(ALL, name) for name in ALL.__struct_fields__}
    return Patient(**{**held, **changes})  # type: ignore[arg-type]


@pytest.mark.parametrize(
    ("changes", "field", "key"),
    [
        ({"low_risk_text": "13%"}, "low_risk_text", "low-above-usual"),
        ({"high_risk_text": "11%"}, "high_risk_text", "high-below-usual"),
        ({"low_risk_text": "30%"}, "low_risk_text", "low-above-usual"),
        ({"low_risk_text": "many"}, "low_risk_text", "not-a-risk"),
        ({"high_risk_text": "120%"}, "high_risk_text", "risk-out-of-range"),
        ({"starting_risk_text": "0.12"}, "starting_risk_text", "percent-or-fraction"),
    ],
)
def test_three_risks_have_to_lie_in_their_order(changes: dict[str, str], field: str, key: str) -> None:
    """The one that does not is unreadable, and its field is marked, once."""
    reading = read_start(patient(start_kind="three", **changes))
    assert [(mark.field, mark.key, mark.used) for mark in reading.marks] == [(field, key, False)]
    unreadable = {"low_risk_text": reading.low, "high_risk_text": reading.high, "starting_risk_text": reading.usual}
    assert [name for name, each in unreadable.items() if isinstance(each, Unreadable)] == [field]


def test_each_risk_that_is_out_of_order_is_marked() -> None:
    """Low and high the wrong way round about the usual one are both of no use."""
    reading = read_start(patient(start_kind="three", low_risk_text="30%", high_risk_text="0%"))
    assert [(mark.field, mark.key) for mark in reading.marks] == [
        ("low_risk_text", "low-above-usual"),
        ("high_risk_text", "high-below-usual"),
    ]


@pytest.mark.parametrize("usual", ["", "many"])
def test_without_a_usual_risk_nobody_knows_which_of_two_is_wrong(usual: str) -> None:
    """Neither the low one nor the high one is used then."""
    typed = patient(start_kind="three", low_risk_text="30%", starting_risk_text=usual)
    reading = read_start(typed)
    assert isinstance(reading.low, Unreadable)
    assert isinstance(reading.high, Unreadable)
    assert (reading.low.key, reading.high.key) == ("low-above-high", "high-below-low")
    assert read_start(patient(start_kind="three", starting_risk_text=usual)).high == Proportion(value=0.2)


def test_equal_risks_are_in_order() -> None:
    """Low, usual and high may be one."""
    same = dict.fromkeys(("low_risk_text", "starting_risk_text", "high_risk_text"), "12%")
    assert read_start(patient(start_kind="three", **same)).marks == ()


@pytest.mark.parametrize(
    ("changes", "field", "key"),
    [
        ({"start_kind": "one", "starting_risk_text": "0%"}, "starting_risk_text", "risk-of-nobody"),
        ({"start_kind": "one", "starting_risk_text": "100 in 100"}, "starting_risk_text", "risk-of-everybody"),
        ({"start_kind": "three", "low_risk_text": "0"}, "low_risk_text", "risk-of-nobody"),
        ({"start_kind": "overall", "overall_risk_text": "100%"}, "overall_risk_text", "risk-of-everybody"),
        ({"start_kind": "overall", "exposed_share_text": "0%"}, "exposed_share_text", "share-of-nobody"),
        ({"start_kind": "overall", "exposed_share_text": "100%"}, "exposed_share_text", "share-of-everybody"),
    ],
)
def test_nobody_and_everybody_are_read_and_pointed_out(changes: dict[str, str], field: str, key: str) -> None:
    """The risk is used as typed."""
    marks = read_start(patient(**changes)).marks
    assert [(mark.field, mark.key, mark.used) for mark in marks] == [(field, key, True)]


@pytest.mark.parametrize(
    ("changes", "marks"),
    [
        ({"start_kind": "rate", "rate_text": "12"}, [("rate_text", "rate-without-time")]),
        (
            {"start_kind": "overall", "overall_risk_text": "?", "exposed_share_text": "x"},
            [("overall_risk_text", "not-a-risk"), ("exposed_share_text", "not-a-share")],
        ),
    ],
)
def test_each_field_that_cannot_be_used_is_marked(changes: dict[str, str], marks: list[tuple[str, str]]) -> None:
    """With the reason, and the text in it."""
    typed = patient(**changes)
    found = read_start(typed).marks
    assert [(mark.field, mark.key) for mark in found] == marks
    assert [mark.facts["text"] for mark in found] == [getattr(typed, mark.field) for mark in found]
