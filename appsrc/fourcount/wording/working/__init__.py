"""The working of one figure: the formula with the reader's numbers in it, its method, and every other method."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from types import MappingProxyType

from fourcount.appraisal.findings import AnyNumberNeeded, OutcomeFindings
from fourcount.record.outcome import Form, Outcome
from fourcount.record.paper import Choices
from fourcount.wording import lines, names
from fourcount.wording.extras import EXTRA_KEYS, extra_lines
from fourcount.wording.form import lacking, measure_of
from fourcount.wording.lines import measure_lines
from fourcount.wording.sentence import measure_sentence, p_sentence
from fourcount.wording.working.extras import extra_rows
from fourcount.wording.working.own_line import own_line_rows
from fourcount.wording.working.pairs import pair_rows, pair_test_rows
from fourcount.wording.working.parts import METHOD_MEASURES, Row, Working
from fourcount.wording.working.patient import PATIENT, patient_working
from fourcount.wording.working.person_time import rate_rows, rate_test_rows
from fourcount.wording.working.printed import effect_rows, timed_rows
from fourcount.wording.working.strata import strata_rows, strata_test_rows
from fourcount.wording.working.unpaired import formula_with_numbers, test_rows, unpaired_rows

__all__ = ["METHOD_MEASURES", "PATIENT", "TEST", "Row", "Working", "formula_with_numbers", "working"]

TEST = "test"
TEST_TITLE = "p value"
OTHER_TITLE = "Ratio of {event}"
STRATUM = "stratum."

RowsOf = Callable[[str, Outcome, OutcomeFindings, Choices], tuple[Row, ...]]
ROWS: Mapping[Form, RowsOf] = MappingProxyType(
    {
        "pairs": pair_rows,
        "person-time": rate_rows,
        "risk-at-time": timed_rows,
        "effect-only": effect_rows,
        "strata": strata_rows,
    }
)
TEST_ROWS: Mapping[Form, Callable[[OutcomeFindings], tuple[Row, ...]]] = MappingProxyType(
    {
        "pairs": pair_test_rows,
        "person-time": rate_test_rows,
        "strata": strata_test_rows,
    }
)


def working(measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> Working:
    """The working of a line by its key, of the p values where ``measure`` is "test", of a patient where "patient"."""
    if measure == PATIENT:
        return patient_working(outcome, findings, choices)
    if measure == TEST:
        rows_of = TEST_ROWS.get(findings.form, test_rows)
        return Working(title=TEST_TITLE, sentence=p_sentence(findings), rows=rows_of(findings))
    if measure in EXTRA_KEYS:
        return _of_extra(measure, outcome, findings, choices)
    if measure.startswith(STRATUM):
        return _of_stratum(measure, outcome, findings, choices)
    title = _title(measure, outcome, findings, choices)
    sentence = measure_sentence(measure, outcome, findings, choices)
    if lacking(findings):
        return Working(title=title, sentence=sentence, rows=())
    rows = ROWS.get(findings.form, unpaired_rows)(measure, outcome, findings, choices)
    return Working(title=title, sentence=sentence, rows=(*rows, *own_line_rows(measure, findings)))


def _title(measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What the line of the measure is called."""
    if measure == "other_risk_ratio":
        return OTHER_TITLE.format(event=names.not_counted(outcome))
    for line in measure_lines(outcome, findings, choices):
        if line.key == measure:
            return line.name
    found = measure_of(measure, findings)
    return lines.measure_name(measure, outcome, found if isinstance(found, AnyNumberNeeded) else None)


def _of_extra(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> Working:
    line = next((line for line in extra_lines(outcome, findings, choices) if line.key == key), None)
    if line is None:
        return Working(title="", sentence="", rows=())
    return Working(title=line.name, sentence=line.withheld or line.note, rows=extra_rows(key, findings, choices))


def _of_stratum(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> Working:
    """A stratum's line says all that there is to it: its counts, its ratio and its difference."""
    line = next((line for line in measure_lines(outcome, findings, choices) if line.key == key), None)
    if line is None:
        return Working(title="", sentence="", rows=())
    rows = [("Counts", line.detail), ("Ratio", f"{line.estimate}, {line.interval}"), ("Beside it", line.note)]
    return Working(title=line.name, sentence="", rows=tuple((label, text) for label, text in rows if text.strip(", ")))
