"""What to keep in mind: one plain sentence for every caution, beside the block that always stands."""

from __future__ import annotations

from fourcount.appraisal.findings import Caution
from fourcount.wording.facts import told
from fourcount.wording.half_added import GART, WALTER
from fourcount.wording.standing import STANDING, STANDING_FULL

__all__ = ["SAID_OF_THE_PATIENT", "STANDING", "STANDING_FULL", "TEXTS", "caution_text", "caution_title"]

PLAIN_ESTIMATE = (
    "The estimate stays as it is; the interval is centred on the altered one and need not hold an estimate of 0 or "
    "infinity."
)
TEXTS = {
    "read-as": ("How a count was read", "{text} is read as {value}; two counts need two cells."),
    "percent-disagrees": (
        "A percentage in the print",
        "{text}: {events} of {total} does not round to this percentage; the count is used.",
    ),
    "index-looks-like-control": (
        "Which group is which",
        "The index group is called “{label}”; if it is the comparison, swap the groups.",
    ),
    "odds-ratio-differs": (
        "Two ratios",
        (
            "The odds ratio {odds_ratio} lies farther from 1 than the {ratio_name} {risk_ratio}: "
            "do not read the one as the other."
        ),
    ),
    "effect-kept-constant": (
        "The same effect elsewhere",
        "The {effect} is assumed to be the same at {baseline} as at the study’s own {study}.",
    ),
    "baseline-far": (
        "A distant starting risk",
        (
            "The starting risk of {baseline} is outside half to twice the study’s own {study}: "
            "the study says less about such people."
        ),
    ),
    "baseline-uncertain": (
        "The starting risk",
        "The interval leaves out that {baseline} is itself uncertain.",
    ),
    "rests-on-baseline": (
        "The starting risk",
        (
            "Every risk, difference and number needed here rests on the starting risk of {baseline}, "
            "which is not from this study, and on the odds ratio being the same there."
        ),
    ),
    "totals-are-sampled": (
        "Cases and controls",
        "Totals are those of cases and controls, as many as the study took: no risk follows from them.",
    ),
    "controls-over-time": (
        "How controls were chosen",
        "If controls were sampled as cases arose, the study’s ratio is a rate ratio and must not be converted.",
    ),
    "observational": (
        "Confounding",
        (
            "A {design} does not assign its groups: these are crude figures, and other differences between the groups "
            "may explain them."
        ),
    ),
    "converted-limits": (
        "Converted limits",
        (
            "The odds ratio’s limits are converted at {baseline} as if that were certain; where the odds ratio is "
            "adjusted, the conversion is approximate."
        ),
    ),
    "zero-cells": (
        "Zeros",
        "{count} of the four counts is 0: estimates or limits of 0 or infinity are shown as they are.",
    ),
    "half-added": (
        "Half added",
        f"Because of a count of 0, the textbook interval of the {{measure}} is that with {GART}. {PLAIN_ESTIMATE}",
    ),
    "through-no-effect": (
        "No effect is inside the interval",
        "The interval includes no effect: the study is compatible with fewer events and with more.",
    ),
    "family-parts": (
        "Two methods",
        "The p value and an interval disagree about no effect: they rest on different methods.",
    ),
    "rare-harm": (
        "A harm in a trial",
        "With a harm in {risk} of people, one trial’s number of people and time are too small to show it reliably.",
    ),
    "leans": (
        "No effect is inside the interval",
        (
            "The interval at this starting risk includes no effect, and reaches further on the side of “{side}”, "
            "away from the estimate."
        ),
    ),
}
HALF_ADDED_TO_A_RATIO = (
    f"Because of a count of 0, the textbook interval of the {{measure}} is that with {WALTER}. {PLAIN_ESTIMATE}"
)
RATIO_KEPT_CONSTANT = (
    "The {effect} is assumed to be the same at {baseline} as at the study’s own {study}; keeping that of the other "
    "outcome the same instead would give other figures."
)
SAID_OF_THE_PATIENT = ("baseline-uncertain",)
"""The cautions that the patient's own words say already, wherever both stand together."""

UNKNOWN = ("Caution", "A caution holds here that this version has no sentence for.")
SEVERAL_ZEROS = "{count} of the four counts are 0: estimates or limits of 0 or infinity are shown as they are."


def caution_text(caution: Caution) -> str:
    """The caution as one plain sentence with its numbers in it."""
    if caution.key == "zero-cells" and caution.facts.get("count", 1) != 1:
        return told(SEVERAL_ZEROS, caution.facts)
    if caution.key == "half-added" and caution.facts.get("measure") == "risk_ratio":
        return told(HALF_ADDED_TO_A_RATIO, caution.facts)
    if caution.key == "effect-kept-constant" and caution.facts.get("effect") != "odds_ratio":
        return told(RATIO_KEPT_CONSTANT, caution.facts)
    return told(TEXTS.get(caution.key, UNKNOWN)[1], caution.facts)


def caution_title(caution: Caution) -> str:
    """What the caution is about, in a few words."""
    return TEXTS.get(caution.key, UNKNOWN)[0]
