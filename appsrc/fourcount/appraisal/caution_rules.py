"""When each caution holds. A rule answers with the facts for its sentence, or with None."""

from __future__ import annotations

import re
from collections.abc import Mapping
from types import MappingProxyType

from fourcount.appraisal.case import Case, Facts, excludes, no_effect_of, straddles, value
from fourcount.appraisal.findings import Gap, Interval
from fourcount.record.outcome import COUNTED_FORMS, Form

HEADLINES = (
    "pooled_risk_difference",
    "pooled_odds_ratio",
    "risk_difference",
    "pair_difference",
    "rate_difference",
    "pair_odds_ratio",
    "risk_ratio",
    "odds_ratio",
    "hazard_ratio",
    "rate_ratio",
)
"""The measures that a headline may be about; the first that a table has is the one."""

COMPARED: Mapping[Form, tuple[str, ...]] = MappingProxyType(
    {
        **dict.fromkeys(COUNTED_FORMS, ("risk_difference", "risk_ratio", "odds_ratio")),
        "pairs": ("pair_difference", "pair_ratio", "pair_odds_ratio"),
        "person-time": ("rate_difference", "rate_ratio"),
    }
)
"""The measures whose intervals are set beside the family's own p."""

COMPARISON = re.compile(r"\b(placebo|control|usual care|standard care|no treatment|sham)\b", re.IGNORECASE)
"""What papers call the group that the other one is compared with (common practice)."""

RARE = 0.01
"""A harm under this risk is called rare here: 1%, common practice."""

FEW_HARMED = 10
"""With fewer harmed people in the index group than this, a trial shows a rare harm badly: our own threshold."""


def used_though_marked(case: Case, *, key: str) -> tuple[Facts, ...]:
    """Cells are marked and their counts used all the same, which every copy has to say as the screen does."""
    return tuple(dict(mark.facts) for mark in case.marks if mark.used and mark.key == key)


def index_looks_like_control(case: Case) -> Facts | None:
    """The index group has a name that a comparison usually has, and the reference group has none such."""
    index, reference = (
        " ".join(text.split()) for text in (case.outcome.index_label_text, case.outcome.reference_label_text)
    )
    return {"label": index} if COMPARISON.search(index) and not COMPARISON.search(reference) else None


def odds_ratio_differs(case: Case) -> Facts | None:
    """Odds ratio and risk ratio part by more than 20%, the larger against the smaller.

    Their quotient is (d/n2)/(b/n1), so whole numbers decide it, and swapping the groups cannot change it.
    """
    odds_ratio, risk_ratio = (value(case.figures.get("odds_ratio")), value(case.figures.get("risk_ratio")))
    if odds_ratio is None or risk_ratio is None or odds_ratio == risk_ratio:
        return None
    counts = case.counts
    reference = counts.reference_non_events * counts.index_total
    index = counts.index_non_events * counts.reference_total
    if 5 * max(reference, index) <= 6 * min(reference, index):
        return None
    return {"odds_ratio": odds_ratio, "risk_ratio": risk_ratio, **_survey(case)}


def totals_are_sampled(case: Case) -> Facts | None:
    """The investigator of a case-control study chose how many cases and controls there are.

    Where an effect is carried, what all rests on says so.
    """
    return {} if case.outcome.design == "case-control" and case.carried is None else None


def zero_cells(case: Case) -> Facts | None:
    """One or more of the four counts is 0."""
    counts = case.counts
    cells = (counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events)
    zeros = cells.count(0)
    return {"count": zeros} if zeros else None


def half_added(case: Case, *, measure: str) -> Facts | None:
    """The measure's interval was computed with 1/2 added to the counts."""
    figure = case.figures.get(measure)
    if figure is None or not isinstance(figure.interval, Interval) or figure.interval.adjusted != "half":
        return None
    return {"measure": measure, **_survey(case)}


def through_no_effect(case: Case) -> Facts | None:
    """The interval of the headline holds fewer and more: the difference's, or where there is none the ratio's.

    Where the difference has no interval, the headline says so, and no other one speaks for it.
    """
    measure = next((measure for measure in HEADLINES if measure in case.figures), None)
    if measure is None:
        return None
    return {} if straddles(case.figures[measure].interval, no_effect_of(measure)) else None


def family_parts(case: Case) -> Facts | None:
    """The family's p and one of its intervals differ about no effect, since they rest on different methods."""
    if isinstance(case.test, Gap) or isinstance(case.test.p, Gap):
        return None
    small_p = case.test.p < 1 - case.choices.level
    for measure in COMPARED[case.form]:
        outside = excludes(case.figures.get(measure), no_effect_of(measure))
        if outside is not None and outside != small_p:
            return {}
    return None


def rare_harm(case: Case) -> Facts | None:
    """In a trial an unwelcome event is rare and more frequent in the index group, and the trial is too small for it.

    It is too small where the difference's interval includes 0, or where fewer than ten people had the event.
    """
    risk, difference = (value(case.figures.get("risk_index")), value(case.figures.get("risk_difference")))
    if risk is None or difference is None or case.outcome.design != "trial" or case.outcome.welcome:
        return None
    open_to_chance = excludes(case.figures.get("risk_difference"), 0.0) is not True
    too_small = open_to_chance or case.counts.index_events < FEW_HARMED
    return {"risk": risk} if difference > 0 and risk < RARE and too_small else None


def leans(case: Case) -> Facts | None:
    """A carried difference goes through 0 and reaches further on the side away from its estimate."""
    carried = case.carried
    difference = None if carried is None else value(carried.difference)
    if carried is None or difference is None or difference == 0:
        return None
    interval = carried.difference.interval
    if not straddles(interval, 0.0) or isinstance(interval, Gap) or isinstance(interval.low, Gap):
        return None
    reaches_up = isinstance(interval.high, Gap) or interval.high > -interval.low
    reaches_down = not isinstance(interval.high, Gap) and interval.high < -interval.low
    if difference < 0 and reaches_up:
        return {"side": "more"}
    return {"side": "fewer"} if difference > 0 and reaches_down else None


def _survey(case: Case) -> Facts:
    """The design, where it gives the risk ratio another name."""
    return {"design": "survey"} if case.outcome.design == "survey" else {}
