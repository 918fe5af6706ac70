"""Whole people: somebody is never nobody, and nearly all are never all."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.wording import of_people

PEOPLE = st.sampled_from((100, 1_000, 10_000))


@pytest.mark.parametrize(
    ("risk", "affected", "unaffected"),
    [
        (0.0, "0", "100"),
        (0.004, "under 1", "over 99"),
        (0.005, "1", "99"),
        (0.12, "12", "88"),
        (0.995, "over 99", "under 1"),
        (0.994, "99", "1"),
        (1.0, "100", "0"),
    ],
)
def test_of_a_hundred_people(risk, affected, unaffected):
    """Halves go up, and both frames make the whole."""
    assert (of_people.affected(risk, 100), of_people.unaffected(risk, 100)) == (affected, unaffected)


@given(st.floats(min_value=0, max_value=1), PEOPLE)
def test_both_frames_make_the_whole_or_say_that_they_cannot(risk, people):
    """Numbers add up; where one would hide somebody, the other is said as its counterpart."""
    affected, unaffected = of_people.affected(risk, people), of_people.unaffected(risk, people)
    if of_people.hidden(risk, people):
        assert {affected, unaffected} == {"under 1", f"over {people - 1:,}"}
    else:
        assert int(affected.replace(",", "")) + int(unaffected.replace(",", "")) == people
        assert (affected == "0") == (risk == 0)
        assert (unaffected == "0") == (risk == 1)


@pytest.mark.parametrize(("difference", "size"), [(0.0, "0"), (-0.004, "under 1"), (-0.06, "6"), (0.125, "13")])
def test_a_difference_has_a_size_and_no_sign(difference, size):
    """Its side is a word of its own."""
    assert of_people.apart(difference, 100) == size
