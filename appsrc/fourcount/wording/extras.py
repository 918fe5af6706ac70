"""The lines under the fold: what stands beside a table's measures, each with what it is not."""

from __future__ import annotations

from dataclasses import dataclass, replace

from msgspec import structs

from fourcount.appraisal.findings import (
    Clusters,
    EValues,
    Extras,
    Figure,
    Fragility,
    Gap,
    Interval,
    Losses,
    LossScenario,
    OutcomeFindings,
    PrintedFigure,
    Recovered,
)
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, lines, names, numbers
from fourcount.wording.form import lacking
from fourcount.wording.lines.line import MeasureLine, figure_line, withheld_line
from fourcount.wording.lines.words import method_word
from fourcount.wording.printed import paper_measure_name

SCENARIOS = ("none", "all", "worst", "best", "ratio")
EXTRA_KEYS = (
    "adjusted",
    "recovered",
    "clusters",
    "attributable_exposed",
    "prevented_exposed",
    "attributable_population",
    "e_value",
    "fragility",
    *(f"losses.{key}" for key in SCENARIOS),
    "losses",
)
"""The keys of all lines here, in their order; one scenario of losses a line, or one line where there are none."""

NAMES = {
    "adjusted": "Printed, adjusted {measure}",
    "recovered": "From the printed interval",
    "recovered-p": "From the printed p",
    "clusters": "Design effect of the clusters",
    "attributable_exposed": "Attributable fraction, exposed",
    "prevented_exposed": "Prevented fraction, exposed",
    "attributable_population": "Attributable fraction, population",
    "e_value": "E-value",
    "fragility": "Fragility index",
    "losses": "People lost to follow-up",
}
SCENARIO_NAMES = {
    "none": "Lost: nobody had the event",
    "all": "Lost: everybody had the event",
    "worst": "Lost: the extreme against the result",
    "best": "Lost: the extreme for the result",
    "ratio": "Lost: {index} and {reference} times the risk of those followed",
}
E_VALUE_NOTE = (
    "An unmeasured confounder would need a risk ratio of this size with both exposure and event, beyond what was "
    "measured, to explain the ratio away. It does not say that there is one, nor how well the study was made."
)
E_VALUE_LIMIT = "{value} for the limit nearest no effect"
CONVERTED = {
    "odds_ratio": "the odds ratio of a common event was turned into a risk ratio first, by its square root",
    "hazard_ratio": "the hazard ratio was turned into a risk ratio of a common event first",
}
FRAGILITY_NOTE = (
    "So many more events in the group with the lower risk would bring Fisher’s p from {before} to {after}. It depends "
    "on the threshold of 0.05, and does not say how large or how sure the effect is."
)
LOST = "{lost} were lost"
NOT_SAID = "number lost not typed"
OVERTURNED = "here the interval tells something else about no effect"
TOO_NARROW = "this interval treats guessed outcomes as if seen, so it is too narrow"
NOT_ONE = "It does not tell whose events those were."
FRACTION_NOTES = {
    "attributable_exposed": (
        "The share of the events of the exposed that would not have been, if the ratio is all cause."
    ),
    "prevented_exposed": (
        "The share of the events expected of the exposed that the exposure prevented, if the ratio is all cause."
    ),
    "attributable_population": (
        "The share of all events here that would not have been, if the ratio is all cause and people elsewhere are "
        "exposed as these were."
    ),
}
CLUSTERS_NOTE = "intervals and p rest on the counts divided by it; the risks stay. It depends on the correlation typed"
RECOVERED_NOTE = "standard error {error}{scale}, as if the interval reached equally far to both sides; not from counts"
FROM_P_NOTE = "standard error {error}{scale}, rebuilt from the printed p, approximate; not from counts"
LOG_SCALE = " on the log scale"
ADJUSTED_NOTE = "from the paper’s own model{what}; it cannot be checked from the counts"


@dataclass(frozen=True, kw_only=True, slots=True)
class _Case:
    """What every line here may need."""

    outcome: Outcome
    findings: OutcomeFindings
    choices: Choices

    @property
    def extras(self) -> Extras:
        return self.findings.extras


def extra_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """A line for every extra that this table has, or the reason for which it has none; none while it is not whole."""
    case = _Case(outcome=outcome, findings=findings, choices=choices)
    if lacking(findings):
        return ()
    return (
        *_one("adjusted", case.extras.adjusted, case),
        *_one("recovered", case.extras.recovered, case),
        *_one("clusters", case.extras.clusters, case),
        *_of_exposed(case),
        *_one("attributable_population", case.extras.attributable_population, case),
        *_one("e_value", case.extras.e_value, case),
        *_one("fragility", case.extras.fragility, case),
        *_losses(case),
    )


def _of_exposed(case: _Case) -> tuple[MeasureLine, ...]:
    """The share that the exposure explains, or prevents where the exposed fare better: never a reason beside it."""
    if case.extras.prevented_exposed is not None:
        return _one("prevented_exposed", case.extras.prevented_exposed, case)
    return _one("attributable_exposed", case.extras.attributable_exposed, case)


def _one(key: str, extra: object, case: _Case) -> tuple[MeasureLine, ...]:
    if extra is None:
        return ()
    if isinstance(extra, Gap):
        return (withheld_line(key, NAMES[key], extra, "more"),)
    if isinstance(extra, PrintedFigure):
        return (_adjusted(extra, case),)
    if isinstance(extra, Recovered):
        return (_recovered(extra),)
    if isinstance(extra, Clusters):
        return (_clusters(extra),)
    if isinstance(extra, EValues):
        return (_e_value(extra, case),)
    if isinstance(extra, Fragility):
        return (_fragility(extra, case),)
    return (_attributable(key, extra, case),) if isinstance(extra, Figure) else ()


def _line(key: str, name: str, estimate: str, *, detail: str = "", interval: str = "", note: str = "") -> MeasureLine:
    return MeasureLine(key=key, name=name, detail=detail, estimate=estimate, interval=interval, note=note, group="more")


def _adjusted(printed: PrintedFigure, case: _Case) -> MeasureLine:
    """The paper's own adjusted effect in the digits of its print."""
    what = names.bare(case.outcome.adjusted_for_text)
    ends = [end.text for end in (printed.low, printed.high) if end is not None]
    level = f"{numbers.level(printed.level)}, " if printed.level else ""
    return _line(
        "adjusted",
        NAMES["adjusted"].format(measure=paper_measure_name(printed.measure, case.outcome)),
        printed.estimate.text if printed.estimate else printed.text,
        detail=f"{level}as printed",
        interval=numbers.TO.join(ends),
        note=ADJUSTED_NOTE.format(what=f", for {what}" if what else ""),
    )


def _recovered(found: Recovered) -> MeasureLine:
    note = FROM_P_NOTE if found.from_p else RECOVERED_NOTE
    return _line(
        "recovered",
        NAMES["recovered-p" if found.from_p else "recovered"],
        numbers.p_phrase(found.p),
        detail=f"z = {numbers.plain(found.z, 2)}",
        note=note.format(error=numbers.plain(found.standard_error), scale=LOG_SCALE if found.log_scale else ""),
    )


def _clusters(found: Clusters) -> MeasureLine:
    detail = f"ICC {numbers.quantity(found.icc)}, mean size {numbers.quantity(found.mean_size)}"
    return _line("clusters", NAMES["clusters"], numbers.ratio(found.design_effect), detail=detail, note=CLUSTERS_NOTE)


def _e_value(found: EValues, case: _Case) -> MeasureLine:
    limit = "" if isinstance(found.limit, Gap) else E_VALUE_LIMIT.format(value=numbers.ratio(found.limit))
    converted = CONVERTED.get(found.converted, "")
    note = f"{E_VALUE_NOTE} {converted[:1].upper()}{converted[1:]}." if converted else E_VALUE_NOTE
    which = "printed, adjusted " if found.adjusted else "pooled " if case.findings.form == "strata" else ""
    measure = f"{which}{paper_measure_name(found.measure, case.outcome)}"
    return _line(
        "e_value",
        NAMES["e_value"],
        numbers.ratio(found.estimate),
        detail=f"of the {measure}",
        interval=limit,
        note=note,
    )


def _fragility(found: Fragility, case: _Case) -> MeasureLine:
    group = names.label_within(case.outcome, found.group)
    lost = NOT_SAID if found.lost is None else LOST.format(lost=numbers.whole(found.lost))
    note = FRAGILITY_NOTE.format(before=numbers.p_value(found.p_before), after=numbers.p_value(found.p_after))
    return _line("fragility", NAMES["fragility"], numbers.whole(found.changes), detail=group, interval=lost, note=note)


def _attributable(key: str, figure: Figure, case: _Case) -> MeasureLine:
    note = f"{FRACTION_NOTES[key]} {NOT_ONE}"
    below = fraction_below_none(figure.interval)
    shown = structs.replace(figure, interval=Interval(low=0.0, high=1.0)) if below else figure
    detail = method_word(figure.method, case.choices)
    line = figure_line(key, NAMES[key], shown, detail=detail, notes=(note,), group="more", kind="")
    return replace(line, interval=below or line.interval, low=None, estimate_value=None, high=None)


def fraction_below_none(interval: limits.AnyInterval) -> str:
    """Limits of a fraction of which the lower lies below none, since the exposure may prevent as well; else ""."""
    if not isinstance(interval, Interval) or interval.low >= 0:
        return ""
    low, high = interval.low, interval.high
    below = "below 0%" if low == -float("inf") else f"{numbers.MINUS}{numbers.percent_whole(-low).rstrip('%')}"
    above = f"{numbers.MINUS}{numbers.percent_whole(-high)}" if high < 0 else numbers.percent_whole(high)
    return f"{below}{numbers.TO}{above}"


def _losses(case: _Case) -> tuple[MeasureLine, ...]:
    found = case.extras.losses
    if found is None:
        return ()
    if isinstance(found, Gap):
        return (withheld_line("losses", NAMES["losses"], found, "more"),)
    return tuple(_scenario(scenario, found) for scenario in found.scenarios)


def _scenario(scenario: LossScenario, losses: Losses) -> MeasureLine:
    """The difference if the lost had fared so, with the two risks and the ratio."""
    ratio = scenario.risk_ratio
    written = lines.estimate_text("risk_ratio", ratio)
    interval = "" if isinstance(ratio.interval, Gap) else limits.bracketed(lines.interval_text("risk_ratio", ratio))
    risks = f"{numbers.percent(scenario.risk_reference)} and {numbers.percent(scenario.risk_index)}"
    notes = (
        f"risk ratio {written}{interval}",
        OVERTURNED if scenario.key in losses.overturned else "",
        TOO_NARROW,
    )
    name = SCENARIO_NAMES[scenario.key].format(
        index=numbers.quantity(losses.index_ratio), reference=numbers.quantity(losses.reference_ratio)
    )
    line = figure_line(
        "risk_difference",
        name,
        scenario.difference,
        detail=f"{risks}; per 100",
        notes=notes,
        group="more",
    )
    return replace(line, key=f"losses.{scenario.key}", name=name)
