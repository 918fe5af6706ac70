"""The table of methods."""

from __future__ import annotations

import itertools
import subprocess
import sys
from collections.abc import Callable

import pytest

from contract_keys import (
    METHOD_KEYS,
    PAIR_METHOD_KEYS,
    PAIR_TEST_KEYS,
    RATE_METHOD_KEYS,
    RATE_TEST_KEYS,
    TEST_KEYS,
)
from fourcount.stats import methods
from fourcount.stats.entries.entry import Method
from fourcount.stats.results import GAP_KEYS, Counts, Gap, Interval, PairCounts, Rates
from paired_tables import EXTREME_RATES, pairs_of, rates_of

Table = Callable[..., Counts]

CELLS = (0, 1, 2, 5, 10**9)
LEVELS = (0.8, 0.95, 0.999)
CONDITIONAL = {"baptista-pike-mid-p", "conditional-exact", "conditional-mid-p"}
UNCONDITIONAL = [entry for entry in methods.METHODS if entry.key not in CONDITIONAL]
SHARED = (*methods.PAIR_METHODS, *methods.RATE_METHODS, *methods.PAIR_TESTS, *methods.RATE_TESTS)

WITHOUT_NUMPY = """
import sys
from fourcount.stats import methods
from fourcount.stats.results import Counts, PairCounts, Rates
pairs = PairCounts(both=27, index_only=29, reference_only=3, neither=4)
rates = Rates(index_events=41, index_time=28010.0, reference_events=15, reference_time=19017.0)
counts = Counts(index_events=15, index_non_events=85, reference_events=5, reference_non_events=95)
for name in ("score", "textbook"):
    family = methods.FAMILIES[name]
    methods.method("risk", family.risk).interval(15, 100, 0.95)
    for measure in ("risk_difference", "risk_ratio", "odds_ratio"):
        methods.method(measure, getattr(family, measure)).interval(counts, 0.95)
    methods.test(family.test).p(counts)
    of_pairs, of_rates = methods.PAIR_FAMILIES[name], methods.RATE_FAMILIES[name]
    for part in ("difference", "ratio", "odds_ratio"):
        methods.method("pair_" + part, getattr(of_pairs, part)).interval(pairs, 0.95)
    for part in ("difference", "ratio"):
        methods.method("rate_" + part, getattr(of_rates, part)).interval(rates, 0.95)
    methods.method("rate", of_rates.rate).interval(41, 28010.0, 0.95)
    methods.test(of_pairs.test).p(pairs)
    methods.test(of_rates.test).p(rates)
print(sorted({name.split(".")[0] for name in sys.modules} & {"numpy", "scipy", "statistics", "fractions"}))
"""


def test_the_keys_are_those_that_other_programs_read() -> None:
    """Each measure has exactly the methods of the JSON contract, each key once."""
    for entries, by_measure in (
        (methods.METHODS, METHOD_KEYS),
        (methods.PAIR_METHODS, PAIR_METHOD_KEYS),
        (methods.RATE_METHODS, RATE_METHOD_KEYS),
    ):
        listed = [(entry.measure, entry.key) for entry in entries]
        assert sorted(listed) == sorted((measure, key) for measure, keys in by_measure.items() for key in keys)
    assert tuple(entry.key for entry in methods.TESTS) == TEST_KEYS
    assert tuple(entry.key for entry in methods.PAIR_TESTS) == PAIR_TEST_KEYS
    assert tuple(entry.key for entry in methods.RATE_TESTS) == RATE_TEST_KEYS


@pytest.mark.parametrize("entry", [*methods.METHODS, *methods.TESTS, *SHARED], ids=lambda entry: entry.title)
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


def test_families_of_pairs_and_of_rates_name_entries_of_the_table() -> None:
    """Each key of each family is found; a side of pairs has the methods of any single risk."""
    assert set(methods.PAIR_FAMILIES) == set(methods.RATE_FAMILIES) == set(methods.FAMILIES)
    for pair_family in methods.PAIR_FAMILIES.values():
        for measure in PAIR_METHOD_KEYS:
            key = getattr(pair_family, measure.removeprefix("pair_"))
            assert methods.method(measure, key) in methods.PAIR_METHODS
        assert methods.method("pair_risk", pair_family.risk) is methods.method("risk", pair_family.risk)
        assert methods.test(pair_family.test) in methods.PAIR_TESTS
    for rate_family in methods.RATE_FAMILIES.values():
        for measure in RATE_METHOD_KEYS:
            key = getattr(rate_family, measure.removeprefix("rate_"))
            assert methods.method(measure, key) in methods.RATE_METHODS
        assert methods.test(rate_family.test) in methods.RATE_TESTS


def test_a_key_that_is_not_there_is_an_error() -> None:
    """A method of another measure is no method of this one."""
    with pytest.raises(KeyError):
        methods.method("risk_ratio", "woolf")


def test_score_and_textbook_need_neither_numpy_nor_scipy() -> None:
    """Both families answer a table, pairs and rates in an interpreter that has loaded neither."""
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


def _ask_shared(entry: Method | methods.Test, counts: PairCounts | Rates, level: float) -> Interval | Gap | float:
    """An interval or a p of pairs or rates; a single rate is that of the index group."""
    if isinstance(entry, methods.Test):
        return entry.p(counts)
    if entry.measure == "rate":
        assert isinstance(counts, Rates)
        return entry.interval(counts.index_events, counts.index_time, level)
    return entry.interval(counts, level)


def _name(entry: Method | methods.Test) -> str:
    return entry.title


@pytest.mark.parametrize("entry", SHARED, ids=_name)
def test_every_small_and_extreme_table_of_pairs_and_of_rates_has_an_answer(entry: Method | methods.Test) -> None:
    """0, 1, 2, 5 and 10^9 pairs or events, tiny and huge person-time: an ordered interval, a p, or a listed gap."""
    of_pairs = entry in (*methods.PAIR_METHODS, *methods.PAIR_TESTS)
    tables = itertools.product(CELLS, repeat=4) if of_pairs else iter(EXTREME_RATES)
    for table in tables:
        answer = _ask_shared(entry, pairs_of(table) if of_pairs else rates_of(table), 0.95)  # type: ignore[arg-type]
        if isinstance(answer, Gap):
            assert answer.key in GAP_KEYS
        elif isinstance(answer, Interval):
            assert answer.low < answer.high, table  # nan is not below anything
            assert answer.adjusted is None
        else:
            assert 0 <= answer <= 1, table


NEAR = {
    "pair_difference": (0.05, 0.3),
    "pair_ratio": (1.1, 2.0),
    "pair_odds_ratio": (1.5, 10.0),
    "rate": (0.018, 0.046),
    "rate_difference": (0.0, 0.03),
    "rate_ratio": (1.0, 4.0),
}
"""Where the limits of 25 index only and 7 reference only of 100 pairs, and of 30 in 1000 v 15 in 1000, have to lie."""


@pytest.mark.parametrize("entry", SHARED, ids=_name)
def test_every_entry_of_pairs_and_of_rates_reaches_its_own_function(entry: Method | methods.Test) -> None:
    """One plain table each: limits near the estimate; p of 25 v 7 about 0.002, of 30 v 15 about 0.03."""
    of_pairs = entry in (*methods.PAIR_METHODS, *methods.PAIR_TESTS)
    answer = _ask_shared(entry, pairs_of((30, 25, 7, 38)) if of_pairs else rates_of((30, 1000.0, 15, 1000.0)), 0.95)
    assert not isinstance(answer, Gap)
    if isinstance(answer, Interval):
        assert isinstance(entry, Method)
        low, high = NEAR[entry.measure]
        assert low < answer.low < answer.high < high
    else:
        assert (0.001 if of_pairs else 0.02) < answer < (0.004 if of_pairs else 0.04)
