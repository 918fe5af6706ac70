"""Which lines stand in the second column, and on which scales their strips are drawn."""

from __future__ import annotations

from dataclasses import replace

from fourcount.appraisal.findings import Gap, OutcomeFindings, OwnLine
from fourcount.picture.scales import (
    Scale,
    difference_scale,
    rate_difference_scale,
    rate_scale,
    ratio_scale,
    risk_scale,
)
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording.extras import extra_lines
from fourcount.wording.lines import MeasureLine, measure_lines, told_once
from fourcount.wording.own_line import mark_words
from fourcount.wording.sentence import p_line

Lines = tuple[MeasureLine, ...]

ADJUSTED = "adjusted"

SCALES = {
    "risk": risk_scale,
    "difference": difference_scale,
    "ratio": ratio_scale,
    "rate": rate_scale,
    "rate_difference": rate_difference_scale,
}


def shown_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices, *, more: bool) -> tuple[Lines, Lines]:
    """The measures with the p, and those under the fold where they are asked for.

    An adjusted effect was typed, so it stands among the measures whether or not the fold is open.
    """
    every = marked(measure_lines(outcome, findings, choices), findings)
    main = told_once(tuple(line for line in every if line.group == "main"))
    tested = not (isinstance(findings.test, Gap) and findings.test.key == "not-counts")
    typed = findings.extras.adjusted is not None
    extras = extra_lines(outcome, findings, choices) if more or typed else ()
    adjusted = tuple(line for line in extras if line.key == ADJUSTED)
    shown = (*main, *adjusted, *((p_line(findings),) if tested else ()))
    if not more:
        return shown, ()
    under = told_once(tuple(line for line in every if line.group != "main"))
    return shown, (*under, *(line for line in extras if line.key != ADJUSTED))


def marked(lines: Lines, findings: OutcomeFindings) -> Lines:
    """The lines with the reader's own line on the strip of the measure that it is drawn for."""
    own = findings.line
    if not isinstance(own, OwnLine):
        return lines
    return tuple(_with_flag(line, own) if line.key == own.measure else line for line in lines)


def _with_flag(line: MeasureLine, own: OwnLine) -> MeasureLine:
    note = f"{line.note}." if line.note and not line.note.endswith(".") else line.note
    return replace(line, mark=own.value, note=" ".join(part for part in (note, mark_words(own)) if part))


def scales_of(*parts: Lines) -> tuple[dict[str, Scale], set[str]]:
    """One scale for each kind of measure, and the keys of the rows that name its ends: its last in each part."""
    scales: dict[str, Scale] = {}
    last: set[str] = set()
    for kind, maker in SCALES.items():
        mine = [[line for line in part if line.kind == kind and not line.withheld] for part in parts]
        values = [v for part in mine for line in part for v in (line.estimate_value, line.low, line.high, line.mark)]
        known = [v for v in values if v is not None]
        if known:
            scales[kind] = maker(known)
            last |= {part[-1].key for part in mine if part}
    return scales, last
