"""What stands under the fold of a ratio, whatever form of print it comes from: E-value, and a cohort's fractions."""

from __future__ import annotations

from fourcount.appraisal.extras.attributable import of_exposed, prevented
from fourcount.appraisal.extras.e_values import COMMON, e_values
from fourcount.appraisal.extras.printed import RATIOS, ReadEffect, as_figure
from fourcount.appraisal.findings import Clusters, Counts, EValues, Extras, Figure, Gap
from fourcount.appraisal.gating import OBSERVATIONAL
from fourcount.record.entry.readings import Proportion, RiskReading
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import Outcome


def extras_of_ratio(
    outcome: Outcome,
    ratio: Figure | None,
    measure: str,
    adjusted: ReadEffect,
    *,
    clusters: Clusters | Gap | None = None,
    counts: Counts | None = None,
) -> Extras:
    """Whatever a form without losses and fragility has beside its measures; ``ratio`` is None where it is withheld."""
    cohort = ratio is not None and outcome.design == "cohort"
    return Extras(
        e_value=e_value_of(outcome, ratio, measure, adjusted, counts),
        attributable_exposed=of_exposed(ratio) if ratio and cohort else None,
        prevented_exposed=prevented(ratio) if ratio and cohort else None,
        clusters=clusters,
        adjusted=adjusted.figure,
    )


def e_value_of(
    outcome: Outcome, ratio: Figure | None, measure: str, adjusted: ReadEffect, counts: Counts | None = None
) -> EValues | Gap | None:
    """Of the printed adjusted ratio where there is one, which has dealt with some confounding; else of the table's.

    Trials, and tables whose ratio is withheld, have none.
    """
    if ratio is None or outcome.design not in OBSERVATIONAL:
        return None
    printed, common = adjusted.figure, outcome_is_common(outcome, counts)
    if printed is not None and printed.measure in RATIOS:
        return e_values(as_figure(printed), printed.measure, common=common, adjusted=True)
    return e_values(ratio, measure, common=common)


def outcome_is_common(outcome: Outcome, counts: Counts | None) -> bool:
    """Whether over 15% have the event: of the table's people; of a case-control study's by the risk that is typed.

    That is a starting risk, or the overall risk of all people where the starting risk is solved from it.
    """
    if outcome.design in ("case-control", "matched") or counts is None:
        typed = read_start(outcome.patient)
        risk = typed.overall if isinstance(typed.overall, Proportion) else typed.usual
        return isinstance(risk, Proportion | RiskReading) and risk.value > COMMON
    return counts.total > 0 and counts.events / counts.total > COMMON
