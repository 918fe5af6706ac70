"""The rows of the reader's own line in the working of its measure: the line, and the test behind a margin's p."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings, OwnLine
from fourcount.stats.entries.margins import MARGINS
from fourcount.wording import numbers
from fourcount.wording.gaps import gap_text
from fourcount.wording.own_line import KINDS, value_text
from fourcount.wording.working.parts import SPACE, Row, about

LINE = "Your {kind}"
P = "p of the margin, one-sided"
TESTS = {entry.key: entry for entry in MARGINS}


def own_line_rows(measure: str, findings: OutcomeFindings) -> tuple[Row, ...]:
    """Nothing where no line is drawn on this measure; for a margin its p and the test that gives it."""
    line = findings.line
    if not isinstance(line, OwnLine) or line.measure != measure:
        return ()
    rows: list[Row] = [SPACE, (LINE.format(kind=KINDS[line.kind]), value_text(line))]
    if line.p is not None:
        rows.append((P, gap_text(line.p) if isinstance(line.p, Gap) else numbers.p_value(line.p)))
    entry = TESTS.get(line.method)
    return (*rows, *([] if entry is None else about(entry)))
