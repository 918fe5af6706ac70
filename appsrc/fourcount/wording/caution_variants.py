"""Which sentence a caution has, where that depends on its facts."""

from __future__ import annotations

from collections.abc import Callable, Mapping

from fourcount.appraisal.findings import Caution, Fact
from fourcount.wording.caution_texts import PLAIN_ESTIMATE, TEXTS, UNKNOWN
from fourcount.wording.half_added import WALTER
from fourcount.wording.labels import FIELDS, FORMS

Facts = Mapping[str, Fact]

HALF_ADDED_TO_A_RATIO = (
    f"Because of a count of 0, the textbook interval of the {{measure}} is that with {WALTER}. {PLAIN_ESTIMATE}"
)
RATIO_KEPT_CONSTANT = (
    "The {effect} is assumed to be the same at {baseline} as at the study’s own {study}; with the {effect} of not "
    "having the event kept instead, {baseline} would become {other}, not {becomes}."
)
DIFFERENCE_KEPT_CONSTANT = (
    "The difference is assumed to be the same at {baseline} as at the study’s own {study}; differences vary with the "
    "starting risk more than ratios do."
)
HAZARD_RATIO_CARRIED = (
    "The hazard ratio of {value} is a ratio of rates among those still without the event, and no risk ratio. Carrying "
    "it takes it to stay the same over the whole time span, and leaves out other events that compete."
)
RESTS_WITHOUT_TOTALS = (
    "Totals are those of cases and controls, as many as the study took, so that no risk follows from them: every risk, "
    "difference and number needed here rests on the starting risk of {baseline}, which is not from this study, and on "
    "the {effect} being the same there."
)
ENTER_A_RATE_RATIO = (
    "If controls were sampled as cases arose, the study’s ratio is a rate ratio and must not be converted: choose "
    f"“{FORMS['effect-only']}” under “{FIELDS['form']}” then, and type it as a rate ratio."
)
SEVERAL_ZEROS = "{count} of the four counts are 0: estimates or limits of 0 or infinity are shown as they are."

MATCHED = {
    "": (
        "The pairs are alike in what they were matched for; other differences between cases and controls may explain "
        "the odds ratio."
    ),
    "effect": (
        "The pairs are alike in what they were matched for; other differences between cases and controls may explain "
        "the odds ratio, and what is carried to {baseline} is adjusted for none of them."
    ),
    "beside": (
        "The pairs are alike in what they were matched for, and a study can adjust only for what it measured; other "
        "differences between cases and controls may explain crude and adjusted odds ratio alike."
    ),
}
OVER_STRATA = {
    "": (
        "A {design} does not assign its groups: pooling deals with what the strata differ in and with nothing else, "
        "and the crude figures not even with that. Other differences between the groups may explain them."
    ),
    "effect": (
        "A {design} does not assign its groups: pooling, in the {effect} carried to {baseline} as well, deals with "
        "what the strata differ in and with nothing else, and the crude figures not even with that. Other differences "
        "between the groups may explain them."
    ),
    "beside": (
        "A {design} does not assign its groups: pooling deals with what the strata differ in, adjusting only with what "
        "was measured, and the crude figures with neither. Other differences between the groups may explain them."
    ),
}
OBSERVATIONAL = {
    "": TEXTS["observational"][1],
    "effect": (
        "A {design} does not assign its groups: these are crude figures, the {effect} carried to {baseline} as well, "
        "and other differences between the groups may explain them."
    ),
    "beside": (
        "A {design} does not assign its groups, and can adjust only for what it measured: other differences between "
        "the groups may explain crude and adjusted figures alike."
    ),
}
"""By what else there is: a crude effect that is carried, or an adjusted one beside the table."""

CRUDE = "The figures of this table are crude"
POOLED = f"{CRUDE}, or pooled over its strata and no more"
ALSO_CARRIED = {
    CRUDE: ", and so is the {effect} carried to {baseline}",
    POOLED: ", as is the {effect} carried to {baseline}",
}
ADJUSTED_IS = "; the paper’s own {measure}, adjusted{adjusted_for}, is {value}"
CARRY_IT_INSTEAD = ", and can be carried instead"


def template(caution: Caution) -> str:
    """The sentence of a caution, with its facts' names in braces."""
    varied = VARIED.get(caution.key)
    return (varied and varied(caution.facts)) or TEXTS.get(caution.key, UNKNOWN)[1]


def _observational(facts: Facts) -> str:
    by = MATCHED if facts.get("design") == "matched" else OVER_STRATA if "strata" in facts else OBSERVATIONAL
    return by[next((name for name in ("beside", "effect") if name in facts), "")]


def _crude_beside_adjusted(facts: Facts) -> str:
    crude = POOLED if "strata" in facts else CRUDE
    also = ALSO_CARRIED[crude] if "effect" in facts else ""
    instead = CARRY_IT_INSTEAD if also and "carriable" in facts else ""
    return f"{crude}{also}{ADJUSTED_IS}{instead}."


VARIED: dict[str, Callable[[Facts], str]] = {
    "zero-cells": lambda facts: SEVERAL_ZEROS if facts.get("count", 1) != 1 else "",
    "half-added": lambda facts: HALF_ADDED_TO_A_RATIO if facts.get("measure") == "risk_ratio" else "",
    "effect-kept-constant": lambda facts: RATIO_KEPT_CONSTANT if "other" in facts else "",
    "difference-kept-constant": lambda facts: DIFFERENCE_KEPT_CONSTANT if "study" in facts else "",
    "hazard-ratio": lambda facts: HAZARD_RATIO_CARRIED if "carried" in facts else "",
    "rests-on-baseline": lambda facts: RESTS_WITHOUT_TOTALS if "totals" in facts else "",
    "controls-over-time": lambda facts: ENTER_A_RATE_RATIO if facts.get("design") == "case-control" else "",
    "observational": _observational,
    "crude-beside-adjusted": _crude_beside_adjusted,
}
"""The cautions whose sentence depends on their facts; "" leaves the usual one."""
