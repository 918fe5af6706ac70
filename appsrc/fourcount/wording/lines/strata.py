"""The lines of several strata: each pooled measure beside the crude one, and under the fold the strata one by one."""

from __future__ import annotations

from dataclasses import replace

from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Counts,
    Figure,
    Gap,
    OutcomeFindings,
    StrataFindings,
    StratumFindings,
)
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers
from fourcount.wording.form import crude, lacking, measure_of
from fourcount.wording.gaps import gap_text
from fourcount.wording.lines.line import MeasureLine, blank_line, figure_line, withheld_line
from fourcount.wording.lines.text import estimate_text, interval_text
from fourcount.wording.lines.unpaired import (
    conversion_text,
    measure_name,
    needed_line,
    relative_note,
    unpaired_line,
)
from fourcount.wording.lines.words import IN_THE_STUDY, method_word

ORDER = (
    "pooled_risk_difference",
    "number_needed",
    "risk_difference",
    "risk_reference",
    "risk_index",
    "pooled_risk_ratio",
    "risk_ratio",
    "pooled_odds_ratio",
    "odds_ratio",
)
CASE_CONTROL_ORDER = ("pooled_odds_ratio", "odds_ratio", *(key for key in ORDER if not key.endswith("odds_ratio")))
CRUDE = "{name}, crude"
POOLED = "{name}, pooled"
PARTS = "parts from the crude one"
ODDS_PART = "as an odds ratio can without any confounding"
STRATUM_KEY = "stratum."


def strata_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """Pooled before crude, measure by measure; then one line for every stratum, under the fold."""
    order = CASE_CONTROL_ORDER if outcome.design == "case-control" else ORDER
    lines = tuple(_line(key, outcome, findings, choices) for key in order)
    strata = findings.strata
    if lacking(findings) or not isinstance(strata, StrataFindings):
        return lines
    return (*lines, *(_stratum_line(place, stratum, outcome) for place, stratum in enumerate(strata.strata)))


def strata_name(key: str, outcome: Outcome, needed: AnyNumberNeeded | None = None) -> str:
    """What a line of strata calls its measure: pooled or crude."""
    if key == "number_needed":
        return POOLED.format(name=measure_name(key, outcome, needed).removesuffix(IN_THE_STUDY))
    if key.startswith("pooled_"):
        return POOLED.format(name=measure_name(key.removeprefix("pooled_"), outcome))
    return CRUDE.format(name=measure_name(key, outcome))


def _line(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> MeasureLine:
    measure = measure_of(key, findings)
    name = strata_name(key, outcome, measure if isinstance(measure, AnyNumberNeeded) else None)
    if lacking(findings):
        return blank_line(key, name)
    if isinstance(measure, Gap):
        return withheld_line(key, name, measure)
    if isinstance(measure, AnyNumberNeeded):
        return needed_line(name, measure, outcome, numbers.number_needed(measure.estimate))
    if not key.startswith("pooled_"):
        return replace(unpaired_line(key, outcome, crude(findings), choices), name=name)
    unit = "per 100, " if key == "pooled_risk_difference" else ""
    relative = relative_note(measure) if key == "pooled_risk_ratio" else ""
    if key == "pooled_odds_ratio":
        relative = conversion_text(findings.conversion, outcome)
    detail = f"{unit}{method_word(measure.method, choices)}"
    return figure_line(key, name, measure, detail=detail, notes=(relative, parting_note(key, findings)))


def parting_note(key: str, findings: OutcomeFindings) -> str:
    """What is said where crude and pooled part; of odds, that this need not be confounding."""
    strata = findings.strata
    if not isinstance(strata, StrataFindings):
        return ""
    if not {key, key.removeprefix("pooled_")} & set(strata.parting):
        return ""
    return f"{PARTS}, {ODDS_PART}" if key == "pooled_odds_ratio" else PARTS


def _stratum_line(place: int, stratum: StratumFindings, outcome: Outcome) -> MeasureLine:
    """A stratum's ratio with its counts, and its difference beside it: neither stands alone."""
    key = f"{STRATUM_KEY}{place}"
    first, second = ("odds_ratio", "") if outcome.design == "case-control" else ("risk_ratio", "risk_difference")
    figure, detail = stratum.measures.get(first), _counts_of(stratum.counts)
    if not isinstance(figure, Figure):
        gap = figure if isinstance(figure, Gap) else Gap("empty-table")
        return MeasureLine(key=key, name=stratum.label, detail=detail, kind="ratio", group="more", note=gap_text(gap))
    name = measure_name(first, outcome)
    beside = _beside(second, stratum, outcome)
    line = figure_line(first, stratum.label, figure, detail=detail, notes=(beside,), group="more", kind="ratio")
    return replace(line, key=key, name=f"{stratum.label}, {names.mid_sentence(name)}")


def _beside(key: str, stratum: StratumFindings, outcome: Outcome) -> str:
    """``difference 7.9 fewer per 100 (3.3 to 12.6)``."""
    figure = stratum.measures.get(key)
    if not isinstance(figure, Figure) or isinstance(figure.estimate, Gap):
        return ""
    interval = "" if isinstance(figure.interval, Gap) else interval_text(key, figure)
    name = names.mid_sentence(measure_name(key, outcome))
    return f"{name} {estimate_text(key, figure)} per 100{limits.bracketed(interval)}"


def _counts_of(counts: Counts) -> str:
    """``38 of 412 against 70 of 409``: the index group's counts first, as the ratio has them."""
    index = f"{numbers.whole(counts.index_events)} of {numbers.whole(counts.index_total)}"
    reference = f"{numbers.whole(counts.reference_events)} of {numbers.whole(counts.reference_total)}"
    return f"{index} against {reference}"
