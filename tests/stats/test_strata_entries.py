"""The entries of pooled measures, of tests of strata and of risks with printed limits in the table of methods."""

from __future__ import annotations

import itertools
import math

import pytest

from contract_keys import HOMOGENEITY_TEST_KEYS, POOLED_METHOD_KEYS, RECOVERY_KEYS, STRATA_TEST_KEYS, TIMED_METHOD_KEYS
from fourcount.stats import methods
from fourcount.stats.entries.entry import Calculation, HomogeneityEntry, Method, Test
from fourcount.stats.results import GAP_KEYS, Counts, Gap
from tables import counts_of

SMALL = [counts_of(cells) for cells in itertools.product((0, 1, 10**9), repeat=4)]
PAIRS = list(itertools.combinations_with_replacement(SMALL, 2))


def test_the_keys_are_those_that_other_programs_read() -> None:
    """Each pooled and each timed measure has exactly the methods written down, each once, and so have the tests."""
    for entries, keys in ((methods.STRATA_METHODS, POOLED_METHOD_KEYS), (methods.TIMED_METHODS, TIMED_METHOD_KEYS)):
        listed = [(entry.measure, entry.key) for entry in entries]
        assert sorted(listed) == sorted((measure, key) for measure, of_it in keys.items() for key in of_it)
    assert [entry.key for entry in methods.STRATA_TESTS] == list(STRATA_TEST_KEYS)
    assert [entry.key for entry in methods.HOMOGENEITY_TESTS] == list(HOMOGENEITY_TEST_KEYS)
    assert [entry.key for entry in methods.RECOVERIES] == list(RECOVERY_KEYS)


def test_every_entry_is_found_by_its_key() -> None:
    """The look-ups return the entry asked for."""
    for entry in (*methods.STRATA_METHODS, *methods.TIMED_METHODS):
        assert methods.method(entry.measure, entry.key) is entry
    for test in methods.STRATA_TESTS:
        assert methods.test(test.key) is test
    for homogeneity in methods.HOMOGENEITY_TESTS:
        assert methods.homogeneity_test(homogeneity.key) is homogeneity


@pytest.mark.parametrize(
    "entry",
    [
        *methods.STRATA_METHODS,
        *methods.STRATA_TESTS,
        *methods.HOMOGENEITY_TESTS,
        *methods.TIMED_METHODS,
        *methods.RECOVERIES,
    ],
    ids=lambda entry: entry.title,
)
def test_every_entry_says_what_it_is(entry: Method | Test | HomogeneityEntry | Calculation) -> None:
    """Title, formula, source and note are there, the note a whole sentence."""
    assert entry.title
    assert entry.formula
    assert entry.source
    assert entry.note.endswith(".")


@pytest.mark.parametrize("entry", methods.STRATA_METHODS, ids=lambda entry: f"{entry.measure} {entry.key}")
def test_every_two_small_and_extreme_strata_have_an_interval_or_a_reason(entry: Method) -> None:
    """All pairs of tables of cells 0, 1 and 10^9: an ordered interval without nan, or a gap with a listed reason."""
    for strata in PAIRS:
        answer = entry.interval(strata, 0.95)
        if isinstance(answer, Gap):
            assert answer.key in GAP_KEYS
        else:
            assert answer.low < answer.high, strata  # nan is not below anything


@pytest.mark.parametrize("entry", methods.STRATA_TESTS, ids=lambda entry: entry.key)
def test_every_two_small_and_extreme_strata_have_a_p_or_a_reason(entry: Test) -> None:
    """All pairs of tables of cells 0, 1 and 10^9: a p from 0 to 1, or a gap with a listed reason."""
    for strata in PAIRS:
        answer = entry.p(strata)
        assert answer.key in GAP_KEYS if isinstance(answer, Gap) else 0.0 <= answer <= 1.0, strata


@pytest.mark.parametrize("entry", methods.HOMOGENEITY_TESTS, ids=lambda entry: entry.key)
def test_every_two_small_and_extreme_strata_are_alike_or_not_or_have_a_reason(entry: HomogeneityEntry) -> None:
    """All pairs of tables of cells 0, 1 and 10^9: a finite chi-square and its p, or a gap with a listed reason."""
    for strata in PAIRS:
        answer = entry.test(strata)
        if isinstance(answer, Gap):
            assert answer.key in GAP_KEYS
        else:
            assert 0.0 <= answer.chi_square < math.inf, strata
            assert 0.0 <= answer.p <= 1.0
            assert answer.degrees == 1


@pytest.mark.parametrize("strata", [(), (counts_of((0, 0, 0, 0)),), (counts_of((3, 4, 0, 0)), counts_of((0, 0, 5, 6)))])
def test_no_stratum_that_compares_anything_is_a_reason(strata: tuple[Counts, ...]) -> None:
    """None at all, an empty one, or groups that never meet in one stratum: nothing to compare, everywhere."""
    for entry in methods.STRATA_METHODS:
        assert entry.interval(strata, 0.95) == Gap("no-strata")
    for test in methods.STRATA_TESTS:
        assert test.p(strata) == Gap("no-strata")
    for homogeneity in methods.HOMOGENEITY_TESTS:
        assert homogeneity.test(strata) == Gap("no-strata")
