"""The effect of a study carried to one patient's starting risk."""

from __future__ import annotations

from fourcount.appraisal.conversion import converted_figure, mapped
from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, PatientFindings
from fourcount.appraisal.gating import Support
from fourcount.appraisal.measures import Figures, number_needed_from
from fourcount.appraisal.reach import risk_within_reach, within_reach
from fourcount.appraisal.starting_risk import StartingRisk
from fourcount.record.outcome import Effect
from fourcount.stats.conversion import risk_with


def carry(
    figures: Figures, start: StartingRisk, effect: Effect, support: Support, *, welcome: bool
) -> PatientFindings | Gap:
    """Risk without and with, their difference and the number needed, by the table or by the effect."""
    if start.origin == "reference":
        return _from_table(figures, start, effect, support, welcome=welcome)
    return carry_effect(figures[effect], start, effect, support, welcome=welcome)


def _from_table(
    figures: Figures, start: StartingRisk, effect: Effect, support: Support, *, welcome: bool
) -> PatientFindings | Gap:
    """The table's own reference risk with its own crude effect is the table again: its direct intervals hold.

    Combining the reference risk with the effect would count the reference group twice (Newcombe 2011,
    Commun Stat Theory Methods 40:3154, from memory).
    """
    if isinstance(figures["risk_index"].estimate, Gap):
        return Gap("carried-gap")
    difference = within_reach(figures["risk_difference"], figures["risk_index"], figures["risk_reference"])
    return PatientFindings(
        baseline=start.value,
        baseline_from="reference",
        effect=effect,
        carried=figures[effect],
        without=risk_within_reach(figures["risk_reference"]),
        with_=risk_within_reach(figures["risk_index"]),
        difference=difference,
        number_needed=_gated(difference, support, welcome=welcome),
        risk_ratio=figures["risk_ratio"],
        range_from="table",
    )


def carry_effect(
    carried: Figure, start: StartingRisk, effect: Effect, support: Support, *, welcome: bool
) -> PatientFindings | Gap:
    """The effect's estimate and limits at a bare starting risk.

    The range holds the effect's uncertainty only, none of the starting risk's (Cochrane Handbook 5.1,
    12.5.4.5). A risk that would pass 100% is withheld by itself; nothing is cut off at 100%.
    """
    if isinstance(carried.estimate, Gap):
        return Gap("carried-gap")
    baseline = start.value

    def risk(value: float) -> float | Gap:
        return risk_with(effect, value, baseline)

    def above_baseline(risk: float) -> float | Gap:
        return risk - baseline

    with_ = mapped(carried, risk)
    difference = mapped(with_, above_baseline)
    return PatientFindings(
        baseline=baseline,
        baseline_from="given",
        effect=effect,
        carried=carried,
        without=Figure(estimate=baseline, interval=Gap("bare-starting-risk"), method=""),
        with_=with_,
        difference=difference,
        number_needed=_gated(difference, support, welcome=welcome),
        risk_ratio=carried if effect == "risk_ratio" else converted_figure(carried, baseline),
        range_from="effect",
    )


def _gated(difference: Figure, support: Support, *, welcome: bool) -> AnyNumberNeeded | Gap:
    if support.patient_number_needed is not None:
        return Gap(support.patient_number_needed)
    return number_needed_from(difference, welcome=welcome)
