"""What every part of the published dictionary has to be: a number in its range, an ordered pair, a reason."""

from __future__ import annotations

import math
from typing import Any


def withheld(part: Any) -> bool:
    """Whether a part is given up with a reason; then the reason has to be whole."""
    if not (isinstance(part, dict) and "withheld" in part):
        return False
    assert set(part) == {"withheld", "text"}
    assert all(isinstance(word, str) and word for word in part.values())
    return True


def check_number(part: Any, low: float = -math.inf, high: float = math.inf) -> None:
    """A finite number in its range, an infinity as a string, or a reason."""
    if withheld(part) or part in ("inf", "-inf"):
        return
    assert isinstance(part, int | float)
    assert not isinstance(part, bool)
    assert math.isfinite(part)
    assert low <= part <= high


def as_float(part: Any) -> float | None:
    return None if isinstance(part, dict) else float(part)


def check_ordered(low: Any, high: Any) -> None:
    ends = as_float(low), as_float(high)
    assert None in ends or ends[0] <= ends[1]


def check_figure(part: Any, low: float = -math.inf, high: float = math.inf) -> None:
    if withheld(part):
        return
    assert list(part)[:4] == ["estimate", "low", "high", "method"]
    assert set(part) <= {"estimate", "low", "high", "method", "adjusted"}
    assert part.get("adjusted", "half") == "half"
    assert isinstance(part["method"], str)
    check_number(part["estimate"], low, high)
    check_number(part["low"])
    check_number(part["high"])
    check_ordered(part["low"], part["high"])


def check_number_needed(part: Any) -> None:
    if withheld(part):
        return
    assert list(part) == ["estimate", "kind", "low", "high", "through_infinity"]
    check_number(part["estimate"], 0)
    assert part["kind"] in {"NNTB", "NNTH", "neither"}
    limits = [limit for limit in (part["low"], part["high"]) if not withheld(limit)]
    assert limits
    for limit in limits:
        assert list(limit) == ["value", "kind"]
        check_number(limit["value"], 1 - 1e-12)
        assert limit["kind"] in {"NNTB", "NNTH", "neither"}
    assert isinstance(part["through_infinity"], bool)
