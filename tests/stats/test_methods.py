"""The table of methods."""

from __future__ import annotations

import itertools
import subprocess
import sys
from collections.abc import Callable

import pytest

from contract_keys import METHOD_KEYS, TEST_KEYS
from fourcount.stats import methods
from fourcount.stats.entries.entry import Method
from fourcount.stats.results import GAP_KEYS, Counts, Gap, Interval

Table = Callable[..., Counts]

CELLS = (0, 1, 2, 5, 10**9)
LEVELS = (0.8, 0.95, 0.999)
CONDITIONAL = {"baptista-pike-mid-p", "conditional-exact", "conditional-mid-p"}
UNCONDITIONAL = [entry for entry in methods.METHODS if entry.key not in CONDITIONAL]

WITHOUT_NUMPY = """
import sys
from fourcount.stats import methods
from fourcount.stats.results import Counts
counts = Counts(index_events=15, index_non_events=85, reference_events=5, reference_non_events=95)
for name in ("score", "textbook"):
    family = methods.FAMILIES[name]
    methods.method("risk", family.risk).interval(15, 100, 0.95)
    for measure in ("risk_difference", "risk_ratio", "odds_ratio"):
        methods.method(measure, getattr(family, measure)).interval(counts, 0.95)
    methods.test(family.test).p(counts)
print(sorted({name.split(".")[0] for name in sys.modules} & {"numpy", "scipy", "statistics", "fractions"}))
"""


def test_the_keys_are_those_that_other_programs_read() -> None:
    """Each measure has exactly the methods of the JSON contract, each key once."""
    listed = [(entry.measure, entry.key) for entry in methods.METHODS]
    assert sorted(listed) == sorted((measure, key) for measure, keys in METHOD_KEYS.items() for key in keys)
    assert [entry.key for entry in methods.TESTS] == list(TEST_KEYS)


@pytest.mark.parametrize("entry", [*methods.METHODS, *methods.TESTS], ids=lambda entry: entry.title)
def test_every_entry_says_what_it_is(entry: Method) -> None:
    """Title, formula, source with a year, and note are there."""
    for text in (entry.title, entry.formula, entry.source, entry.note):
        assert text
        assert text == text.strip()
    assert any(word.strip(";,:.").isdigit() and len(word.strip(";,:.")) == 4 for word in entry.source.split())


def test_families_name_entries_of_the_table() -> None:
    """Every key of every family is found, and a look-up returns the entry asked for."""
    assert set(methods.FAMILIES) == {"score", "textbook", "exact"}
    for family in methods.FAMILIES.values():
        for measure in METHOD_KEYS:
            key = getattr(family, measure)
            found = methods.method(measure, key)
            assert (found.measure, found.key) == (measure, key)
        assert methods.method("risk", family.odds).key == family.odds
        assert methods.test(family.test).key == family.test


def test_a_key_that_is_not_there_is_an_error() -> None:
    """A method of another measure is no method of this one."""
    with pytest.raises(KeyError):
        methods.method("risk_ratio", "woolf")


def test_score_and_textbook_need_neither_numpy_nor_scipy() -> None:
    """Both families answer a table in an interpreter that has loaded neither."""
    answer = subprocess.run(
        [sys.executable, "-c", WITHOUT_NUMPY], check=True, capture_output=True, text=True, timeout=60
    )
    assert answer.stdout.strip() == "[]"


def _ask(entry: Method, counts: Counts, level: float) -> Interval | Gap:
    if entry.measure == "risk":
        return entry.interval(counts.index_events, counts.index_total, level)
    return entry.interval(counts, level)


@pytest.mark.parametrize("entry", UNCONDITIONAL, ids=lambda entry: f"{entry.measure} {entry.key}")
def test_every_small_and_extreme_table_has_an_answer(entry: Method, table: Table) -> None:
    """Each table of cells 0, 1, 2, 5 and 10^9: an ordered interval without nan, or a gap with a listed reason."""
    for cells in itertools.product(CELLS, repeat=4):
        for level in LEVELS:
            answer = _ask(entry, table(*cells), level)
            if isinstance(answer, Gap):
                assert answer.key in GAP_KEYS
                continue
            assert answer.low < answer.high, cells  # nan is not below anything
            assert answer.adjusted in (None, "half")


@pytest.mark.parametrize("entry", [*methods.METHODS], ids=lambda entry: f"{entry.measure} {entry.key}")
def test_every_entry_reaches_its_own_function(entry: Method, table: Table) -> None:
    """15/100 v 5/100 by every method: an interval round the estimate that leaves no effect and no risk far out."""
    answer = _ask(entry, table(15, 85, 5, 95), 0.95)
    assert isinstance(answer, Interval)
    low, high = {
        "risk": (0.08, 0.24),
        "risk_difference": (0.01, 0.19),
        "risk_ratio": (1.1, 8.5),
        "odds_ratio": (1.0, 12.5),
    }[entry.measure]
    assert low < answer.low < answer.high < high


@pytest.mark.parametrize("entry", methods.TESTS, ids=lambda entry: entry.key)
def test_every_test_gives_its_p(entry: methods.Test, table: Table) -> None:
    """15/100 v 5/100: chi-square 5.56 is p 0.018; the exact p is greater, its mid-P between."""
    p = entry.p(table(15, 85, 5, 95))
    assert isinstance(p, float)
    assert 0.018 < p < 0.033


def test_only_the_exact_family_is_slow_and_only_among_many(table: Table) -> None:
    """Above 10^7 a cell the conditional odds ratio may take longer than a frame."""
    small, large = table(10**7, 5, 5, 5), table(5, 5, 10**7 + 1, 5)
    assert [methods.slow(large, family) for family in ("score", "textbook", "exact")] == [False, False, True]
    assert not methods.slow(small, "exact")
