"""The lines of one unpaired table: difference, number needed, risks, ratios, and the odds under the fold."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Conversion, Counts, Figure, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.number_needed import whole_number_needed
from fourcount.wording import limits, names, numbers
from fourcount.wording.half_added import half_added
from fourcount.wording.lines.line import LineGroup, MeasureLine, blank_line, figure_line, withheld_line
from fourcount.wording.lines.words import IN_THE_STUDY, KINDS, NO_SPAN

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
UNDER_THE_FOLD = ("odds_reference", "odds_index")

PAST_EVERYBODY = "the bare formula reaches past 100 in 100"
PAST_A_RISK = {
    "low": "the bare formula reaches below 0%",
    "high": "the bare formula reaches beyond 100%",
    "both": "the bare formula reaches below 0% and beyond 100%",
}
APPROXIMATE = "score, approximate"
ALWAYS_SCORE = ("risk_difference", "risk_ratio")  # there is no exact interval of these in the exact family


def unpaired_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """Difference first, ratios after it, the odds ratio last unless it is alone."""
    order = CASE_CONTROL_ORDER if outcome.design == "case-control" else SCREEN_ORDER
    return tuple(unpaired_line(key, outcome, findings, choices) for key in order)


def family_name(key: str, choices: Choices) -> str:
    """The method behind a figure, as its line names it."""
    return APPROXIMATE if choices.family == "exact" and key in ALWAYS_SCORE else choices.family


def measure_name(key: str, outcome: Outcome, needed: AnyNumberNeeded | None = None) -> str:
    """What a line calls its measure."""
    risk = names.sentence_case(names.risk_name(outcome))
    if key == "number_needed":
        return f"{limits.needed_kind(needed)}{IN_THE_STUDY}"
    return {
        "risk_difference": "Difference",
        "risk_reference": f"{risk}, {names.label_within(outcome, 'reference')}",
        "risk_index": f"{risk}, {names.label_within(outcome, 'index')}",
        "risk_ratio": f"{risk} ratio",
        "odds_ratio": "Odds ratio",
        "odds_reference": f"Odds, {names.label_within(outcome, 'reference')}",
        "odds_index": f"Odds, {names.label_within(outcome, 'index')}",
    }[key]


def unpaired_line(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> MeasureLine:
    """One measure's line, blank while the table is not whole."""
    measure = findings.measures[key]
    group: LineGroup = "more" if key in UNDER_THE_FOLD else "main"
    if isinstance(findings.counts, Gap):
        return blank_line(key, measure_name(key, outcome), group)
    if isinstance(measure, Gap):
        return withheld_line(key, measure_name(key, outcome), measure, group)
    if isinstance(measure, AnyNumberNeeded):
        return needed_line(measure_name(key, outcome, measure), measure, outcome, whole_needed(findings.counts))
    notes = _notes(key, measure, outcome, findings)
    detail = _detail(key, findings.counts, choices)
    return figure_line(key, measure_name(key, outcome), measure, detail=detail, notes=notes, group=group)


def needed_line(name: str, needed: AnyNumberNeeded, outcome: Outcome, people: str) -> MeasureLine:
    """A number needed: in whole people, rounded up, with its time span."""
    return MeasureLine(
        key="number_needed",
        name=name,
        detail=names.over_span(outcome) or NO_SPAN,
        estimate=people,
        interval=limits.number_needed_interval(needed),
        note=limits.withheld_needed(needed),
    )


def whole_needed(counts: Counts) -> str:
    """The study's number needed, rounded up from the whole counts themselves."""
    needed = whole_number_needed(counts)
    return numbers.INFINITY if needed is None else numbers.whole(needed)


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


def _notes(key: str, figure: Figure, outcome: Outcome, findings: OutcomeFindings) -> tuple[str, ...]:
    fragments = [half_added(figure), beyond(key, figure)]
    if key == "risk_ratio":
        fragments += [relative_note(figure), _other_outcome_note(outcome, findings.measures["other_risk_ratio"])]
    if key == "odds_ratio":
        fragments.append(conversion_text(findings.conversion, outcome))
    return tuple(fragments)


def beyond(key: str, figure: Figure) -> str:
    """What has to be said beside a limit that no risk, and no difference of risks, can have."""
    if KINDS.get(key) == "difference":
        return PAST_EVERYBODY if limits.beyond(figure.interval, -1.0, 1.0) else ""
    ends = limits.beyond(figure.interval, 0.0, 1.0) if KINDS.get(key) == "risk" else ""
    return PAST_A_RISK[ends] if ends else ""


def relative_note(figure: Figure) -> str:
    """The relative words; an interval that need not hold the estimate is not turned into words around it."""
    if isinstance(figure.estimate, Gap) or not limits.relative(figure.estimate):
        return ""
    interval = "" if half_added(figure) else limits.relative_interval(figure.interval, figure.estimate)
    return f"{limits.relative(figure.estimate)}{f': {interval}' if interval else ''}"


def _other_outcome_note(outcome: Outcome, figure: Figure | AnyNumberNeeded | Gap) -> str:
    if not isinstance(figure, Figure) or isinstance(figure.estimate, Gap):
        return ""
    parts = (limits.ratio_interval(figure.interval, figure.estimate), half_added(figure))
    interval = limits.bracketed("; ".join(part for part in parts if part))
    return f"ratio of {names.not_counted(outcome)} {numbers.ratio(figure.estimate)}{interval}"


def conversion_text(conversion: Conversion | Gap, outcome: Outcome) -> str:
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
        f"as a {names.risk_name(outcome)} ratio at {baseline_text(conversion, outcome)}: "
        f"{numbers.ratio(conversion.risk_ratio.estimate)}{limits.bracketed(interval)}"
    )


def baseline_text(conversion: Conversion, outcome: Outcome) -> str:
    """Its starting risk: as typed, or with one decimal where it is the study's own or worked out."""
    typed = conversion.baseline_from == "given" and outcome.patient.start_kind in ("one", "three")
    return numbers.percent_given(conversion.baseline) if typed else numbers.percent(conversion.baseline)
