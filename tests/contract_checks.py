"""What every part of the published dictionary has to be: a number in its range, an ordered pair, a reason."""

from __future__ import annotations

import math
from typing import Any

from contract_keys import PATIENT_KEYS, PATIENT_KEYS_OF_THREE


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
    assert limits or not part["through_infinity"]
    for limit in limits:
        assert list(limit) == ["value", "kind"]
        check_number(limit["value"], 1 - 1e-12)
        assert limit["kind"] in {"NNTB", "NNTH", "neither"}
    assert isinstance(part["through_infinity"], bool)


def check_pair(part: Any, low: float, high: float) -> None:
    """Two ordered limits in their range, or a reason."""
    if not withheld(part):
        check_number(part[0], low, high)
        check_number(part[1], low, high)
        check_ordered(*part)


def check_patient(part: Any) -> None:
    """The effect at one starting risk, and of three the low and the high one alike."""
    if withheld(part):
        return
    assert tuple(key for key in part if key not in PATIENT_KEYS_OF_THREE) == PATIENT_KEYS
    for key in ("baseline", "risk_without"):
        check_number(part[key], 0, 1)
    for key in ("start_interval", "risk_without_interval"):
        check_pair(part[key], 0, 1)
    check_figure(part["risk_with"], 0, 1)
    check_figure(part["difference"], -1, 1)
    check_number_needed(part["number_needed"])
    check_figure(part["risk_ratio"], 0)
    check_figure(part["carried"])
    assert part["effect"] in ("risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio", "risk_difference")
    assert part["range_from"] in ("table", "effect", "both")
    assert part["start_from"] in ("reference", "typed", "rate", "overall")
    for side in ("low", "high"):
        check_patient(part.get(side, {"withheld": "-", "text": "-"}))
