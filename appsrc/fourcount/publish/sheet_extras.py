"""The rows of a sheet for what stands beside the measures, numbers in full."""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.appraisal.findings import (
    Clusters,
    EValues,
    Figure,
    Fragility,
    Losses,
    OutcomeFindings,
    PrintedFigure,
    Recovered,
)
from fourcount.publish.sheet_rows import Row, figure_row, number_cell, p_cell
from fourcount.record.entry.readings import PrintedNumber
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import exports
from fourcount.wording.extras import extra_lines
from fourcount.wording.lines import MeasureLine


@dataclass(frozen=True, slots=True)
class _Cells:
    """Estimate and limits of a row."""

    estimate: str = ""
    low: str = ""
    high: str = ""


def extra_rows(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """A row for every line under the fold; under the method stands what the figure is not."""
    return tuple(_row(line, findings) for line in extra_lines(outcome, findings, choices))


def _row(line: MeasureLine, findings: OutcomeFindings) -> Row:
    if line.withheld:
        return (line.name, "", "", "", "", line.withheld)
    losses, extra = findings.extras.losses, getattr(findings.extras, line.key.partition(".")[0])
    if isinstance(losses, Losses) and extra is losses:
        scenario = next(one for one in losses.scenarios if f"losses.{one.key}" == line.key)
        name = f"{line.name}: {exports.PATIENT_ROWS['difference']}"
        return figure_row(name, scenario.difference, "risk_difference", findings.form)
    if isinstance(extra, Figure):
        return figure_row(line.name, extra, line.key, findings.form)
    cells = _cells(extra)
    return (line.name, cells.estimate, cells.low, cells.high, "", "; ".join(filter(None, (line.detail, line.note))))


def _cells(extra: object) -> _Cells:
    if isinstance(extra, PrintedFigure):
        return _Cells(_printed(extra.estimate), _printed(extra.low), _printed(extra.high))
    if isinstance(extra, Recovered):
        return _Cells(p_cell(extra.p))
    if isinstance(extra, Clusters):
        return _Cells(number_cell(extra.design_effect))
    if isinstance(extra, EValues):
        return _Cells(number_cell(extra.estimate), number_cell(extra.limit))
    return _Cells(str(extra.changes)) if isinstance(extra, Fragility) else _Cells()


def _printed(number: PrintedNumber | None) -> str:
    return "" if number is None else number_cell(number.value)
