"""What four counts, strata, pairs, rates and printed risks give for a patient."""

from __future__ import annotations

from collections.abc import Mapping

from fourcount.appraisal.carrying.effects import carriable_of
from fourcount.appraisal.carrying.study import OwnRisks, Study
from fourcount.appraisal.extras.printed import ReadEffect
from fourcount.appraisal.findings import Carriable, CarriedEffect, Figure, Gap
from fourcount.appraisal.gating import SUPPORT, Support
from fourcount.record.outcome import Outcome

OF_RISKS: Mapping[CarriedEffect, str] = {"risk_ratio": "risk_ratio", "risk_difference": "risk_difference"}
OF_PAIRS: Mapping[CarriedEffect, str] = {
    "risk_ratio": "pair_ratio",
    "risk_difference": "pair_difference",
    "odds_ratio": "pair_odds_ratio",
}
"""The measure behind each effect of a form, the usual one first."""

OWN = ("risk_index", "risk_reference", "risk_difference", "risk_ratio")
OWN_OF_PAIRS = ("pair_risk_index", "pair_risk_reference", "pair_difference", "pair_ratio")
"""Both risks, and what parts them."""


def study_of_counts(
    outcome: Outcome, figures: Mapping[str, Figure], support: Support, adjusted: ReadEffect, level: float
) -> Study:
    """Of one unpaired table."""
    if support.refused:
        return refused_study(outcome, support.refused)
    crude = of_figures(figures, {effect: effect for effect in support.carries}, level)
    return Study(
        outcome=outcome,
        carriable=carriable_of(outcome, crude.values(), adjusted),
        own=own_risks(figures, OWN, level) if support.own_starting_risk else None,
        needs="case-control-needs-baseline",
        odds_ratio=crude.get("odds_ratio"),
        number_needed=support.patient_number_needed,
    )


def study_of_strata(
    outcome: Outcome, pooled: Mapping[str, Figure], support: Support, adjusted: ReadEffect, level: float
) -> Study:
    """Of several strata: the pooled effects. Each stratum has a risk of its own, so none is taken from here."""
    if support.refused:
        return refused_study(outcome, support.refused)
    crude = of_figures(pooled, {effect: f"pooled_{effect}" for effect in support.carries}, level)
    return Study(
        outcome=outcome,
        carriable=carriable_of(outcome, crude.values(), adjusted),
        needs="strata-need-baseline",
        odds_ratio=crude.get("odds_ratio"),
        no_conversion=Gap("carried-gap"),
        number_needed=support.patient_number_needed,
    )


def study_of_pairs(
    outcome: Outcome, figures: Mapping[str, Figure], withheld: Mapping[str, str], adjusted: ReadEffect, level: float
) -> Study:
    """Of pairs: the paired effects, and both sides' own risks where the pairs that agree are known."""
    refused = withheld.get("pair_odds_ratio")
    if refused:
        return refused_study(outcome, refused)
    matched = outcome.design == "matched"
    needed = withheld.get("number_needed")
    return Study(
        outcome=outcome,
        carriable=carriable_of(outcome, of_figures(figures, OF_PAIRS, level).values(), adjusted),
        own=own_risks(figures, OWN_OF_PAIRS, level, related=True),
        needs="case-control-needs-baseline" if matched else "pairs-need-baseline",
        # Pairs that agree are needed for the study's own number needed, and the patient has a risk without them.
        number_needed=None if needed in ("concordant-pairs-unknown", "design-matched") else needed,
    )


def study_of_rates(
    outcome: Outcome, figures: Mapping[str, Figure], withheld: Mapping[str, str], adjusted: ReadEffect, level: float
) -> Study:
    """Of person-time: the rate ratio, carried as a hazard ratio is. A rate is no risk, so one has to be typed."""
    if "rate_ratio" in withheld:
        return refused_study(outcome, withheld["rate_ratio"])
    crude = of_figures(figures, {"rate_ratio": "rate_ratio"}, level)
    return Study(
        outcome=outcome,
        carriable=carriable_of(outcome, crude.values(), adjusted),
        needs="rates-need-baseline",
        refused=Gap("events-not-people") if outcome.counting == "events" else None,
    )


def study_of_risks(
    outcome: Outcome, figures: Mapping[str, Figure], withheld: Mapping[str, str], adjusted: ReadEffect, level: float
) -> Study:
    """Of two printed risks at one time."""
    if "risk_ratio" in withheld:
        return refused_study(outcome, withheld["risk_ratio"])
    return Study(
        outcome=outcome,
        carriable=carriable_of(outcome, of_figures(figures, OF_RISKS, level).values(), adjusted),
        own=own_risks(figures, OWN, level),
        needs="no-starting-risk",
        number_needed=SUPPORT[outcome.design].patient_number_needed,
    )


def refused_study(outcome: Outcome, reason: str) -> Study:
    """Of a table that says nothing in its design, and carries nobody."""
    return Study(outcome=outcome, carriable=(), refused=Gap(reason))


def of_figures(
    figures: Mapping[str, Figure], keys: Mapping[CarriedEffect, str], level: float
) -> dict[CarriedEffect, Carriable]:
    """The form's own crude effects, as far as the design gives them."""
    return {
        effect: Carriable(effect=effect, measure=key, figure=figures[key], level=level)
        for effect, key in keys.items()
        if key in figures
    }


def own_risks(
    figures: Mapping[str, Figure], keys: tuple[str, ...], level: float, *, related: bool = False
) -> OwnRisks | None:
    """Both risks with what parts them; None where the form or the design withholds one."""
    found = [figures.get(key) for key in keys]
    index, reference, difference, ratio = found
    if index is None or reference is None or difference is None or ratio is None:
        return None
    return OwnRisks(index=index, reference=reference, difference=difference, ratio=ratio, level=level, related=related)
