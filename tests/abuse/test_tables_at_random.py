"""Tables at random, small and vast, by every design, family and level: no figure or sentence contradicts another."""

from __future__ import annotations

import json
import random
import re
from collections.abc import Iterator
from datetime import date
from math import inf, isfinite

import numpy as np
import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Figure, Gap, Interval, NumberNeeded, OutcomeFindings, PatientFindings
from fourcount.publish.answer import Question, asked
from fourcount.publish.contract import contract
from fourcount.publish.listing import listing
from fourcount.publish.sheet import tsv
from fourcount.record.outcome import DESIGNS
from fourcount.record.paper import FAMILIES, Record
from fourcount.wording.sentence import headline

SMALL = (0, 0, 0, 1, 1, 2, 3, 5, 10, 19, 38, 99, 100, 412)
BASELINES = (None, None, 0, 1, 0.5, 0.12, 1e-9, 5e-324, "12%", "1 in 1000", "100%")
LEVELS = (0.8, 0.9, 0.95, 0.99, 0.999)
RAW = re.compile(r"\bnan\b|None|\binf\b|[{}]|%s|Gap\(|Interval\(|-0\.0|\de[+-]\d\d")
ROUNDING = 1e-9


def questions(seed: int, how_many: int, largest: int) -> Iterator[Question]:
    """Tables in which zeros, equal groups and extreme sizes are common."""
    dice = random.Random(seed)

    def cell() -> int:
        return dice.choice(SMALL) if dice.random() < 0.7 else dice.choice((1, largest // 10, largest - 1, largest))

    for _ in range(how_many):
        yield asked(
            (cell(), cell(), cell(), cell()),
            design=dice.choice(DESIGNS),
            level=dice.choice(LEVELS),
            intervals=dice.choice(FAMILIES),
            baseline=dice.choice(BASELINES),
            unwelcome=dice.random() < 0.6,
        )


def findings_of(question: Question) -> OutcomeFindings:
    """All figures, with every floating-point fault an error but an underflow to zero."""
    with np.errstate(all="raise", under="ignore"):
        return appraise(question.outcome, question.choices)


@pytest.mark.parametrize(("largest", "how_many"), [(1000, 400), (10**9, 60)])
def test_every_figure_is_in_order(largest: int, how_many: int) -> None:
    """Limits in order, estimates inside intervals of unaltered counts, risks and p from 0 to 1, kinds by the side."""
    for question in questions(1, how_many, largest):
        findings = findings_of(question)
        for key, measure in findings.measures.items():
            if isinstance(measure, Figure):
                assert _in_order(measure), (question, key, measure)
            elif isinstance(measure, NumberNeeded):
                assert measure.kind == _kind(question, findings), (question, measure)
        p = getattr(findings.test, "p", 0.0)
        assert isinstance(p, Gap) or 0 <= p <= 1, question
        if isinstance(findings.patient, PatientFindings):
            for risk in (findings.patient.without, findings.patient.with_):
                assert isinstance(risk.estimate, Gap) or 0 <= risk.estimate <= 1, question


def test_words_agree_with_figures() -> None:
    """The headline and the patient's summary name the side on which the difference lies, of the outcome they name."""
    for question in questions(2, 400, 10_000):
        findings = findings_of(question)
        difference = _difference(findings)
        said = re.search(r"That is [\d,]+ (fewer|more)", headline(question.outcome, findings, question.choices))
        if isinstance(difference, Figure) and not isinstance(difference.estimate, Gap) and difference.estimate and said:
            assert (said[1] == "fewer") == (difference.estimate < 0), question
        if isinstance(findings.patient, PatientFindings):
            change = findings.patient.difference.estimate
            text = " ".join(listing(question.outcome, findings, question.choices).split())
            summary = re.search(r"(fewer|more) in [\d,]+ (had|did not have) the event", text)
            if summary and not isinstance(change, Gap):
                named = change if summary[2] == "had" else -change
                assert (summary[1] == "fewer") == (named < 0), (question, summary[0])


def test_no_raw_value_reaches_a_reader() -> None:
    """Text and sheet hold words and written numbers only, and JSON is strict."""
    for question in questions(3, 120, 10_000):
        findings = findings_of(question)
        arguments = (question.outcome, findings, question.choices)
        assert not RAW.search(listing(*arguments)), question
        record = Record(outcomes=(question.outcome,), choices=question.choices)
        sheet = tsv(record, question.outcome, findings, version="0", today=date(2026, 1, 1))
        assert all(row.count("\t") == 5 for row in sheet.splitlines()), question
        with np.errstate(all="raise", under="ignore"):
            given = contract(question.outcome, question.choices, findings)
        assert json.loads(json.dumps(given, allow_nan=False)) == given, question


def _in_order(figure: Figure) -> bool:
    interval, estimate = figure.interval, figure.estimate
    if not isinstance(interval, Interval):
        return True
    if not -inf < interval.low <= interval.high:
        return False
    if isinstance(estimate, Gap) or interval.adjusted:
        return True
    room = ROUNDING * abs(estimate) if isfinite(estimate) else 0.0
    return interval.low - room <= estimate <= interval.high + room


def _difference(findings: OutcomeFindings) -> object:
    """The difference of the two risks, of groups or of pairs."""
    measures = findings.measures
    return measures["risk_difference"] if "risk_difference" in measures else measures["pair_difference"]


def _kind(question: Question, findings: OutcomeFindings) -> str:
    difference = _difference(findings)
    assert isinstance(difference, Figure)
    assert not isinstance(difference.estimate, Gap)
    if difference.estimate == 0:
        return "neither"
    return "NNTB" if (difference.estimate < 0) != question.outcome.welcome else "NNTH"
