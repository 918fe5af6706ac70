"""When the cautions of an effect that is carried to a starting risk hold."""

from __future__ import annotations

import math

from fourcount.appraisal.case import Case, Facts, at_start, no_effect_of, value
from fourcount.appraisal.findings import Counts, Gap, PatientFindings, PrintedFigure

OUTSIDE = ("case-control", "matched")
"""The designs whose starting risk is never the study's own."""

CRUDE = (
    "pooled_risk_ratio",
    "pooled_odds_ratio",
    "risk_ratio",
    "odds_ratio",
    "pair_ratio",
    "pair_odds_ratio",
    "rate_ratio",
)
"""A table's own ratios, of which the first there is tells on which side of no effect it lies."""


def effect_kept_constant(case: Case) -> Facts | None:
    """The study's relative effect is taken to hold at another starting risk, one that is not printed as the same."""
    carried, study = _moved(case), study_risk(case)
    if carried is None or study is None or carried.effect == "risk_difference":
        return None
    effect = value(carried.carried)
    if effect is None or _printed_alike(carried.baseline, study):
        return None
    other = _other_risk(carried.baseline, study, effect) if carried.effect == "risk_ratio" else {}
    return {**_effect(carried), "value": effect, **at_start(carried), "study": study, **other, **_survey(case)}


def kept_elsewhere(case: Case) -> Facts | None:
    """An effect is taken to hold at a starting risk whose distance from the study's is not known."""
    carried = _moved(case)
    effect = None if carried is None else value(carried.carried)
    if carried is None or effect is None or carried.effect == "risk_difference" or study_risk(case) is not None:
        return None
    # Of cases and controls, that all rests on the starting risk says as much.
    if case.outcome.design in OUTSIDE:
        return None
    return {**_effect(carried), "value": effect, **at_start(carried), **_survey(case)}


def difference_kept_constant(case: Case) -> Facts | None:
    """A difference varies with the starting risk more than a ratio does."""
    carried, study = _moved(case), study_risk(case)
    if carried is None or carried.effect != "risk_difference":
        return None
    if study is None:
        return at_start(carried)
    return None if _printed_alike(carried.baseline, study) else {**at_start(carried), "study": study}


def baseline_far(case: Case) -> tuple[Facts, ...]:
    """The starting risk is under half or over twice the reference group's; of three, each that is."""
    carried, study = case.carried, study_risk(case)
    if study is None or isinstance(case.patient, Gap):
        return ()
    others = (one for one in (case.patient.low, case.patient.high) if isinstance(one, PatientFindings))
    asked = {one.baseline: one for one in (carried, *others) if one is not None}
    return tuple(
        {**at_start(one), "study": study} for baseline, one in asked.items() if not study / 2 <= baseline <= study * 2
    )


def baseline_uncertain(case: Case) -> Facts | None:
    """A range, where there is one, at a bare starting risk holds nothing of that risk's own uncertainty."""
    carried = case.carried
    if carried is None or carried.range_from != "effect" or carried.start_from == "overall":
        return None
    interval = carried.difference.interval
    if isinstance(carried.difference.estimate, Gap) or isinstance(interval, Gap) or interval.low == interval.high:
        return None  # at a risk that no effect moves there is no range
    # A difference kept constant has the same limits at every starting risk.
    if carried.effect == "risk_difference" and carried.other_span is None:
        return None
    return at_start(carried)


def rests_on_baseline(case: Case) -> Facts | None:
    """In a case-control study every absolute figure rests on the starting risk; ``totals`` are no risks there."""
    carried = case.carried
    if carried is None or case.outcome.design not in OUTSIDE:
        return None
    facts: Facts = {**at_start(carried), **_effect(carried)}
    return {**facts, "totals": "sampled"} if isinstance(case.given, Counts) else facts


def solved_from_overall(case: Case) -> Facts | None:
    """The starting risk is solved from the risk of all people and the share who have the exposure."""
    carried = case.carried
    if carried is None or carried.start_from != "overall":
        return None
    return {**at_start(carried), **_effect(carried), **_survey(case)}


def from_a_rate(case: Case) -> Facts | None:
    """The starting risk is that of a rate which stays the same."""
    carried = case.carried
    # That hazards stay constant, for another time span, and that both groups' rates do, say as much.
    if carried is None or carried.start_from != "rate" or carried.effect == "rate_ratio" or _between_spans(carried):
        return None
    return at_start(carried)


def controls_over_time(case: Case) -> Facts | None:
    """The odds ratio of a case-control study is carried: it must not be if it is a rate ratio."""
    carried, design = case.carried, case.outcome.design
    return {"design": design} if carried is not None and design in OUTSIDE and carried.effect == "odds_ratio" else None


def within_pairs(case: Case) -> Facts | None:
    """The odds ratio of pairs holds within pairs, and is carried to a risk of many people."""
    carried = case.carried
    return {} if carried is not None and carried.measure == "pair_odds_ratio" else None


def constant_rates(case: Case) -> Facts | None:
    """A rate ratio is carried as a hazard ratio is; for another time span, that hazards stay constant says as much."""
    carried = case.carried
    return {} if carried is not None and carried.effect == "rate_ratio" and not _between_spans(carried) else None


def other_span(case: Case) -> Facts | None:
    """Risks are carried to another time span, as if hazards stayed constant."""
    return {} if isinstance(case.patient, PatientFindings) and _between_spans(case.patient) else None


def adjusted_converted(case: Case) -> Facts | None:
    """An adjusted odds ratio is converted at one starting risk, which is approximate."""
    carried = case.carried
    if carried is None or carried.effect != "odds_ratio" or not carried.adjusted:
        return None
    return at_start(carried)


def adjusted_opposite(case: Case) -> Facts | None:
    """The adjusted effect that is carried and the table point in opposite directions."""
    carried = _adjusted_beside_counts(case)
    own = next((case.figures[key] for key in CRUDE if key in case.figures), None)
    adjusted, crude = (None if carried is None else value(carried.carried)), value(own)
    if carried is None or adjusted is None or crude is None:
        return None
    apart = (adjusted - no_effect_of(carried.effect)) * (crude - 1.0)
    return {"effect": carried.effect, **_sides(case)} if apart < 0.0 else None


def adjusted_turned(case: Case) -> Facts | None:
    """The adjusted effect is taken as printed of the first group and the left outcome, and was turned round."""
    carried, outcome = _adjusted_beside_counts(case), case.outcome
    turned = (outcome.index_group == "second") != (not outcome.counts_left)
    return None if carried is None or not turned else {"effect": carried.effect, **_sides(case)}


def carried_level(case: Case) -> Facts | None:
    """The adjusted effect's limits have a level of their own, which is not the record's."""
    carried = _adjusted_beside_counts(case)
    if carried is None or abs(carried.level - case.choices.level) < 1e-9 or isinstance(carried.carried.interval, Gap):
        return None
    return {"level": carried.level, "chosen": case.choices.level}


def study_risk(case: Case) -> float | None:
    """The risk of the study's own reference group or side, where it has one."""
    return value(case.figures.get("risk_reference") or case.figures.get("pair_risk_reference"))


def _moved(case: Case) -> PatientFindings | None:
    """The patient, or of three the first, whose risk the effect moves to another one that can be given."""
    patient = case.carried
    if patient is None:
        return None
    for one in (patient, patient.low, patient.high):
        if isinstance(one, PatientFindings) and not isinstance(one.with_.estimate, Gap):
            stays = (0.0,) if one.effect == "risk_ratio" else () if one.effect == "risk_difference" else (0.0, 1.0)
            if one.baseline not in stays:
                return one
    return None


def _other_risk(baseline: float, study: float, ratio: float) -> Facts:
    """What keeping the risk ratio of not having the event would make of the starting risk, where people see that.

    Both ratios say the same at the study's own risk, and part elsewhere.
    """
    if study >= 1.0 or ratio * study > 1.0:
        return {}
    becomes, other = ratio * baseline, 1.0 - (1.0 - baseline) * (1.0 - ratio * study) / (1.0 - study)
    people = 100 if min(becomes, other) >= 0.01 else 1000
    if round(becomes * people) == round(other * people):
        return {}
    return {"other": other if other >= 0.0 else "less than 0%", "becomes": becomes}


def _effect(carried: PatientFindings) -> Facts:
    """The kind of effect, and that it is an adjusted one where it is."""
    return {"effect": carried.effect, **({"adjusted": "adjusted"} if carried.adjusted else {})}


def _adjusted_beside_counts(case: Case) -> PatientFindings | None:
    carried = case.carried
    return carried if carried is not None and carried.adjusted and not isinstance(case.given, PrintedFigure) else None


def _between_spans(carried: PatientFindings) -> bool:
    """Whether risks are carried from one time span to another; a rate gives a risk over any span by itself."""
    return carried.other_span is not None and carried.study_span is not None


def _sides(case: Case) -> Facts:
    """The labels of the print's two groups, as far as they are typed."""
    labels = {"first": case.outcome.first_label_text, "second": case.outcome.second_label_text}
    return {name: " ".join(text.split()) for name, text in labels.items() if text.strip()}


def _printed_alike(one: float, study: float) -> bool:
    """Whether a risk is the study's own as papers print it: to 0.1 point, and to two digits near 0% and 100%."""
    size = min(study, 1 - study)
    unit = 0.001 if size >= 0.01 else 10.0 ** (math.floor(math.log10(size)) - 1) if size > 0 else 0.0
    return abs(one - study) <= unit / 2 + 1e-12


def _survey(case: Case) -> Facts:
    """The design, where it gives the risk ratio another name."""
    return {"design": "survey"} if case.outcome.design == "survey" else {}
