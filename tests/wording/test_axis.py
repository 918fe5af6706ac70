"""The ends of a strip say what they are, in the reader's units."""

from __future__ import annotations

import pytest

from fourcount.picture.scales import DIFFERENCE_ENDS, RATIO_ENDS, RISK_ENDS
from fourcount.wording.axis import axis_words


@pytest.mark.parametrize(
    ("kind", "end", "words"),
    [
        ("difference", 0.15, ("15 fewer", "0", "15 more")),
        ("difference", 0.0025, ("0.25 fewer", "0", "0.25 more")),
        ("ratio", 4.0, ("¼", "lower | higher", "4")),
        ("ratio", 50.0, ("0.02", "lower | higher", "50")),
        ("risk", 0.25, ("0", "", "25%")),
        ("risk", 0.001, ("0", "", "0.1%")),
    ],
)
def test_the_ends_of_a_scale(kind: str, end: float, words: tuple[str, str, str]) -> None:
    """Fewer on the left, more on the right; a ratio's ends are ratios, not changes."""
    assert axis_words(kind, end) == words


def test_every_end_of_every_scale_has_words() -> None:
    """No scale can be drawn whose ends cannot be named."""
    for kind, ends in (("difference", DIFFERENCE_ENDS), ("ratio", RATIO_ENDS), ("risk", RISK_ENDS)):
        for end in ends:
            low, _, high = axis_words(kind, end)
            assert low
            assert high
