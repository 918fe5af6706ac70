"""The lines of "What it says": one for every measure, in screen order, each with all its text."""

from __future__ import annotations

from dataclasses import dataclass, replace
from typing import Literal

from fourcount.appraisal.findings import AnyNumberNeeded, Conversion, Counts, Figure, Gap, Interval, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.number_needed import whole_number_needed
from fourcount.wording import limits, names, numbers
from fourcount.wording.gaps import gap_text
from fourcount.wording.half_added import half_added

Kind = Literal["difference", "risk", "ratio", ""]
LineGroup = Literal["main", "more"]

SCREEN_ORDER = (
    "risk_difference",
    "number_needed",
    "risk_reference",
    "risk_index",
    "risk_ratio",
    "odds_ratio",
    "odds_reference",
    "odds_index",
)
CASE_CONTROL_ORDER = ("odds_ratio", *(key for key in SCREEN_ORDER if key != "odds_ratio"))
KINDS: dict[str, Kind] = {
    "risk_difference": "difference",
    "risk_reference": "risk",
    "risk_index": "risk",
    "risk_ratio": "ratio",
    "odds_ratio": "ratio",
}
UNDER_THE_FOLD = ("odds_reference", "odds_index")

NO_SPAN = "time span not given"
PAST_EVERYBODY = "the bare formula reaches past 100 in 100"
PAST_A_RISK = {
    "low": "the bare formula reaches below 0%",
    "high": "the bare formula reaches beyond 100%",
    "both": "the bare formula reaches below 0% and beyond 100%",
}
APPROXIMATE = "score, approximate"
ALWAYS_SCORE = ("risk_difference", "risk_ratio")  # there is no exact interval of these in the exact family
NOT_DETERMINED = "not determined"
WITHHELD = "withheld"
FOLLOWS = "follows"


@dataclass(frozen=True, kw_only=True, slots=True)
class MeasureLine:
    """One measure's text, and the numbers of its drawn strip (None where there is nothing to draw).

    ``withheld`` is the reason for which the whole measure is not given, else "". While the table is
    not whole, every text of a figure is empty.
    """

    key: str
    name: str
    detail: str = ""
    estimate: str = ""
    interval: str = ""
    note: str = ""
    kind: Kind = ""
    group: LineGroup = "main"
    withheld: str = ""
    low: float | None = None
    estimate_value: float | None = None
    high: float | None = None


def measure_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """All lines in screen order: difference first, ratios after it, the odds ratio last unless it is alone."""
    order = CASE_CONTROL_ORDER if outcome.design == "case-control" else SCREEN_ORDER
    return tuple(_line(key, outcome, findings, choices) for key in order)


def told_once(lines: tuple[MeasureLine, ...]) -> tuple[MeasureLine, ...]:
    """Neighbours that are withheld for one and the same reason become one line with all their names."""
    result: list[MeasureLine] = []
    for line in lines:
        before = result[-1] if result else None
        if before and line.withheld and line.withheld == before.withheld:
            result[-1] = replace(before, name=f"{before.name}\n{line.name}")
        else:
            result.append(line)
    return tuple(result)


def family_name(key: str, choices: Choices) -> str:
    """The method behind a figure, as its line names it."""
    return APPROXIMATE if choices.family == "exact" and key in ALWAYS_SCORE else choices.family


def measure_name(key: str, outcome: Outcome, needed: AnyNumberNeeded | None = None) -> str:
    """What a line calls its measure."""
    risk = names.sentence_case(names.risk_name(outcome))
    if key == "number_needed":
        return f"{limits.needed_kind(needed)} in the study"
    return {
        "risk_difference": "Difference",
        "risk_reference": f"{risk}, {names.label_within(outcome, 'reference')}",
        "risk_index": f"{risk}, {names.label_within(outcome, 'index')}",
        "risk_ratio": f"{risk} ratio",
        "odds_ratio": "Odds ratio",
        "odds_reference": f"Odds, {names.label_within(outcome, 'reference')}",
        "odds_index": f"Odds, {names.label_within(outcome, 'index')}",
    }[key]


def _line(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> MeasureLine:
    measure = findings.measures[key]
    group: LineGroup = "more" if key in UNDER_THE_FOLD else "main"
    if isinstance(findings.counts, Gap):
        return MeasureLine(key=key, name=measure_name(key, outcome), kind=KINDS.get(key, ""), group=group)
    if isinstance(measure, Gap):
        return MeasureLine(
            key=key, name=measure_name(key, outcome), kind=KINDS.get(key, ""), group=group, withheld=gap_text(measure)
        )
    if isinstance(measure, AnyNumberNeeded):
        return _number_needed_line(measure, outcome, findings.counts)
    low, high = _ends(measure)
    return MeasureLine(
        key=key,
        name=measure_name(key, outcome),
        detail=_detail(key, findings.counts, choices),
        estimate=estimate_text(key, measure),
        interval=interval_text(key, measure),
        note=_note(key, measure, outcome, findings),
        kind=KINDS.get(key, ""),
        group=group,
        low=low,
        estimate_value=None if isinstance(measure.estimate, Gap) else measure.estimate,
        high=high,
    )


def _number_needed_line(needed: AnyNumberNeeded, outcome: Outcome, counts: Counts) -> MeasureLine:
    return MeasureLine(
        key="number_needed",
        name=measure_name("number_needed", outcome, needed),
        detail=names.over_span(outcome) or NO_SPAN,
        estimate=whole_needed(counts),
        interval=limits.number_needed_interval(needed),
        note=limits.withheld_needed(needed),
    )


def whole_needed(counts: Counts) -> str:
    """The study's number needed, rounded up from the whole counts themselves."""
    needed = whole_number_needed(counts)
    return numbers.INFINITY if needed is None else numbers.whole(needed)


def estimate_text(key: str, figure: Figure) -> str:
    """A figure's estimate, with "fewer" or "more" behind a difference."""
    estimate = figure.estimate
    if isinstance(estimate, Gap):
        return FOLLOWS if estimate.key == "follows" else NOT_DETERMINED
    if key == "risk_difference":
        return f"{numbers.hundred(estimate)} {limits.side(estimate)}" if estimate else numbers.hundred(0.0)
    return numbers.percent(estimate) if KINDS.get(key) == "risk" else numbers.ratio(estimate)


def interval_text(key: str, figure: Figure) -> str:
    """A figure's interval without its estimate."""
    interval = figure.interval
    if isinstance(interval, Gap):
        return FOLLOWS if interval.key == "follows" else WITHHELD
    if key == "risk_difference":
        return limits.difference_interval(interval, figure.estimate)
    if KINDS.get(key) == "risk":
        return limits.percent_interval(interval, figure.estimate)
    return limits.ratio_interval(interval, figure.estimate)


def _detail(key: str, counts: Counts, choices: Choices) -> str:
    family = family_name(key, choices)
    events, others = (
        (counts.index_events, counts.index_non_events)
        if key.endswith("index")
        else (counts.reference_events, counts.reference_non_events)
    )
    if KINDS.get(key) == "risk":
        return f"{numbers.whole(events)} of {numbers.whole(events + others)}, {family}"
    if key in UNDER_THE_FOLD:
        return f"{numbers.whole(events)} to {numbers.whole(others)}, {family}"
    return f"per 100, {family}" if key == "risk_difference" else family


def _note(key: str, figure: Figure, outcome: Outcome, findings: OutcomeFindings) -> str:
    fragments = [half_added(figure), _beyond(key, figure)]
    if key == "risk_ratio":
        fragments += [_relative_note(figure), _other_outcome_note(findings.measures["other_risk_ratio"])]
    if key == "odds_ratio":
        fragments.append(conversion_text(findings.conversion, names.risk_name(outcome)))
    sentences = [gap_text(part) for part in (figure.estimate, figure.interval) if isinstance(part, Gap)]
    fragment = "; ".join(part for part in fragments if part)
    if fragment and sentences:
        fragment += "."
    return " ".join(part for part in (fragment, *dict.fromkeys(sentences)) if part)


def _beyond(key: str, figure: Figure) -> str:
    """What has to be said beside a limit that no risk, and no difference of risks, can have."""
    if key == "risk_difference":
        return PAST_EVERYBODY if limits.beyond(figure.interval, -1.0, 1.0) else ""
    ends = limits.beyond(figure.interval, 0.0, 1.0) if KINDS.get(key) == "risk" else ""
    return PAST_A_RISK[ends] if ends else ""


def _relative_note(figure: Figure) -> str:
    """The relative words; an interval that need not hold the estimate is not turned into words around it."""
    if isinstance(figure.estimate, Gap) or not limits.relative(figure.estimate):
        return ""
    interval = "" if half_added(figure) else limits.relative_interval(figure.interval, figure.estimate)
    return f"{limits.relative(figure.estimate)}{f': {interval}' if interval else ''}"


def _other_outcome_note(figure: Figure | AnyNumberNeeded | Gap) -> str:
    if not isinstance(figure, Figure) or isinstance(figure.estimate, Gap):
        return ""
    parts = (limits.ratio_interval(figure.interval, figure.estimate), half_added(figure))
    interval = limits.bracketed("; ".join(part for part in parts if part))
    return f"ratio of the other outcome {numbers.ratio(figure.estimate)}{interval}"


def conversion_text(conversion: Conversion | Gap, risk: str) -> str:
    """The odds ratio as a risk ratio at a typed starting risk: "as a risk ratio at 12%: 0.52 (0.35 to 0.77)".

    Nothing at the study's own: there it is the risk ratio, which has a line of its own.
    """
    if isinstance(conversion, Gap) or conversion.baseline_from == "reference":
        return ""
    if isinstance(conversion.risk_ratio.estimate, Gap):
        return ""
    figure = conversion.risk_ratio
    interval = limits.ratio_interval(figure.interval, figure.estimate)
    return (
        f"as a {risk} ratio at {baseline_text(conversion.baseline, conversion.baseline_from)}: "
        f"{numbers.ratio(conversion.risk_ratio.estimate)}{limits.bracketed(interval)}"
    )


def baseline_text(baseline: float, origin: Literal["reference", "given"]) -> str:
    """A starting risk: as typed, or the study's own with its one decimal."""
    return numbers.percent_given(baseline) if origin == "given" else numbers.percent(baseline)


def _ends(figure: Figure) -> tuple[float | None, float | None]:
    interval = figure.interval
    if not isinstance(interval, Interval):
        return None, None
    return interval.low, interval.high
