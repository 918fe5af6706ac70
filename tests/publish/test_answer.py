"""Four counts in, a dictionary out: what is accepted, and the figures against print."""

from __future__ import annotations

from fractions import Fraction
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import fourcount
from fourcount.publish.answer import answer, asked
from fourcount.record.entry.readings import Proportion
from fourcount.record.entry.risk import read_risk

TRIAL = (15, 85, 5, 95)


def test_it_is_reached_from_the_package() -> None:
    """The package offers the function by name."""
    assert fourcount.answer is answer


def test_the_difference_of_a_printed_table() -> None:
    """56 of 70 against 48 of 80, square-and-add interval 0.0524 to 0.3339.

    Newcombe 1998, Stat Med 17:873, table II, method 10; the printed limits from memory.
    """
    published: Any = answer(56, 14, 48, 32)
    low, high = published["methods"]["risk_difference"]["newcombe"]
    assert (round(low, 4), round(high, 4)) == (0.0524, 0.3339)
    assert published["measures"]["risk_difference"]["estimate"] == pytest.approx(0.2, abs=1e-15)


def test_the_welcome_event_turns_the_number_needed() -> None:
    """More of an unwelcome event is an NNTH, more of a welcome one an NNTB; nothing else changes."""
    bad: Any = answer(*TRIAL)
    good: Any = answer(*TRIAL, unwelcome=False)
    assert bad["measures"]["number_needed"]["kind"] == "NNTH"
    assert good["measures"]["number_needed"]["kind"] == "NNTB"
    assert bad["methods"] == good["methods"]


@pytest.mark.parametrize("baseline", [0.12, "12%", " 12 in 100 ", "12,0 %", Fraction(3, 25), np.float64(0.12)])
def test_a_baseline_is_a_fraction_or_a_text(baseline: Any) -> None:
    """However a starting risk is given, it is the same one."""
    published: Any = answer(*TRIAL, baseline=baseline)
    assert published["patient"]["baseline"] == 0.12
    assert published["conversion"]["baseline"] == 0.12
    assert published["conversion"]["baseline_from"] == "given"


@given(st.floats(0, 1))
def test_a_fraction_reads_back_as_itself(baseline: float) -> None:
    """The text that stands for a fraction gives exactly that fraction."""
    question = asked(TRIAL, design="trial", level=0.95, intervals="score", baseline=baseline, unwelcome=True)
    assert read_risk(question.outcome.patient.starting_risk_text) == Proportion(value=baseline)


def test_whole_numbers_of_other_kinds_are_counts() -> None:
    """A whole number of numpy's is as good as Python's own."""
    assert answer(np.int64(15), np.uint8(85), 5, 95) == answer(*TRIAL)


COUNTS = [True, np.True_, 15.0, "15", None, -1, 10**9 + 1, 10**5000, -(10**5000), float("nan"), [15], b"1"]


@pytest.mark.parametrize("count", COUNTS, ids=range(len(COUNTS)))
@pytest.mark.parametrize("place", range(4))
def test_only_whole_numbers_in_range_are_counts(count: Any, place: int) -> None:
    """A truth value, a fraction, a text or a number out of range is refused in one sentence."""
    counts: list[Any] = list(TRIAL)
    counts[place] = count
    with pytest.raises(ValueError, match="must be a whole number from 0 to 1,000,000,000") as refusal:
        answer(*counts)
    assert_one_sentence(str(refusal.value))


WRONG = [
    {"design": "crossover"},
    {"design": None},
    {"design": "a\nb" * 1000},
    {"intervals": "wilson"},
    {"intervals": 1},
    {"level": 95},
    {"level": 0.79},
    {"level": 1.0},
    {"level": float("nan")},
    {"level": True},
    {"level": "95%"},
    {"baseline": 12},
    {"baseline": 1.5},
    {"baseline": -0.1},
    {"baseline": float("nan")},
    {"baseline": True},
    {"baseline": "0.12"},
    {"baseline": "many"},
    {"baseline": ""},
    {"baseline": [0.1]},
    {"printed": 0.54},
    {"printed": b"RR 0.54"},
    {"unwelcome": 1},
    {"unwelcome": None},
]


@pytest.mark.parametrize("wrong", WRONG, ids=lambda wrong: str(wrong)[:30])
def test_any_other_argument_is_refused_in_one_sentence(wrong: dict[str, Any]) -> None:
    """What cannot be used is named in one plain sentence."""
    with pytest.raises(ValueError) as refusal:  # noqa: PT011 - the sentence is looked at below
        answer(*TRIAL, **wrong)
    assert_one_sentence(str(refusal.value))
    assert next(iter(wrong)) in str(refusal.value)


def assert_one_sentence(text: str) -> None:
    assert text.endswith(".")
    assert "\n" not in text
    assert len(text) < 200


def test_the_exact_borders_are_accepted() -> None:
    """0 and 10^9 are counts, 0.80 and 0.999 levels, 0 and 1 starting risks."""
    for level in (0.80, 0.999):
        question = asked(
            (0, 10**9, 0, 10**9), design="survey", level=level, intervals="exact", baseline=1, unwelcome=True
        )
        assert (question.counts, question.choices.level) == ((0, 10**9, 0, 10**9), level)
    assert answer(1, 9, 2, 8, baseline=0)["design"] == "trial"
