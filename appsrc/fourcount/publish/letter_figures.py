"""One short line of a letter for every measure, with its interval; what is withheld once for each reason."""

from __future__ import annotations

from collections.abc import Callable, Iterable

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import exports, limits, lines, names, numbers
from fourcount.wording.form import measure_of
from fourcount.wording.gaps import gap_text
from fourcount.wording.half_added import half_added
from fourcount.wording.lines import MeasureLine, measure_lines

ORDER = ("risk_difference", "number_needed", "risk_reference", "risk_index", "risk_ratio", "odds_ratio")
"""The order of the screen: absolute before relative."""

RISKS: dict[str, names.Group] = {"risk_reference": "reference", "risk_index": "index"}


TextOf = Callable[[MeasureLine, Figure, tuple[str, ...]], str]
"""A figure's line in words, given the reasons for what it lacks."""


def figure_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[str, ...]:
    """The lines of a whole unpaired table: "Risk with usual care: 17.1% (95% interval 13.8 to 21.1%), 70 of 409"."""
    shown = {line.key: line for line in measure_lines(outcome, findings, choices)}
    level = limits.interval_name(choices.level)

    def text_of(line: MeasureLine, figure: Figure, _reasons: tuple[str, ...]) -> str:
        return _figure(line, figure, outcome, findings, level)

    given, withheld = said_once([shown[key] for key in ORDER], outcome, findings, level, text_of)
    return (*given, *withheld)


def said_once(
    lines: Iterable[MeasureLine], outcome: Outcome, findings: OutcomeFindings, level: str, text_of: TextOf
) -> tuple[tuple[str, ...], tuple[str, ...]]:
    """A text for every line that is given, and one for each reason that withholds others.

    Why an estimate, an interval or a limit is not there stands behind the first line in which it is missing.
    """
    given, withheld = [], []
    reasons: dict[str, None] = {}
    for line in lines:
        measure = measure_of(line.key, findings)
        if isinstance(measure, Gap):
            withheld.append(line)
            continue
        why = reasons_of(measure)
        if isinstance(measure, AnyNumberNeeded):
            text = needed_text(line, outcome, level)
        else:
            text = text_of(line, measure, why)
        given.append(". ".join((text, *(reason for reason in why if reason not in reasons))))
        reasons.update(dict.fromkeys(why))
    return tuple(given), withheld_lines(withheld)


def withheld_lines(withheld: list[MeasureLine]) -> tuple[str, ...]:
    """Each reason once, behind the measures that it withholds."""
    reasons: dict[str, list[str]] = {}
    for line in withheld:
        reasons.setdefault(line.withheld, []).append(line.name)
    return tuple(f"{'; '.join(measures)}: {reason}" for reason, measures in reasons.items())


def needed_text(line: MeasureLine, outcome: Outcome, level: str) -> str:
    """A number needed with its interval, its time and what it supposes."""
    span = names.over_span(outcome)
    over = f" {span}" if span else f", {lines.NO_SPAN}"
    name = line.name.removesuffix(lines.IN_THE_STUDY)
    kind = name.split(",")[0]
    name = name.replace(kind, exports.NEEDED.get(kind, kind), 1)
    return f"{name} {line.estimate} ({level} {line.interval}){over}{names.if_caused(outcome)}"


def _figure(line: MeasureLine, figure: Figure, outcome: Outcome, findings: OutcomeFindings, level: str) -> str:
    key = line.key
    unit = exports.PER_100 if key == "risk_difference" else ""
    said = f"{_name(key, line, outcome)}: {line.estimate}{unit} ({level} {line.interval})"
    return ", ".join(part for part in (said, *_more(key, figure, outcome, findings)) if part)


def reasons_of(measure: Figure | AnyNumberNeeded) -> tuple[str, ...]:
    """Why a part of a measure is not there, each reason once."""
    if isinstance(measure, AnyNumberNeeded):
        withheld = limits.withheld_needed(measure)
        return (withheld,) if withheld else ()
    gaps = (part for part in (measure.estimate, measure.interval) if isinstance(part, Gap))
    return tuple(dict.fromkeys(map(gap_text, gaps)))


def _name(key: str, line: MeasureLine, outcome: Outcome) -> str:
    """A risk is named with its group as the sentences name it."""
    if key not in RISKS:
        return line.name
    risk = names.sentence_case(names.risk_name(outcome))
    return exports.GROUP_RISK.format(risk=risk, group=names.in_group(outcome, RISKS[key]))


def _more(key: str, figure: Figure, outcome: Outcome, findings: OutcomeFindings) -> tuple[str, ...]:
    """What stands behind a figure: its counts, its relative words, what it is at a starting risk, a correction."""
    counts = findings.counts
    if isinstance(counts, Gap):
        return ()
    more = []
    if key in RISKS:
        events, people = counts.index_events, counts.index_total
        if RISKS[key] == "reference":
            events, people = counts.reference_events, counts.reference_total
        more.append(exports.EVENTS_OF_PEOPLE.format(events=numbers.whole(events), people=numbers.whole(people)))
    if key == "risk_ratio" and not isinstance(figure.estimate, Gap):
        more.append(limits.relative(figure.estimate))
    if key == "odds_ratio":
        more.append(lines.conversion_text(findings.conversion, outcome))
    return (*more, half_added(figure))
