"""Arguments nobody should give: each is answered with one plain sentence, never with a traceback."""

from __future__ import annotations

from decimal import Decimal

import numpy as np
import pytest

from fourcount.__main__ import MISTYPED, main
from fourcount.publish.answer import answer

NO_COUNTS = (
    "", " ", "-", "-1", "\u22121", "1.5", "1e3", "0x10", "1_000", "+1", "nan", "inf", "1/2", "1 (50%)", "10000000000",
    "9" * 5000, "\u00bd", "\u00b2", "\u06612", "\U0001d7d92", "\u202e12", "1\n2", "\x1b[31m1", "\udcff", "{0}", "%s",
    "@file", "<b>1</b>", "=1+1",
)  # fmt: skip
NO_OPTIONS = (
    ("--level", "nan"), ("--level", "inf"), ("--level", ""), ("--level", "-95"), ("--level", "100"),
    ("--level", "9" * 5000), ("--level",), ("--level", "--json"), ("--baseline", "nan"), ("--baseline", ""),
    ("--baseline", "0.5"),
    ("--baseline", "-5%"), ("--baseline", "1 in 0"), ("--baseline", "101%"), ("--design", ""), ("--design", "\udcff"),
    ("--design", "%s{0}"), ("--intervals", "Score"), ("--json=1",), ("--lev", "95"),
    ("--", "5"), ("-x",), ("--%s",), ("-hx",),
)  # fmt: skip
NO_WHOLE_NUMBERS: tuple[object, ...] = (
    True,
    1.0,
    -0.0,
    float("nan"),
    None,
    "1",
    b"1",
    Decimal(1),
    -1,
    10**9 + 1,
    10**5000,
    [],
    1j,
)
NO_LEVELS: tuple[object, ...] = (
    True,
    float("nan"),
    float("inf"),
    0,
    95,
    None,
    "0.95",
    Decimal("nan"),
    10**5000,
    0.95 + 0j,
)


def short(value: object) -> str:
    """A name for a parameter; Python refuses to write out a whole number of great length."""
    return type(value).__name__ if isinstance(value, int) else ascii(value)[:20]


def one_sentence(text: str) -> bool:
    """Whether a text is one short line without a control character."""
    line = text.removesuffix("\n")
    return line.startswith("fourcount: ") and line.endswith(".") and line.isprintable() and len(line) < 250


@pytest.mark.parametrize("count", NO_COUNTS, ids=short)
def test_no_count(count: str, capsys: pytest.CaptureFixture[str]) -> None:
    """What is no count ends with status 2 and one sentence on stderr, nothing on stdout."""
    assert main(["answer", count, "2", "3", "4"]) == MISTYPED
    out, err = capsys.readouterr()
    assert out == ""
    assert one_sentence(err)


@pytest.mark.parametrize("option", NO_OPTIONS, ids=short)
def test_no_option(option: tuple[str, ...], capsys: pytest.CaptureFixture[str]) -> None:
    """What is no option, or no value of one, ends likewise."""
    assert main(["answer", "1", "2", "3", "4", *option]) == MISTYPED
    out, err = capsys.readouterr()
    assert out == ""
    assert one_sentence(err)


@pytest.mark.parametrize("count", NO_WHOLE_NUMBERS, ids=short)
def test_no_whole_number(count: object) -> None:
    """Other programs get the same sentence for whatever is no whole number from 0 to 10^9."""
    with pytest.raises(ValueError, match=r"^The index events must be a whole number"):
        answer(count, 2, 3, 4)  # type: ignore[arg-type]


@pytest.mark.parametrize("level", NO_LEVELS, ids=short)
def test_no_level(level: object) -> None:
    """A level that is no fraction in range is refused, however large or odd."""
    with pytest.raises(ValueError, match=r"^The level must be a fraction"):
        answer(1, 2, 3, 4, level=level)  # type: ignore[arg-type]


def test_numbers_of_numpy_are_numbers() -> None:
    """Counts and fractions as arrays hold them give the very same answer."""
    ours = answer(5, 6, 7, 8, level=0.95, baseline=0.12)
    theirs = answer(np.int64(5), np.int8(6), np.uint32(7), 8, level=np.float64(0.95), baseline=np.float64(0.12))  # type: ignore[arg-type]
    assert theirs == ours
