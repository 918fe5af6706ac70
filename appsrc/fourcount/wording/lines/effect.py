"""The one line of a printed effect without counts: as printed, crude or adjusted."""

from __future__ import annotations

from dataclasses import replace

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, PrintedFigure
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import names
from fourcount.wording.form import given, measure_of
from fourcount.wording.lines.as_printed import effect_texts
from fourcount.wording.lines.line import MeasureLine, blank_line, figure_line, withheld_line
from fourcount.wording.lines.unpaired import conversion_text, relative_note
from fourcount.wording.lines.words import KINDS, method_word
from fourcount.wording.printed import PER_UNIT, adjusted_words, paper_measure_name

FROM_P = "interval rebuilt from the printed p, approximate"


def effect_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """The printed measure alone."""
    printed = given(findings)
    key = printed.measure if isinstance(printed, PrintedFigure) else outcome.paper_measure
    name = names.sentence_case(paper_measure_name(key, outcome))
    if not isinstance(printed, PrintedFigure):
        return (blank_line(key, name),)
    measure = measure_of(key, findings)
    if isinstance(measure, Gap):
        return (withheld_line(key, name, measure),)
    if not isinstance(measure, Figure):
        return ()
    recovered = findings.extras.recovered
    rebuilt = recovered is not None and not isinstance(recovered, Gap) and recovered.from_p
    per = PER_UNIT[printed.unit] if key == "rate_difference" else 1
    unit = {"difference": "per 100, ", "rate_difference": f"per {per:,} of person-time, "}.get(KINDS.get(key, ""), "")
    detail = f"{unit}{method_word(measure.method, choices)}{adjusted_words(outcome, printed)}"
    notes = [FROM_P if rebuilt else "", relative_note(measure) if key in ("risk_ratio", "rate_ratio") else ""]
    if key == "odds_ratio":
        notes.append(conversion_text(findings.conversion, outcome))
    line = figure_line(key, name, measure, detail=detail, notes=tuple(notes), per=per)
    estimate, interval = effect_texts(key, outcome, measure, findings)
    return (replace(line, estimate=estimate, interval=interval),)
