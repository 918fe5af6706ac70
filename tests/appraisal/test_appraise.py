"""Tests of the whole: memory, figures that follow, and what is loaded."""

from __future__ import annotations

import importlib
import subprocess
import sys

import msgspec
import pytest

from fourcount.appraisal import appraise as module
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Figure, Gap, Interval, NumberNeeded
from fourcount.appraisal.postponing import NEED_NUMPY, _loaded, postponed
from fourcount.appraisal.waiting import waits
from fourcount.record.paper import Choices
from fourcount.stats.methods import FAMILIES
from fourcount.stats.results import Counts

EXACT = Choices(family="exact")
HUGE = (4 * 10**8, 6 * 10**8, 3 * 10**8, 7 * 10**8)


def test_equal_outcomes_have_one_answer(study):
    """An outcome that is equal to an earlier one is not computed again."""
    assert appraise(study(3, 7, 5, 5), Choices()) is appraise(study(3, 7, 5, 5), Choices())


def test_memory_is_bounded():
    """The memory of answers has an end."""
    assert module._appraise.cache_info().maxsize == module.REMEMBERED


@pytest.mark.parametrize("family", ["score", "textbook"])
def test_a_quick_family_never_follows(study, family, monkeypatch):
    """Closed forms need nothing loaded: deferring changes nothing, but for a trial's fragility under the fold."""
    monkeypatch.setattr(module, "numbers_loaded", lambda: False)
    choices = Choices(family=family)
    cohort = study(*HUGE, design="cohort")
    assert appraise(cohort, choices, deferring=True) is appraise(cohort, choices)
    trial, later = appraise(study(*HUGE), choices, deferring=True), appraise(study(*HUGE), choices)
    assert Gap("follows") == trial.extras.fragility
    assert msgspec.structs.replace(later, extras=trial.extras) == trial


def test_exact_figures_follow_until_the_libraries_are_loaded(study, monkeypatch):
    """Before the libraries are loaded the exact intervals and p follow, while estimates and closed forms stand."""
    monkeypatch.setattr(module, "numbers_loaded", lambda: False)
    findings = appraise(study(38, 374, 70, 339, baseline="12%"), EXACT, deferring=True)
    for key in ("risk_index", "risk_reference", "odds_index", "odds_reference", "odds_ratio"):
        figure = findings.measures[key]
        assert isinstance(figure, Figure)
        assert isinstance(figure.estimate, float)
        assert Gap("follows") == figure.interval
    assert Gap("follows") == findings.test.p
    assert isinstance(findings.measures["risk_difference"].interval, Interval)
    assert isinstance(findings.measures["number_needed"], NumberNeeded)
    assert Gap("follows") == findings.conversion.risk_ratio.interval


def test_exact_figures_are_there_once_the_libraries_are_loaded(study, monkeypatch):
    """The answer that waits for the libraries is not the one remembered after they have come."""
    outcome = study(38, 374, 70, 338)
    monkeypatch.setattr(module, "numbers_loaded", lambda: False)
    assert Gap("follows") == appraise(outcome, EXACT, deferring=True).test.p
    monkeypatch.setattr(module, "numbers_loaded", lambda: True)
    assert appraise(outcome, EXACT) == appraise(outcome, EXACT, deferring=True)
    assert isinstance(appraise(outcome, EXACT, deferring=True).test.p, float)


def test_a_slow_figure_follows(study, monkeypatch):
    """At hundreds of millions a cell the exact odds ratio and p follow, the exact risks do not."""
    monkeypatch.setattr(module, "numbers_loaded", lambda: True)
    findings = appraise(study(*HUGE), EXACT, deferring=True)
    assert Gap("follows") == findings.measures["odds_ratio"].interval
    assert Gap("follows") == findings.test.p
    assert isinstance(findings.measures["risk_index"].interval, Interval)


def test_findings_that_wait_say_so(study, monkeypatch):
    """Whoever deferred can tell whether to ask again."""
    monkeypatch.setattr(module, "numbers_loaded", lambda: False)
    outcome = study(38, 374, 70, 336)
    assert waits(appraise(outcome, EXACT, deferring=True))
    assert not waits(appraise(outcome, EXACT))
    assert not waits(appraise(study("", "", "", ""), EXACT, deferring=True))


def test_nothing_follows_unless_asked(study, monkeypatch):
    """Without deferring every figure is computed, whatever is loaded."""
    monkeypatch.setattr(module, "numbers_loaded", lambda: False)
    assert isinstance(appraise(study(38, 374, 70, 337), EXACT).test.p, float)


def test_what_needs_numpy_is_the_exact_familys_own():
    """The postponed methods are those of the exact family that the score family does not share."""
    exact, score = FAMILIES["exact"], FAMILIES["score"]
    methods = {exact.risk, exact.risk_difference, exact.risk_ratio, exact.odds_ratio, exact.test}
    assert methods - {score.risk, score.risk_difference, score.risk_ratio, score.odds_ratio} == NEED_NUMPY


def test_a_small_table_postpones_nothing_once_loaded():
    """A small table is quick in every family."""
    small = Counts(index_events=3, index_non_events=7, reference_events=5, reference_non_events=5)
    assert frozenset() == postponed(small, EXACT, loaded=True)
    assert frozenset() == postponed(small, Choices(), loaded=False)


def test_a_library_in_the_middle_of_its_import_is_not_loaded(tmp_path, monkeypatch):
    """Whoever used a half-imported library would wait for it, so it does not count as loaded."""
    source = "from fourcount.appraisal.postponing import _loaded\nseen = _loaded(__name__)\n"
    (tmp_path / "half_imported_library.py").write_text(source, encoding="utf-8")
    monkeypatch.syspath_prepend(str(tmp_path))
    assert not _loaded("half_imported_library")
    library = importlib.import_module("half_imported_library")
    assert not library.seen
    assert _loaded("half_imported_library")


LIGHT = """
import sys
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.every import every_interval
from fourcount.record.outcome import EventsAndOthers, Outcome, Patient
from fourcount.record.paper import Choices
table = EventsAndOthers(first_left_text="38", first_right_text="374", second_left_text="70", second_right_text="339")
for family in ("score", "textbook"):
    for design in ("trial", "cohort"):
        outcome = Outcome(table=table, design=design, patient=Patient(starting_risk_text="12%"))
        appraise(outcome, Choices(family=family), deferring=True)
deferred = appraise(Outcome(table=table), Choices(family="exact"), deferring=True)
assert deferred.test.p.key == "follows", deferred.test
heavy = {"numpy", "scipy", "PySide6"} & {name.partition(".")[0] for name in sys.modules}
assert not heavy, heavy
"""


def test_score_and_textbook_load_no_library():
    """A fresh interpreter appraises by closed forms, and defers what is exact, without numpy, scipy or Qt."""
    done = subprocess.run([sys.executable, "-c", LIGHT], capture_output=True, text=True, check=False)
    assert done.stderr == ""
    assert done.returncode == 0
